package turnsheet.core.stats;

/**
 * How well a mean square is known, from its scatter between blocks of a stream: the values within a
 * block may hang together, the blocks hardly do.
 */
public final class BlockScatter {

  private static final int FEWEST_BLOCKS = 5;

  private final int blockLength;
  private final Moments blocks = new Moments();
  private double sum;
  private int filled;

  public BlockScatter(int blockLength) {
    if (blockLength < 1) {
      throw new IllegalArgumentException("block of " + blockLength);
    }
    this.blockLength = blockLength;
  }

  /** Takes one value, not its square. */
  public void add(double value) {
    sum += value * value;
    if (++filled == blockLength) {
      blocks.add(sum / blockLength);
      sum = 0;
      filled = 0;
    }
  }

  /** Relative standard uncertainty of the root mean square; NaN where too few blocks came. */
  public double relativeUncertainty() {
    if (blocks.count() < FEWEST_BLOCKS) {
      return Double.NaN;
    }
    double mean = blocks.mean();
    return mean > 0 ? blocks.sampleStdDev() / Math.sqrt((double) blocks.count()) / mean / 2 : 0;
  }
}
