package turnsheet.core.stats;

/**
 * Statistics of the periods of a pulse train. A period counts where both its edges are real; what
 * needs several neighbouring periods counts where all of them do.
 *
 * <p>The noise of a single edge is read from fourth differences of edge times: a fluctuation at a
 * tenth of the edge rate enters with 0.02 of its time error, slow ones not at all, while white
 * noise of one edge enters with sqrt(70), the root of the sum of squares of 1, 4, 6, 4, 1. What
 * repeats from tooth to tooth without being noise, such as uneven teeth, is in it as well.
 */
public final class PeriodStatistics implements EdgeSink {

  private static final double FOURTH_DIFFERENCE_GAIN = Math.sqrt(70);

  /**
   * Variance of the noise variance against as many independent values: one and twice the sum of the
   * squared correlations 56, 28, 8, 1 over 70 of neighbouring fourth differences.
   */
  private static final double FOURTH_DIFFERENCE_SPREAD = 1 + 2 * (3136 + 784 + 64 + 1) / 4900.0;

  private static final double JUMP = 0.15;

  private final double medianSeconds;
  private final double nearSeconds;
  private final double jumpSeconds;
  private final Moments periods = new Moments();

  /** Sums of squares, and of how many: about zero, so that nothing can cancel. */
  private double stepSquares;

  private long steps;
  private double fourthSquares;
  private long fourths;

  /** The edges before the latest, the newest first. */
  private double before1;

  private double before2;
  private double before3;
  private double before4;
  private int run;
  private long outside;
  private long jumps;
  private long edges;
  private double first = Double.NaN;
  private double last = Double.NaN;
  private long span;

  /**
   * @param medianSeconds typical period, for counting how many lie far from it
   * @param nearShare what is not far, as a share of that period
   */
  public PeriodStatistics(double medianSeconds, double nearShare) {
    this.medianSeconds = medianSeconds;
    this.nearSeconds = nearShare * medianSeconds;
    this.jumpSeconds = JUMP * medianSeconds;
  }

  @Override
  public void edge(double seconds, boolean real) {
    if (!Double.isNaN(first)) {
      span++;
    } else {
      first = seconds;
    }
    last = seconds;
    if (!real) {
      run = 0;
      return;
    }
    edges++;
    run++;
    if (run >= 2) {
      double period = seconds - before1;
      periods.add(period);
      if (Math.abs(period - medianSeconds) > nearSeconds) {
        outside++;
      }
    }
    if (run >= 3) {
      double step = seconds - 2 * before1 + before2;
      stepSquares += step * step;
      steps++;
      if (Math.abs(step) > jumpSeconds) {
        jumps++;
      }
    }
    if (run >= 5) {
      double fourth = before4 - 4 * before3 + 6 * before2 - 4 * before1 + seconds;
      fourthSquares += fourth * fourth;
      fourths++;
    }
    before4 = before3;
    before3 = before2;
    before2 = before1;
    before1 = seconds;
  }

  /** Real edges. */
  public long edges() {
    return edges;
  }

  /** From the first edge to the last. */
  public double spanSeconds() {
    return last - first;
  }

  /** Mean period over the whole span, repaired edges counted. */
  public double meanSeconds() {
    return (last - first) / span;
  }

  /** Moments of the single periods, in seconds. */
  public Moments periods() {
    return periods;
  }

  /** Root mean square of the difference of successive periods, in seconds; NaN without any. */
  public double cycleToCycleSeconds() {
    return steps < 1 ? Double.NaN : Math.sqrt(stepSquares / steps);
  }

  /** Standard deviation of one edge about its even place, in seconds; NaN where too few. */
  public double edgeNoiseSeconds() {
    return fourths < 2 ? Double.NaN : Math.sqrt(fourthSquares / fourths) / FOURTH_DIFFERENCE_GAIN;
  }

  /** Relative standard uncertainty of that, for Gaussian noise. */
  public double edgeNoiseRelativeUncertainty() {
    return Math.sqrt(FOURTH_DIFFERENCE_SPREAD / (2.0 * fourths));
  }

  /** Share of the periods that lie far from the typical one. */
  public double shareOutside() {
    return (double) outside / Math.max(1, periods.count());
  }

  /** Share of the periods that differ from the one before by more than 15 % of the typical one. */
  public double shareOfJumps() {
    return (double) jumps / Math.max(1, steps);
  }

  public long steps() {
    return steps;
  }
}
