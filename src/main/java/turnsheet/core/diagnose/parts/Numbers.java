package turnsheet.core.diagnose.parts;

/** Checks of numbers that came in, and the normal distribution. */
final class Numbers {

  private Numbers() {}

  static void positive(String what, double value) {
    if (!(value > 0 && Double.isFinite(value))) {
      throw new IllegalArgumentException(what + ": " + value);
    }
  }

  /** Density of the normal distribution with mean zero. */
  static double normal(double distance, double sigma) {
    double z = distance / sigma;
    return Math.exp(-z * z / 2) / (sigma * Math.sqrt(2 * Math.PI));
  }

  /**
   * Distribution function of the standard normal distribution, by the rational approximation
   * 26.2.17 of Abramowitz and Stegun, error below 7.5e-8.
   */
  static double cumulative(double z) {
    double t = 1 / (1 + 0.2316419 * Math.abs(z));
    double sum =
        t
            * (0.319381530
                + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))));
    double tail = normal(z, 1) * sum;
    return z > 0 ? 1 - tail : tail;
  }
}
