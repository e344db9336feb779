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
  private final double nearShare;
  private final Moments periods = new Moments();
  private final Moments steps = new Moments();
  private final Moments fourth = new Moments();
  private final double[] times = new double[5];
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
    this.nearShare = nearShare;
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
    System.arraycopy(times, 1, times, 0, 4);
    times[4] = seconds;
    run++;
    if (run >= 2) {
      double period = times[4] - times[3];
      periods.add(period);
      if (Math.abs(period / medianSeconds - 1) > nearShare) {
        outside++;
      }
    }
    if (run >= 3) {
      double step = times[4] - 2 * times[3] + times[2];
      steps.add(step);
      if (Math.abs(step) > JUMP * medianSeconds) {
        jumps++;
      }
    }
    if (run >= 5) {
      fourth.add(times[0] - 4 * times[1] + 6 * times[2] - 4 * times[3] + times[4]);
    }
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
    return steps.count() < 1 ? Double.NaN : steps.rootMeanSquare();
  }

  /** Standard deviation of one edge about its even place, in seconds; NaN where too few. */
  public double edgeNoiseSeconds() {
    return fourth.count() < 2 ? Double.NaN : fourth.rootMeanSquare() / FOURTH_DIFFERENCE_GAIN;
  }

  /** Relative standard uncertainty of that, for Gaussian noise. */
  public double edgeNoiseRelativeUncertainty() {
    return Math.sqrt(FOURTH_DIFFERENCE_SPREAD / (2.0 * fourth.count()));
  }

  /** Share of the periods that lie far from the typical one. */
  public double shareOutside() {
    return (double) outside / Math.max(1, periods.count());
  }

  /** Share of the periods that differ from the one before by more than 15 % of the typical one. */
  public double shareOfJumps() {
    return (double) jumps / Math.max(1, steps.count());
  }

  public long steps() {
    return steps.count();
  }
}
