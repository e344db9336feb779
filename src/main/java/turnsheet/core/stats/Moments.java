package turnsheet.core.stats;

/**
 * Mean, spread and extremes of a stream of values, in one pass.
 *
 * <p>Values are gathered in short blocks. Within a block the deviations are taken from its first
 * value and then from its mean (two passes over values at hand); blocks are joined by the formula
 * of Chan, Golub and LeVeque, The American Statistician 37 (1983) 242-247. Means are kept as the
 * sum of two doubles and the sum of squares is compensated (Neumaier, ZAMM 54 (1974) 39-51), so
 * that a large common offset costs no digits. One division for each block. Not safe for use by
 * several threads.
 */
public final class Moments {

  private static final int BLOCK = 64;

  private final double[] block = new double[BLOCK];
  private int filled;
  private long joined;
  private double mean;
  private double meanRest;
  private double squares;
  private double squaresRest;
  private double min = Double.POSITIVE_INFINITY;
  private double max = Double.NEGATIVE_INFINITY;

  /** Takes one finite value. */
  public void add(double value) {
    block[filled++] = value;
    if (filled == BLOCK) {
      join();
    }
  }

  /** Adds what was gathered to the whole. */
  private void join() {
    if (filled == 0) {
      return;
    }
    double pivot = block[0];
    double sum = 0;
    double low = min;
    double high = max;
    for (int i = 0; i < filled; i++) {
      double value = block[i];
      sum += value - pivot;
      low = value < low ? value : low;
      high = value > high ? value : high;
    }
    min = low;
    max = high;
    double offset = sum / filled;
    double own = 0;
    double rest = 0;
    for (int i = 0; i < filled; i++) {
      double deviation = (block[i] - pivot) - offset;
      own += deviation * deviation;
      rest += deviation;
    }
    join(filled, pivot, offset + rest / filled, Math.max(0, own - rest * rest / filled));
    filled = 0;
  }

  /** A block's mean comes as a sum of two numbers as well. */
  private void join(int count, double blockMean, double blockRest, double blockSquares) {
    if (joined == 0) {
      mean = blockMean;
      meanRest = blockRest;
    } else {
      double apart = (blockMean - mean) + (blockRest - meanRest);
      double share = (double) count / (joined + count);
      double step = apart * share + meanRest;
      double moved = mean + step;
      meanRest = (mean - moved) + step;
      mean = moved;
      addSquares(apart * apart * share * joined);
    }
    addSquares(blockSquares);
    joined += count;
  }

  private void addSquares(double term) {
    double sum = squares + term;
    squaresRest +=
        Math.abs(squares) >= Math.abs(term) ? (squares - sum) + term : (term - sum) + squares;
    squares = sum;
  }

  public long count() {
    return joined + filled;
  }

  /** Arithmetic mean; at least one value must have come. */
  public double mean() {
    require(1);
    join();
    return mean + meanRest;
  }

  /** Standard deviation with n - 1; at least two values must have come. */
  public double sampleStdDev() {
    require(2);
    return Math.sqrt(sumOfSquares() / (count() - 1));
  }

  /** Sum of squared deviations from the mean. */
  public double sumOfSquares() {
    join();
    return squares + squaresRest;
  }

  /** Root mean square about zero; at least one value must have come. */
  public double rootMeanSquare() {
    require(1);
    double m = mean();
    return Math.sqrt(sumOfSquares() / count() + m * m);
  }

  public double min() {
    require(1);
    join();
    return min;
  }

  public double max() {
    require(1);
    join();
    return max;
  }

  private void require(long needed) {
    if (count() < needed) {
      throw new IllegalStateException(count() + " values, " + needed + " needed");
    }
  }
}
