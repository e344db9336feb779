package turnsheet.core.diagnose.wheel;

/**
 * How far each edge lies from its even place, in periods, positive where it is late.
 *
 * <p>The even place is the edge times averaged over a turn, twice: such an average has zeros at the
 * rate of the turn and at all its multiples, so it follows the speed and holds nothing of a pattern
 * that repeats each turn, however strong. Divided by the local period the deviation of a wheel's
 * tooth is the same at any speed. Known from one turn after the beginning to one turn before the
 * end.
 */
final class Deviations {

  private final int from;
  private final double[] periods;
  private final double[] local;

  private Deviations(int from, double[] periods, double[] local) {
    this.from = from;
    this.periods = periods;
    this.local = local;
  }

  static Deviations of(EdgeTrain train, int places) {
    double[] t = train.seconds();
    int n = t.length;
    double mean = train.meanPeriodSeconds();
    // over an even line, so that long captures keep their digits
    double[] once = averages(n, places, k -> t[k] - t[0] - k * mean);
    double[] twice = averages(once.length, places, k -> once[k]);
    double[] periods = new double[Math.max(0, n - 2 * places + 1)];
    double[] local = new double[periods.length];
    for (int i = 0; i < periods.length; i++) {
      int k = i + places;
      local[i] = mean + (once[k] - once[k - places]) / places;
      periods[i] = (t[k] - t[0] - k * mean - twice[k - places + 1]) / local[i];
    }
    return new Deviations(places, periods, local);
  }

  private interface Values {
    double at(int k);
  }

  /** Means of as many neighbours as there are places, the first at the first of them. */
  private static double[] averages(int n, int places, Values values) {
    double[] means = new double[Math.max(0, n - places + 1)];
    double sum = 0;
    for (int k = 0; k < n; k++) {
      sum += values.at(k);
      if (k >= places) {
        sum -= values.at(k - places);
      }
      if (k >= places - 1) {
        means[k - places + 1] = sum / places;
      }
    }
    return means;
  }

  /** Number of the first edge whose deviation is known. */
  int from() {
    return from;
  }

  /** How many are known. */
  int size() {
    return periods.length;
  }

  /** Of the edge with number {@code from() + i}. */
  double periods(int i) {
    return periods[i];
  }

  /** Mean period over the turn about an edge of the train; at the ends that of the nearest. */
  double localSeconds(int k) {
    return local[Math.max(0, Math.min(local.length - 1, k - from))];
  }
}
