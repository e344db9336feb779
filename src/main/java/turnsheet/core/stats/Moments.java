package turnsheet.core.stats;

/**
 * Mean, spread and extremes of a stream of values, in one pass.
 *
 * <p>The recurrence of Welford, Technometrics 4 (1962) 419-420. The mean is kept as the sum of two
 * doubles and the sum of squares is compensated (Neumaier, ZAMM 54 (1974) 39-51), so that a large
 * common offset costs no digits. Not safe for use by several threads.
 */
public final class Moments {

  private long count;
  private double mean;
  private double meanRest;
  private double squares;
  private double squaresRest;
  private double min = Double.POSITIVE_INFINITY;
  private double max = Double.NEGATIVE_INFINITY;

  /** Takes one finite value. */
  public void add(double value) {
    count++;
    double before = (value - mean) - meanRest;
    double step = before / count + meanRest;
    double moved = mean + step;
    meanRest = (mean - moved) + step;
    mean = moved;
    double after = (value - mean) - meanRest;
    double term = before * after;
    double sum = squares + term;
    squaresRest +=
        Math.abs(squares) >= Math.abs(term) ? (squares - sum) + term : (term - sum) + squares;
    squares = sum;
    min = Math.min(min, value);
    max = Math.max(max, value);
  }

  public long count() {
    return count;
  }

  /** Arithmetic mean; at least one value must have come. */
  public double mean() {
    require(1);
    return mean + meanRest;
  }

  /** Standard deviation with n - 1; at least two values must have come. */
  public double sampleStdDev() {
    require(2);
    return Math.sqrt(sumOfSquares() / (count - 1));
  }

  /** Sum of squared deviations from the mean. */
  public double sumOfSquares() {
    return squares + squaresRest;
  }

  /** Root mean square about zero; at least one value must have come. */
  public double rootMeanSquare() {
    require(1);
    double m = mean();
    return Math.sqrt(sumOfSquares() / count + m * m);
  }

  public double min() {
    require(1);
    return min;
  }

  public double max() {
    require(1);
    return max;
  }

  private void require(long needed) {
    if (count < needed) {
      throw new IllegalStateException(count + " values, " + needed + " needed");
    }
  }
}
