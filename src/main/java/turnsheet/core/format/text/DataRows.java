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
  private final List<Warning> warnings = new ArrayList<>();
  private final int[] cellStarts;
  private final int[] cellEnds;
  private double first;
  private double second;
  private long emptyCellLine;

  /** cells up to the last that is not empty */
  private int filled;

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
    this.cellStarts = new int[layout.columns()];
    this.cellEnds = new int[layout.columns()];
    this.lastMayBeEmpty = layout.rows().get(0).cell(layout.columns() - 1).isBlank();
  }

  /** Moves to the next row; false at the end. */
  boolean next() throws IOException, RejectedException {
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
    int cells = split();
    if (filled == 0) {
      return null;
    }
    if (emptyCellLine > 0) {
      throw notANumber(emptyCellLine, "an empty cell");
    }
    boolean ragged =
        cells < layout.columns() - (lastMayBeEmpty ? 1 : 0) || cells > layout.columns();
    if (ragged) {
      refuse(
          "raggedRow",
          "Line "
              + lines.number()
              + " has "
              + cells
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
    if (cellStarts[column] == cellEnds[column] && lines.terminated()) {
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
    int length = Math.min(24, cellEnds[column] - cellStarts[column]);
    return "\""
        + new String(lines.bytes(), cellStarts[column], length, StandardCharsets.UTF_8)
        + "\"";
  }

  private double cell(int column) {
    return Decimals.parse(lines.bytes(), cellStarts[column], cellEnds[column], layout.mark());
  }

  /** Marks the cells; how many there are, not counting empty ones beyond the columns. */
  private int split() {
    byte[] bytes = lines.bytes();
    int end = lines.end();
    filled = 0;
    int cells =
        layout.separator() == RowSplitter.BLANKS
            ? splitAtBlanks(bytes, lines.start(), end)
            : splitQuoted(bytes, lines.start(), end);
    for (int cell = cells; cell < cellStarts.length; cell++) {
      mark(cell, end, end);
    }
    return cells;
  }

  private int splitAtBlanks(byte[] bytes, int from, int end) {
    int cells = 0;
    int at = from;
    while (true) {
      while (at < end && isBlank(bytes[at])) {
        at++;
      }
      if (at == end) {
        filled = cells;
        return cells;
      }
      int start = at;
      while (at < end && !isBlank(bytes[at])) {
        at++;
      }
      mark(cells++, start, at);
    }
  }

  private int splitQuoted(byte[] bytes, int from, int end) {
    byte separator = (byte) layout.separator();
    int cells = 0;
    int start = from;
    boolean quoted = false;
    for (int at = from; at <= end; at++) {
      if (at < end && bytes[at] == '"') {
        quoted = !quoted;
      } else if (at == end || (bytes[at] == separator && !quoted)) {
        int ink = start;
        while (ink < at && isBlank(bytes[ink])) {
          ink++;
        }
        mark(cells++, ink, at);
        if (ink < at) {
          filled = cells;
        }
        start = at + 1;
      }
    }
    return cells > layout.columns() ? Math.max(filled, layout.columns()) : cells;
  }

  private void mark(int cell, int start, int end) {
    if (cell < cellStarts.length) {
      cellStarts[cell] = start;
      cellEnds[cell] = end;
    }
  }

  private boolean isInk() {
    byte[] bytes = lines.bytes();
    int at = lines.start();
    int end = lines.end();
    while (at < end && (isBlank(bytes[at]) || bytes[at] == 0x1a || bytes[at] == '\f')) {
      at++;
    }
    if (at == end) {
      return false;
    }
    boolean slashes = bytes[at] == '/' && at + 1 < end && bytes[at + 1] == '/';
    return bytes[at] != '#' && bytes[at] != '%' && !slashes;
  }

  private static boolean isBlank(byte b) {
    return b == ' ' || b == '\t';
  }
}
