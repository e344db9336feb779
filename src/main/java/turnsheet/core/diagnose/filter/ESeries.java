package turnsheet.core.diagnose.filter;

import java.util.Arrays;

/**
 * Preferred values of parts.
 *
 * <p>Source: IEC 60063 (values from memory). E96 is 10^(i/96) rounded to three figures; E24 is a
 * list of its own, as that rule fails for eight of its values.
 */
public enum ESeries {
  E24(
      5, 1.0, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2.0, 2.2, 2.4, 2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1,
      5.6, 6.2, 6.8, 7.5, 8.2, 9.1),
  E96(1, rounded(96));

  private final double tolerancePercent;

  @SuppressWarnings("ImmutableEnumChecker") // never handed out, never written
  private final double[] values;

  ESeries(double tolerancePercent, double... values) {
    this.tolerancePercent = tolerancePercent;
    this.values = values;
  }

  private static double[] rounded(int steps) {
    double[] values = new double[steps];
    for (int i = 0; i < steps; i++) {
      values[i] = Math.rint(100 * StrictMath.pow(10, (double) i / steps)) / 100;
    }
    return values;
  }

  /** Tolerance with which parts of the series are usually sold (common practice, no source). */
  public double tolerancePercent() {
    return tolerancePercent;
  }

  /** The values of one decade, from 1 on. */
  double[] list() {
    return values.clone();
  }

  /** The value nearest in ratio to one wanted. */
  public double nearest(double wanted) {
    double decade = decade(wanted);
    double best = decade * values[0];
    for (double value : values) {
      best = nearer(decade * value, best, wanted);
    }
    return tidy(nearer(10 * decade, best, wanted));
  }

  /** The smallest value that is not below one wanted. */
  public double atLeast(double wanted) {
    double decade = decade(wanted);
    // a value of the series, itself computed, counts as reached
    double least = wanted * (1 - 1e-9);
    return tidy(
        Arrays.stream(values)
            .map(v -> decade * v)
            .filter(v -> v >= least)
            .findFirst()
            .orElse(10 * decade));
  }

  private static double nearer(double a, double b, double wanted) {
    return Math.abs(Math.log(a / wanted)) < Math.abs(Math.log(b / wanted)) ? a : b;
  }

  private static double decade(double wanted) {
    if (!(wanted > 0 && Double.isFinite(wanted))) {
      throw new IllegalArgumentException("value " + wanted);
    }
    double decade = Math.pow(10, Math.floor(Math.log10(wanted)));
    return wanted < decade ? decade / 10 : wanted >= 10 * decade ? 10 * decade : decade;
  }

  /** Three figures, as written on the part: 4.7e-9 and not 4.700000000000001e-9. */
  private static double tidy(double value) {
    return new java.math.BigDecimal(value).round(new java.math.MathContext(3)).doubleValue();
  }
}
