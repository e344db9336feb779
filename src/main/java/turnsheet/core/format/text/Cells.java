package turnsheet.core.format.text;

/** Where the cells of one line start and end; reused from line to line. */
final class Cells {

  private final char separator;
  private final int[] starts;
  private final int[] ends;
  private int filled;

  Cells(char separator, int columns) {
    this.separator = separator;
    this.starts = new int[columns];
    this.ends = new int[columns];
  }

  /**
   * Marks the cells of a line; separators within double quotes do not count.
   *
   * @return how many there are, without empty ones beyond the columns
   */
  int split(byte[] bytes, int from, int end) {
    filled = 0;
    int count =
        separator == RowSplitter.BLANKS
            ? splitAtBlanks(bytes, from, end)
            : splitQuoted(bytes, from, end);
    for (int cell = count; cell < starts.length; cell++) {
      mark(cell, end, end);
    }
    return count > starts.length ? Math.max(filled, starts.length) : count;
  }

  /** Whether the line holds separators only. */
  boolean areEmpty() {
    return filled == 0;
  }

  int start(int column) {
    return starts[column];
  }

  int end(int column) {
    return ends[column];
  }

  static boolean isBlank(byte b) {
    return b == ' ' || b == '\t';
  }

  private int splitAtBlanks(byte[] bytes, int from, int end) {
    int at = from;
    while (true) {
      while (at < end && isBlank(bytes[at])) {
        at++;
      }
      if (at == end) {
        return filled;
      }
      int start = at;
      while (at < end && !isBlank(bytes[at])) {
        at++;
      }
      mark(filled++, start, at);
    }
  }

  private int splitQuoted(byte[] bytes, int from, int end) {
    byte border = (byte) separator;
    int count = 0;
    int start = from;
    boolean quoted = false;
    for (int at = from; at <= end; at++) {
      if (at < end && bytes[at] == '"') {
        quoted = !quoted;
      } else if (at == end || (bytes[at] == border && !quoted)) {
        int ink = start;
        while (ink < at && isBlank(bytes[ink])) {
          ink++;
        }
        mark(count++, ink, at);
        if (ink < at) {
          filled = count;
        }
        start = at + 1;
      }
    }
    return count;
  }

  private void mark(int cell, int start, int end) {
    if (cell < starts.length) {
      starts[cell] = start;
      ends[cell] = end;
    }
  }
}
