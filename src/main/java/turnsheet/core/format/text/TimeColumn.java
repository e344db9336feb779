package turnsheet.core.format.text;

import java.util.List;

/** Which column of a table holds the times. */
final class TimeColumn {

  private TimeColumn() {}

  /**
   * A column that is named so, else a first column that rises and does not merely count rows.
   *
   * @param numeric indices of the columns filled with numbers
   * @return its index, -1 where there is none
   */
  static int find(Layout layout, List<Integer> numeric, List<Column> columns) {
    for (int column : numeric) {
      if (layout.labels().get(column).isTime() && !isAxis(layout, columns, column)) {
        return column;
      }
    }
    if (numeric.size() < 2) {
      return -1;
    }
    int first = numeric.get(0);
    boolean index = isIndex(layout, numeric, columns, first);
    return !index && columns.get(first).mostlyRises() ? first : -1;
  }

  /** Whether a column numbers the rows. */
  static boolean isIndex(Layout layout, List<Integer> numeric, List<Column> columns, int column) {
    ColumnLabel label = layout.labels().get(column);
    boolean counts = column == numeric.get(0) && columns.get(column).counts();
    return label.isIndex() || (counts && !label.isTime() && !label.isPeriod());
  }

  /** Whether a column is named x, which may be anything, and does not run like a time. */
  private static boolean isAxis(Layout layout, List<Column> columns, int column) {
    ColumnLabel label = layout.labels().get(column);
    boolean vague = label.name().toLowerCase(java.util.Locale.ROOT).startsWith("x");
    Column numbers = columns.get(column);
    return vague && label.unit() == null && (numbers.counts() || !numbers.mostlyRises());
  }
}
