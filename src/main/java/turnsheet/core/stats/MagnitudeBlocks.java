package turnsheet.core.stats;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A fluctuation cut into blocks of equal length, kept as what resampling needs of it: how often its
 * magnitude falls into each of sixteen classes per power of two, and its mean square.
 *
 * <p>Quantiles are interpolated inside a class; a smooth distribution's is off by less than 0.5 %,
 * alike for all draws, so that scatter between draws is known much better than that.
 */
public final class MagnitudeBlocks {

  private static final int DROPPED_BITS = 19;
  private static final int CLASSES = 1 << (31 - DROPPED_BITS);

  private final int firstClass;
  private final int[][] counts;
  private final double[] meanSquares;

  /**
   * Takes blocks as they were kept.
   *
   * @param firstClass class of the first column of {@code counts}
   * @param counts one row per block, as many columns in each
   * @param meanSquares one per block
   */
  public MagnitudeBlocks(int firstClass, int[][] counts, double[] meanSquares) {
    if (counts.length != meanSquares.length) {
      throw new IllegalArgumentException(counts.length + " and " + meanSquares.length + " blocks");
    }
    this.firstClass = firstClass;
    this.counts = Arrays.stream(counts).map(int[]::clone).toArray(int[][]::new);
    this.meanSquares = meanSquares.clone();
  }

  /** Takes a stream and cuts it; what does not fill the last block is left out. */
  public static final class Collector {
    private final long blockSamples;
    private final List<int[]> blocks = new ArrayList<>();
    private final List<Double> meanSquares = new ArrayList<>();
    private int[] open = new int[CLASSES];
    private double squares;
    private long filled;

    public Collector(long blockSamples) {
      if (blockSamples < 1) {
        throw new IllegalArgumentException("block of " + blockSamples);
      }
      this.blockSamples = blockSamples;
    }

    /** Takes one finite value. */
    public void add(double value) {
      open[Float.floatToRawIntBits((float) Math.abs(value)) >>> DROPPED_BITS]++;
      squares += value * value;
      if (++filled == blockSamples) {
        blocks.add(open);
        meanSquares.add(squares / filled);
        open = new int[CLASSES];
        squares = 0;
        filled = 0;
      }
    }

    /** The full blocks so far; values below a sixteenth of the largest class share one class. */
    public MagnitudeBlocks blocks() {
      int last = CLASSES - 1;
      while (last > 0 && isEmpty(last)) {
        last--;
      }
      int first = Math.max(0, last - 4 * 16);
      int[][] kept = new int[blocks.size()][last - first + 1];
      for (int b = 0; b < kept.length; b++) {
        int[] block = blocks.get(b);
        for (int k = 0; k <= last; k++) {
          kept[b][Math.max(0, k - first)] += block[k];
        }
      }
      return new MagnitudeBlocks(
          first, kept, meanSquares.stream().mapToDouble(Double::doubleValue).toArray());
    }

    private boolean isEmpty(int index) {
      return blocks.stream().allMatch(block -> block[index] == 0);
    }
  }

  public int size() {
    return counts.length;
  }

  public int firstClass() {
    return firstClass;
  }

  /** How many classes each block has. */
  public int classes() {
    return counts.length == 0 ? 0 : counts[0].length;
  }

  public int count(int block, int column) {
    return counts[block][column];
  }

  public double meanSquare(int block) {
    return meanSquares[block];
  }

  /**
   * The magnitude that a share of the values in the blocks drawn does not exceed.
   *
   * @param share between 0 and 1
   * @param times how often each block was drawn
   */
  public double quantile(double share, int[] times) {
    long total = 0;
    long[] sum = new long[classes()];
    for (int b = 0; b < counts.length; b++) {
      for (int k = 0; times[b] > 0 && k < sum.length; k++) {
        sum[k] += (long) times[b] * counts[b][k];
        total += (long) times[b] * counts[b][k];
      }
    }
    double wanted = share * total;
    long below = 0;
    for (int k = 0; k < sum.length; k++) {
      if (sum[k] > 0 && below + sum[k] >= wanted) {
        double from = border(k);
        return from + (border(k + 1) - from) * (wanted - below) / sum[k];
      }
      below += sum[k];
    }
    throw new IllegalArgumentException("share " + share + " of " + total + " values");
  }

  /** Root mean square over the blocks drawn. */
  public double rms(int[] times) {
    double sum = 0;
    long drawn = 0;
    for (int b = 0; b < meanSquares.length; b++) {
      sum += times[b] * meanSquares[b];
      drawn += times[b];
    }
    return Math.sqrt(sum / drawn);
  }

  private double border(int column) {
    return Float.intBitsToFloat((firstClass + column) << DROPPED_BITS);
  }
}
