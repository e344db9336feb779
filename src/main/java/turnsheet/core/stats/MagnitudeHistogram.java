package turnsheet.core.stats;

import java.util.Arrays;

/**
 * Quantiles of the magnitude of a long stream in fixed memory: a histogram whose classes are the
 * leading bits of the single-precision number.
 *
 * <p>Error: below the width of a class, which is 2^-12 of the value; values are interpolated inside
 * it.
 */
public final class MagnitudeHistogram {

  private static final int DROPPED_BITS = 11;

  private final int[] counts = new int[1 << (31 - DROPPED_BITS)];
  private long total;
  private int lowest = counts.length;
  private int highest = -1;

  /** Counts |x|; x is finite. */
  public void add(double x) {
    int index = Float.floatToRawIntBits((float) Math.abs(x)) >>> DROPPED_BITS;
    counts[index]++;
    total++;
    lowest = Math.min(lowest, index);
    highest = Math.max(highest, index);
  }

  public long total() {
    return total;
  }

  /**
   * The magnitude that a share of the values does not exceed.
   *
   * @param share between 0 and 1
   * @throws IllegalStateException if nothing was counted
   */
  public double quantile(double share) {
    if (total == 0) {
      throw new IllegalStateException("no values");
    }
    double wanted = share * total;
    long below = 0;
    for (int i = lowest; i <= highest; i++) {
      if (below + counts[i] >= wanted && counts[i] > 0) {
        double from = Float.intBitsToFloat(i << DROPPED_BITS);
        double to = Float.intBitsToFloat((i + 1) << DROPPED_BITS);
        return from + (to - from) * (wanted - below) / counts[i];
      }
      below += counts[i];
    }
    throw new IllegalStateException("share " + share);
  }

  /** Forgets everything. */
  public void clear() {
    if (highest >= lowest) {
      Arrays.fill(counts, lowest, highest + 1, 0);
    }
    total = 0;
    lowest = counts.length;
    highest = -1;
  }
}
