package turnsheet.core.stats;

import java.util.Arrays;

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

  private final int teeth;
  private final double[] turn;
  private final boolean[] real;
  private final double[] sum;
  private final double[] squares;
  private int filled;
  private long turns;

  public WheelPattern(int teeth) {
    this.teeth = teeth;
    this.turn = new double[teeth + 1];
    this.real = new boolean[teeth + 1];
    this.sum = new double[teeth];
    this.squares = new double[teeth];
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
    for (boolean r : real) {
      if (!r) {
        return;
      }
    }
    double whole = turn[teeth] - turn[0];
    double mean = 0;
    double[] place = new double[teeth];
    for (int j = 0; j < teeth; j++) {
      // in periods, so that a slow change of speed drops out
      place[j] = (turn[j] - turn[0]) / whole * teeth - j;
      mean += place[j] / teeth;
    }
    for (int j = 0; j < teeth; j++) {
      double d = place[j] - mean;
      sum[j] += d;
      squares[j] += d * d;
    }
    turns++;
  }

  /** Whole turns without a repaired edge. */
  public long turns() {
    return turns;
  }

  /** Whether enough turns came to speak of a pattern. */
  public boolean known() {
    return turns >= FEWEST_TURNS && teeth >= 2;
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
    double total = 0;
    for (int j = 0; j < teeth; j++) {
      double d =
          sum[j]
              - 4 * sum[(j + 1) % teeth]
              + 6 * sum[(j + 2) % teeth]
              - 4 * sum[(j + 3) % teeth]
              + sum[(j + 4) % teeth];
      total += d * d / turns / turns;
    }
    // what the scatter from turn to turn lends the averages is not pattern
    return Math.max(0, total / teeth - 70 * scatterOfMeans());
  }

  private double meanSquare() {
    return Arrays.stream(sum).map(s -> s / turns).map(p -> p * p).sum() / teeth;
  }

  private double scatterOfMeans() {
    double scatter = 0;
    for (int j = 0; j < teeth; j++) {
      double mean = sum[j] / turns;
      scatter += Math.max(0, squares[j] / turns - mean * mean) / (turns - 1);
    }
    return scatter / teeth;
  }
}
