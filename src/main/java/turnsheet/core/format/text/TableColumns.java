package turnsheet.core.format.text;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.signal.RejectedException;

/** The numbers of a table's head, by column. */
final class TableColumns {

  private static final double GAP = 0.25;
  private static final double MOSTLY = 0.9;

  private TableColumns() {}

  static List<Column> of(Layout layout) throws RejectedException {
    List<Column> columns = new ArrayList<>();
    for (int column = 0; column < layout.columns(); column++) {
      double[] values = new double[layout.rows().size()];
      for (int row = 0; row < values.length; row++) {
        values[row] = number(layout, layout.rows().get(row), column);
      }
      columns.add(new Column(values));
    }
    return columns;
  }

  /** Indices of the columns that hold numbers. */
  static List<Integer> filled(List<Column> columns) {
    List<Integer> filled = new ArrayList<>();
    for (int i = 0; i < columns.size(); i++) {
      if (columns.get(i).isFilled()) {
        filled.add(i);
      }
    }
    return filled;
  }

  /** Whether nearly all steps are the usual one, but for the rounding of the printed digits. */
  static boolean isEven(Column times, Digits digits) {
    double usual = times.medianStep();
    int even = 0;
    for (int i = 1; i < times.length(); i++) {
      double off = Math.abs(times.value(i) - times.value(i - 1) - usual);
      if (off <= GAP * usual + 2 * digits.resolution(times.value(i))) {
        even++;
      }
    }
    return even >= MOSTLY * (times.length() - 1);
  }

  private static double number(Layout layout, Row row, int column) throws RejectedException {
    String cell = row.cell(column);
    double value = Decimals.parse(cell, layout.mark());
    if (Double.isNaN(value) && !cell.isBlank()) {
      throw new RejectedException(
          "notANumber",
          "Line "
              + row.line()
              + ", column "
              + (column + 1)
              + ": \""
              + cell.strip()
              + "\" is written with another decimal mark than the lines before: write all numbers"
              + " alike.");
    }
    return value;
  }
}
