package turnsheet.core.format.text;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import de.siegmar.fastcsv.reader.FieldMismatchStrategy;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;

/** Splits the head of a table into records of cells. */
final class RowSplitter {

  /** stands for runs of blanks */
  static final char BLANKS = ' ';

  static final String SEPARATORS = "\t;," + BLANKS;

  private RowSplitter() {}

  /** All records, without empty lines; what precedes a syntax error where there is one. */
  static List<Row> split(String text, char separator) {
    return separator == BLANKS ? splitAtBlanks(text) : splitQuoted(text, separator);
  }

  private static List<Row> splitQuoted(String text, char separator) {
    List<Row> rows = new ArrayList<>();
    try (CsvReader<CsvRecord> reader =
        CsvReader.builder()
            .fieldSeparator(separator)
            .commentStrategy(CommentStrategy.NONE)
            .skipEmptyLines(true)
            .extraFieldStrategy(FieldMismatchStrategy.IGNORE)
            .missingFieldStrategy(FieldMismatchStrategy.IGNORE)
            .allowUnclosedQuote(true)
            .trimWhitespacesAroundQuotes(true)
            .ofCsvRecord(text)) {
      for (CsvRecord row : reader) {
        rows.add(new Row(row.getStartingLineNumber(), row.getFields()));
      }
    } catch (CsvParseException e) {
      return rows;
    } catch (IOException e) {
      throw new IllegalStateException("text in memory", e);
    }
    return rows;
  }

  private static List<Row> splitAtBlanks(String text) {
    List<Row> rows = new ArrayList<>();
    long line = 0;
    for (String each : text.split("\r\n|\r|\n", -1)) {
      line++;
      if (!each.isBlank()) {
        rows.add(new Row(line, joinUnits(each.strip().split("[ \t]+"))));
      }
    }
    return rows;
  }

  /** Puts a unit in brackets back to its name. */
  private static List<String> joinUnits(String[] words) {
    List<String> cells = new ArrayList<>();
    for (String word : words) {
      boolean unit = word.startsWith("[") || word.startsWith("(");
      if (unit && !cells.isEmpty()) {
        cells.set(cells.size() - 1, cells.get(cells.size() - 1) + " " + word);
      } else {
        cells.add(word);
      }
    }
    return cells;
  }
}
