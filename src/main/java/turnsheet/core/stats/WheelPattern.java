package turnsheet.core.stats;

/**
 * The part of the edge times that repeats each turn of the sensor wheel, by synchronous averaging:
 * the place of every tooth between the first edge of a turn and the first of the next one, averaged
 * over the turns.
 *
 * <p>Uneven teeth and an eccentric wheel are in it, and so is a true speed variation that repeats
 * once per turn or at its multiples: this average alone cannot tell them apart.
 */
public final class WheelPattern implements EdgeSink {

  private static final int FEWEST_TURNS = 4;
  private static final int[] DIFFERENCE = {1, -4, 6, -4, 1};

  private final int teeth;
  private final double[] turn;
  private final boolean[] real;
  private final Sums whole;
  private final Sums gapped;
  private int filled;

  public WheelPattern(int teeth) {
    this.teeth = teeth;
    this.turn = new double[teeth + 1];
    this.real = new boolean[teeth + 1];
    this.whole = new Sums(teeth);
    this.gapped = new Sums(teeth);
  }

  @Override
  public void edge(double seconds, boolean isReal) {
    turn[filled] = seconds;
    real[filled] = isReal;
    filled++;
    if (filled > teeth) {
      take();
      turn[0] = turn[teeth];
      real[0] = real[teeth];
      filled = 1;
    }
  }

  private void take() {
    if (!real[0] || !real[teeth]) {
      return;
    }
    double length = turn[teeth] - turn[0];
    double mean = 0;
    double[] place = new double[teeth];
    int there = 0;
    for (int j = 0; j < teeth; j++) {
      if (real[j]) {
        // in periods, so that a slow change of speed drops out
        place[j] = (turn[j] - turn[0]) / length * teeth - j;
        mean += place[j];
        there++;
      }
    }
    Sums sums = there == teeth ? whole : gapped;
    sums.turns++;
    for (int j = 0; j < teeth; j++) {
      if (real[j]) {
        double d = place[j] - mean / there;
        sums.sum[j] += d;
        sums.squares[j] += d * d;
        sums.count[j]++;
      }
    }
  }

  /** Turns of one kind, place by place. */
  private static final class Sums {
    private final double[] sum;
    private final double[] squares;
    private final long[] count;
    private long turns;

    Sums(int teeth) {
      sum = new double[teeth];
      squares = new double[teeth];
      count = new long[teeth];
    }

    /** A place that is empty in half of the turns is that of a reference mark. */
    boolean tooth(int j) {
      return 2 * count[j] > turns && count[j] > 1;
    }

    double mean(int j) {
      return sum[j] / count[j];
    }
  }

  /** Whole turns; of a wheel with a reference mark, which has none, those that lack teeth. */
  private Sums sums() {
    return whole.turns >= FEWEST_TURNS ? whole : gapped;
  }

  /** Turns that the pattern is averaged over. */
  public long turns() {
    return sums().turns;
  }

  /** Whether enough turns came to speak of a pattern. */
  public boolean known() {
    return turns() >= FEWEST_TURNS && teeth >= 2;
  }

  /**
   * Root mean square of the pattern in periods, cleared of what the scatter from turn to turn lends
   * it.
   */
  public double rmsPeriods() {
    return Math.sqrt(Math.max(0, meanSquare() - scatterOfMeans()));
  }

  /** Standard uncertainty of that, from the scatter from turn to turn. */
  public double rmsUncertaintyPeriods() {
    double scatter = scatterOfMeans();
    double rms = rmsPeriods();
    // of a small pattern the scatter itself is the uncertainty; else d(rms) = d(ms) / (2 rms), the
    // mean square of the pattern times noise over the teeth
    return rms > 0
        ? Math.min(Math.sqrt(scatter), Math.sqrt(scatter / teeth) + scatter / (2 * rms))
        : Math.sqrt(scatter);
  }

  /** Mean square of the fourth difference of the pattern round the wheel, in squared periods. */
  public double fourthDifferenceMeanSquare() {
    Sums sums = sums();
    double total = 0;
    int used = 0;
    for (int j = 0; j < teeth; j++) {
      double d = 0;
      boolean there = true;
      for (int i = 0; i < DIFFERENCE.length; i++) {
        int at = (j + i) % teeth;
        there &= sums.tooth(at);
        d += DIFFERENCE[i] * (sums.tooth(at) ? sums.mean(at) : 0);
      }
      if (there) {
        total += d * d;
        used++;
      }
    }
    // what the scatter from turn to turn lends the averages is not pattern
    return Math.max(0, total / Math.max(1, used) - 70 * scatterOfMeans());
  }

  private double meanSquare() {
    Sums sums = sums();
    double total = 0;
    int there = 0;
    for (int j = 0; j < teeth; j++) {
      if (sums.tooth(j)) {
        total += sums.mean(j) * sums.mean(j);
        there++;
      }
    }
    return total / Math.max(1, there);
  }

  private double scatterOfMeans() {
    Sums sums = sums();
    double scatter = 0;
    int there = 0;
    for (int j = 0; j < teeth; j++) {
      if (sums.tooth(j)) {
        double mean = sums.mean(j);
        scatter += Math.max(0, sums.squares[j] / sums.count[j] - mean * mean) / (sums.count[j] - 1);
        there++;
      }
    }
    return scatter / Math.max(1, there);
  }
}
