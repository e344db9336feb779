package turnsheet.core.format.text;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.RejectedException;

/** Finds separator, decimal mark, header and first row of numbers in the head of a text file. */
final class LayoutFinder {

  /** Fewer values than this are no capture. */
  static final int MIN_ROWS = 8;

  private LayoutFinder() {}

  static Layout find(TextHead head) throws RejectedException {
    if (head.looksLikeMarkupOrJson()) {
      throw new RejectedException(
          "noNumbers",
          "The file is markup or JSON, not a table of numbers: export the capture as CSV.");
    }
    String text = head.text();
    Layout best = null;
    for (char separator : RowSplitter.SEPARATORS.toCharArray()) {
      Layout layout = layout(RowSplitter.split(text, separator), separator);
      if (layout != null && (best == null || isBetter(layout, best))) {
        best = layout;
      }
    }
    if (best == null) {
      throw noNumbers(text, head.wholeFile());
    }
    if (best.separator() == ',' && DecimalComma.isLikely(best.rows())) {
      Layout single = layout(RowSplitter.split(text, ';'), ';');
      return single == null ? best : single;
    }
    return best;
  }

  private static boolean isBetter(Layout layout, Layout best) {
    int rows = Integer.compare(layout.rows().size(), best.rows().size());
    return rows > 0 || (rows == 0 && layout.columns() > best.columns());
  }

  private static @Nullable Layout layout(List<Row> all, char separator) {
    List<Row> rows = all.stream().filter(r -> !r.isComment()).toList();
    int start = start(rows);
    if (start < 0) {
      return null;
    }
    Row first = rows.get(start);
    int end = start;
    while (end < rows.size() && fits(rows.get(end), first)) {
      end++;
    }
    List<Row> numbers = rows.subList(start, end);
    List<Row> before = all.stream().filter(r -> r.line() < first.line()).toList();
    HeaderRows header = HeaderRows.of(before, first.width(), separator);
    List<ColumnLabel> labels = new ArrayList<>();
    for (int column = 0; column < first.width(); column++) {
      labels.add(header.label(column));
    }
    return new Layout(
        separator,
        DecimalComma.mark(numbers),
        first.line(),
        first.width(),
        labels,
        header.preamble(),
        numbers,
        end < rows.size());
  }

  /** A row of numbers as wide as the first, but for empty cells behind the last. */
  private static boolean fits(Row row, Row first) {
    if (!row.isNumeric()) {
      return false;
    }
    for (int i = first.width(); i < row.width(); i++) {
      if (!row.cell(i).isBlank()) {
        return false;
      }
    }
    boolean lastIsEmpty = first.cell(first.width() - 1).isBlank();
    return row.width() >= first.width() || (lastIsEmpty && row.width() == first.width() - 1);
  }

  /** Index of the row at which the numbers start; -1 where there are none. */
  private static int start(List<Row> rows) {
    int single = -1;
    int shortRun = -1;
    for (int i = 0; i < rows.size(); i++) {
      Row row = rows.get(i);
      if (!row.isNumeric()) {
        continue;
      }
      single = single < 0 ? i : single;
      int end = i + 1;
      while (end < rows.size() && fits(rows.get(end), row)) {
        end++;
      }
      boolean broken = end < rows.size() && isBrokenRow(rows.get(end), row.width());
      if (end - i >= MIN_ROWS || (end - i >= 2 && broken)) {
        return i;
      }
      if (end - i >= 2) {
        shortRun = shortRun < 0 ? i : shortRun;
        i = end - 1;
      }
    }
    return shortRun >= 0 ? shortRun : single;
  }

  /** Whether a row is numbers gone wrong rather than words between two tables. */
  private static boolean isBrokenRow(Row row, int width) {
    return row.holdsNumber() || row.width() == width;
  }

  private static RejectedException noNumbers(String text, boolean wholeFile) {
    List<Row> mixed = Collections.emptyList();
    for (char separator : ";,\t".toCharArray()) {
      if (mixed.isEmpty()) {
        mixed =
            RowSplitter.split(text, separator).stream()
                .filter(r -> r.width() > 1 && r.holdsNumber())
                .limit(1)
                .toList();
      }
    }
    String where = wholeFile ? "The text" : "The first 256 KiB of the text";
    if (mixed.isEmpty()) {
      return new RejectedException(
          "noNumbers",
          where
              + " hold no line of numbers: export the capture as a table, one row per line."
                  .replace("hold ", wholeFile ? "holds " : "hold "));
    }
    return new RejectedException(
        "noNumbers",
        "No line holds numbers only; line "
            + mixed.get(0).line()
            + " mixes numbers and words: remove the columns with words and upload it again.");
  }
}
