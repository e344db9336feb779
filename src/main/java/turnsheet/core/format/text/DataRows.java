package turnsheet.core.format.text;

import java.io.Closeable;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Rows of numbers of a table, two columns at most of each, without a string per cell.
 *
 * <p>Comments and blank lines are passed over. A last line without its end that cannot be read is a
 * warning, every other unreadable row a rejection.
 */
final class DataRows implements Closeable {

  private final Lines lines;
  private final Layout layout;
  private final int firstColumn;
  private final int secondColumn;
  private final boolean lastMayBeEmpty;

  /** Whether a row can be one bare number. */
  private final boolean plain;

  private final List<Warning> warnings = new ArrayList<>();
  private final Cells cells;
  private double first;
  private double second;
  private long emptyCellLine;

  /**
   * @param firstColumn index of a column, -1 for none
   * @param secondColumn index of a column, -1 for none
   */
  static DataRows open(ByteSource source, Layout layout, int firstColumn, int secondColumn)
      throws IOException, RejectedException {
    Lines lines = new Lines(source.open());
    try {
      for (long line = 1; line < layout.firstLine(); line++) {
        lines.next();
      }
    } catch (IOException | RejectedException e) {
      lines.close();
      throw e;
    }
    return new DataRows(lines, layout, firstColumn, secondColumn);
  }

  private DataRows(Lines lines, Layout layout, int firstColumn, int secondColumn) {
    this.lines = lines;
    this.layout = layout;
    this.firstColumn = firstColumn;
    this.secondColumn = secondColumn;
    this.plain = layout.columns() == 1 && layout.separator() != (char) layout.mark();
    this.cells = new Cells(layout.separator(), layout.columns());
    this.lastMayBeEmpty = layout.rows().get(0).cell(layout.columns() - 1).isBlank();
  }

  /** Moves to the next row; false at the end. */
  boolean next() throws IOException, RejectedException {
    if (plain && emptyCellLine == 0) {
      double number = lines.nextPlain(layout.mark());
      if (!Double.isNaN(number)) {
        first = firstColumn < 0 ? 0 : number;
        second = secondColumn < 0 ? 0 : number;
        return true;
      }
    }
    while (lines.next()) {
      if (isInk()) {
        Boolean read = read();
        if (read != null) {
          return read;
        }
      }
    }
    if (emptyCellLine > 0) {
      warnings.add(
          new Warning(
              "emptyLastRow",
              "Line " + emptyCellLine + ", the last, has an empty cell and was left out."));
      emptyCellLine = 0;
    }
    return false;
  }

  double first() {
    return first;
  }

  double second() {
    return second;
  }

  long line() {
    return lines.number();
  }

  List<Warning> warnings() {
    return List.copyOf(warnings);
  }

  void warn(String code, String message) {
    warnings.add(new Warning(code, message));
  }

  /**
   * For a row whose numbers make no sense.
   *
   * @throws RejectedException the given one, unless the file stops within the row
   */
  void refuse(String code, String message) throws RejectedException {
    if (lines.terminated()) {
      throw new RejectedException(code, message);
    }
    warnTruncated();
  }

  @Override
  public void close() throws IOException {
    lines.close();
  }

  private void warnTruncated() {
    warn(
        "truncated",
        "The file ends in the middle of line " + lines.number() + ": what precedes is used.");
  }

  /** True for a row, false for the end of a cut file, null for a row that may be skipped. */
  private @Nullable Boolean read() throws RejectedException {
    int count = cells.split(lines.bytes(), lines.start(), lines.end());
    if (cells.areEmpty()) {
      return null;
    }
    if (emptyCellLine > 0) {
      throw notANumber(emptyCellLine, "an empty cell");
    }
    boolean ragged =
        count < layout.columns() - (lastMayBeEmpty ? 1 : 0) || count > layout.columns();
    if (ragged) {
      refuse(
          "raggedRow",
          "Line "
              + lines.number()
              + " has "
              + count
              + " cells, the rows before have "
              + layout.columns()
              + ": correct or remove the line.");
      return false;
    }
    first = firstColumn < 0 ? 0 : cell(firstColumn);
    second = secondColumn < 0 ? 0 : cell(secondColumn);
    if (!Double.isNaN(first) && !Double.isNaN(second)) {
      return true;
    }
    int column = Double.isNaN(first) ? firstColumn : secondColumn;
    if (cells.start(column) == cells.end(column) && lines.terminated()) {
      emptyCellLine = lines.number();
      return null;
    }
    if (lines.terminated()) {
      throw notANumber(lines.number(), shown(column), column);
    }
    warnTruncated();
    return false;
  }

  private RejectedException notANumber(long line, String what) {
    return notANumber(line, what, secondColumn < 0 ? firstColumn : secondColumn);
  }

  private RejectedException notANumber(long line, String what, int column) {
    return new RejectedException(
        "notANumber",
        "Line "
            + line
            + ", column "
            + (column + 1)
            + ": "
            + what
            + " stands where a number is needed: correct or remove the line.");
  }

  private String shown(int column) {
    int length = Math.min(24, cells.end(column) - cells.start(column));
    return "\""
        + new String(lines.bytes(), cells.start(column), length, StandardCharsets.UTF_8)
        + "\"";
  }

  private double cell(int column) {
    return Decimals.parse(lines.bytes(), cells.start(column), cells.end(column), layout.mark());
  }

  private boolean isInk() {
    byte[] bytes = lines.bytes();
    int at = lines.start();
    int end = lines.end();
    while (at < end && (Cells.isBlank(bytes[at]) || bytes[at] == 0x1a || bytes[at] == '\f')) {
      at++;
    }
    if (at == end) {
      return false;
    }
    boolean slashes = bytes[at] == '/' && at + 1 < end && bytes[at + 1] == '/';
    return bytes[at] != '#' && bytes[at] != '%' && !slashes;
  }
}
