package turnsheet.core.format.text;

import java.util.List;

/**
 * How finely a column is printed.
 *
 * @param places decimal places of the last digit, the most that were seen; negative before the
 *     point
 * @param significant significant digits, the most that were seen
 */
record Digits(int places, int significant) {

  static Digits of(List<Row> rows, int column, byte mark) {
    int places = Integer.MIN_VALUE;
    int significant = 1;
    for (Row row : rows) {
      String cell = row.cell(column);
      int here = Decimals.places(cell, mark);
      if (here != Integer.MIN_VALUE) {
        places = Math.max(places, here);
        significant = Math.max(significant, significant(cell));
      }
    }
    return new Digits(places == Integer.MIN_VALUE ? 0 : places, significant);
  }

  /** One unit of the last printed digit of a value. */
  double resolution(double value) {
    double fixed = Math.pow(10, -places);
    if (Math.abs(value) < Math.pow(10, significant - places)) {
      return fixed;
    }
    return Math.pow(10, Math.floor(Math.log10(Math.abs(value))) + 1 - significant);
  }

  /** Magnitude up to which {@link #resolution} is that of zero. */
  double fineBelow() {
    return Math.pow(10, significant - places);
  }

  private static int significant(String cell) {
    int count = 0;
    for (int i = 0; i < cell.length(); i++) {
      char c = cell.charAt(i);
      if (c == 'e' || c == 'E') {
        break;
      }
      if (c >= '0' && c <= '9' && (count > 0 || c != '0')) {
        count++;
      }
    }
    return count;
  }
}
