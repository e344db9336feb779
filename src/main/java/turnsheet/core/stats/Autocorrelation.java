package turnsheet.core.stats;

/** How much successive values of a sample have to do with each other. */
public final class Autocorrelation {

  private Autocorrelation() {}

  /**
   * Coefficient at a lag of one: sum of products of neighbouring deviations from the mean over the
   * sum of squared deviations (the definition of the NIST StRD univariate sets).
   *
   * @param values at least two, not all equal
   */
  public static double lagOne(double[] values) {
    Moments moments = new Moments();
    for (double value : values) {
      moments.add(value);
    }
    if (values.length < 2 || moments.sumOfSquares() == 0) {
      throw new IllegalArgumentException(values.length + " values without spread");
    }
    double mean = moments.mean();
    // what rounding the mean to one double leaves over
    double rest = 0;
    for (double value : values) {
      rest += value - mean;
    }
    rest /= values.length;
    double products = 0;
    for (int i = 1; i < values.length; i++) {
      products += (values[i - 1] - mean - rest) * (values[i] - mean - rest);
    }
    return products / moments.sumOfSquares();
  }
}
