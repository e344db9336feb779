package turnsheet.core.format.text;

import java.util.List;

/** Tells a comma that is a decimal mark from one that separates cells. */
final class DecimalComma {

  private DecimalComma() {}

  /** The decimal mark of cells already split. */
  static byte mark(List<Row> rows) {
    for (Row row : rows) {
      for (String cell : row.cells()) {
        if (cell.indexOf(',') >= 0) {
          return ',';
        }
        if (cell.indexOf('.') >= 0) {
          return '.';
        }
      }
    }
    return '.';
  }

  /**
   * Whether rows split at commas into two cells are one column with decimal commas: no point
   * anywhere, decimals of one width or with leading noughts, and no first column that counts up.
   */
  static boolean isLikely(List<Row> rows) {
    boolean sameWidth = true;
    boolean leadingNought = false;
    boolean countsUp = true;
    String before = null;
    for (Row row : rows) {
      String whole = row.cell(0).strip();
      String decimals = row.cell(1);
      if (row.width() != 2 || !whole.matches("[-+]?[0-9]+") || !decimals.matches("[0-9]+")) {
        return false;
      }
      leadingNought |= decimals.length() > 1 && decimals.startsWith("0");
      if (before != null) {
        sameWidth &= decimals.length() == rows.get(0).cell(1).length();
        countsUp &= Double.parseDouble(whole) > Double.parseDouble(before);
      }
      before = whole;
    }
    boolean decimal = (sameWidth && rows.get(0).cell(1).length() >= 2) || leadingNought;
    return rows.size() > 1 && decimal && !countsUp;
  }
}
