package turnsheet.core.format.text;

import java.util.List;

/**
 * One record of the head of a table.
 *
 * @param line its first line, from 1
 */
record Row(long line, List<String> cells) {

  Row {
    cells = List.copyOf(cells);
  }

  int width() {
    return cells.size();
  }

  /** The cell of a column; empty where the row ends before. */
  String cell(int column) {
    return column < cells.size() ? cells.get(column) : "";
  }

  boolean isComment() {
    String first = cell(0).stripLeading();
    return first.startsWith("#") || first.startsWith("%") || first.startsWith("//");
  }

  /** Whether there is a number and nothing but numbers and empty cells. */
  boolean isNumeric() {
    boolean any = false;
    for (String cell : cells) {
      if (!cell.isBlank()) {
        if (!isNumber(cell)) {
          return false;
        }
        any = true;
      }
    }
    return any;
  }

  boolean holdsNumber() {
    return cells.stream().anyMatch(Row::isNumber);
  }

  static boolean isNumber(String cell) {
    return !Double.isNaN(Decimals.parse(cell, (byte) '.'))
        || !Double.isNaN(Decimals.parse(cell, (byte) ','));
  }
}
