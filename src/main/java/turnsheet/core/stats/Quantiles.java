package turnsheet.core.stats;

import java.util.Arrays;

/**
 * Quantiles of a sample by linear interpolation between order statistics at (n - 1) p + 1
 * (definition 7 of Hyndman and Fan, The American Statistician 50 (1996) 361-365).
 */
public final class Quantiles {

  private final double[] sorted;

  /**
   * @param values at least one, finite; left as they are
   */
  public Quantiles(double[] values) {
    this(values, values.length);
  }

  /**
   * @param values left as they are
   * @param count how many of them, from index 0, at least one
   */
  public Quantiles(double[] values, int count) {
    if (count < 1) {
      throw new IllegalArgumentException("no values");
    }
    sorted = Arrays.copyOf(values, count);
    Arrays.sort(sorted);
  }

  /**
   * The value below which a share of the sample lies.
   *
   * @param share 0 to 1
   */
  public double at(double share) {
    if (!(share >= 0 && share <= 1)) {
      throw new IllegalArgumentException("share " + share);
    }
    double place = share * (sorted.length - 1);
    int below = (int) place;
    if (below >= sorted.length - 1) {
      return sorted[sorted.length - 1];
    }
    return sorted[below] + (place - below) * (sorted[below + 1] - sorted[below]);
  }

  public double median() {
    return at(0.5);
  }
}
