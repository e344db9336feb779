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

  /** Classes of one power of two; a stream meets a few dozen of the 256 there are. */
  private static final int OCTAVE = 1 << (23 - DROPPED_BITS);

  private static final int CLASSES = 1 << (31 - DROPPED_BITS);

  private final int[][] octaves = new int[CLASSES / OCTAVE][0];
  private long total;
  private int lowest = CLASSES;
  private int highest = -1;

  /** Counts |x|; x is finite. */
  public void add(double x) {
    int index = Float.floatToRawIntBits((float) Math.abs(x)) >>> DROPPED_BITS;
    int[] octave = octaves[index / OCTAVE];
    if (octave.length == 0) {
      octave = new int[OCTAVE];
      octaves[index / OCTAVE] = octave;
    }
    octave[index % OCTAVE]++;
    total++;
    lowest = Math.min(lowest, index);
    highest = Math.max(highest, index);
  }

  /** Counts what another one counted. */
  public void add(MagnitudeHistogram other) {
    for (int o = 0; o < octaves.length; o++) {
      int[] theirs = other.octaves[o];
      if (theirs.length > 0 && octaves[o].length == 0) {
        octaves[o] = new int[OCTAVE];
      }
      for (int c = 0; c < theirs.length; c++) {
        octaves[o][c] += theirs[c];
      }
    }
    total += other.total;
    lowest = Math.min(lowest, other.lowest);
    highest = Math.max(highest, other.highest);
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
      int count = count(i);
      if (below + count >= wanted && count > 0) {
        double from = Float.intBitsToFloat(i << DROPPED_BITS);
        double to = Float.intBitsToFloat((i + 1) << DROPPED_BITS);
        return from + (to - from) * (wanted - below) / count;
      }
      below += count;
    }
    throw new IllegalStateException("share " + share);
  }

  private int count(int index) {
    int[] octave = octaves[index / OCTAVE];
    return octave.length == 0 ? 0 : octave[index % OCTAVE];
  }

  /** Forgets everything. */
  public void clear() {
    for (int[] octave : octaves) {
      Arrays.fill(octave, 0);
    }
    total = 0;
    lowest = CLASSES;
    highest = -1;
  }
}
