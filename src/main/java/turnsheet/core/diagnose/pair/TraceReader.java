package turnsheet.core.diagnose.pair;

import turnsheet.core.signal.SpeedTrace;

/**
 * Reads a speed trace at any evenly spaced moments, as deviation relative to its mean with a
 * straight line taken off. It is read as the time that a turn takes, with the sign turned: errors
 * of edges enter that in proportion, while the speed, its reciprocal, also shows their square as
 * slow fluctuation.
 *
 * <p>Between samples by a Kaiser-windowed sinc: right to 80 dB up to 0.4 of the trace's rate.
 */
final class TraceReader {

  private static final int HALF = 13;
  private static final int PHASES = 512;
  private static final double BETA = 0.1102 * (80 - 8.7);
  private static final double[][] TABLE = table();

  private final SpeedTrace trace;
  private final double mean;
  private final double slope;
  private double[] copied = new double[0];

  TraceReader(SpeedTrace trace) {
    this.trace = trace;
    int n = trace.length();
    double sum = 0;
    for (int i = 0; i < n; i++) {
      sum += slowness(trace.percent(i));
    }
    mean = sum / n;
    double moment = 0;
    double square = 0;
    for (int i = 0; i < n; i++) {
      double x = i - (n - 1) / 2.0;
      moment += x * (slowness(trace.percent(i)) - mean);
      square += x * x;
    }
    slope = moment / square;
  }

  private static double slowness(double percent) {
    return 100 / (100 + percent);
  }

  /** First moment that can be read, in the trace's own time. */
  double fromSeconds() {
    return trace.startSeconds() + HALF / trace.rateHertz();
  }

  /** Last moment that can be read. */
  double toSeconds() {
    return trace.startSeconds() + (trace.length() - 1 - HALF) / trace.rateHertz();
  }

  /**
   * Reads values, relative to the mean speed.
   *
   * @param startSeconds in the trace's own time, at {@link #fromSeconds} or later
   */
  void read(double startSeconds, double stepSeconds, double[] into, int count) {
    double place = (startSeconds - trace.startSeconds()) * trace.rateHertz();
    double step = stepSeconds * trace.rateHertz();
    int first = (int) Math.floor(place) - HALF + 1;
    int last = Math.min(trace.length() - 1, (int) Math.floor(place + step * (count - 1)) + HALF);
    int length = last - first + 1;
    if (copied.length < length) {
      copied = new double[length];
    }
    trace.copyTo(first, copied, length);
    for (int i = 0; i < length; i++) {
      double x = first + i - (trace.length() - 1) / 2.0;
      copied[i] = (mean + slope * x - slowness(copied[i])) / mean;
    }
    for (int i = 0; i < count; i++) {
      double at = place + step * i - first;
      int base = (int) Math.floor(at);
      double phase = (at - base) * PHASES;
      int row = Math.min(PHASES - 1, (int) phase);
      double share = phase - row;
      double[] low = TABLE[row];
      double[] high = TABLE[row + 1];
      double sum = 0;
      int from = base - HALF + 1;
      int taps = Math.min(2 * HALF, length - from);
      for (int k = 0; k < taps; k++) {
        sum += (low[k] + share * (high[k] - low[k])) * copied[from + k];
      }
      into[i] = sum;
    }
  }

  private static double[][] table() {
    double[][] table = new double[PHASES + 1][2 * HALF];
    for (int p = 0; p <= PHASES; p++) {
      double sum = 0;
      for (int k = 0; k < 2 * HALF; k++) {
        double x = k - HALF + 1 - (double) p / PHASES;
        double r = Math.min(1, Math.abs(x) / HALF);
        double sinc = Math.abs(x) < 1e-9 ? 1 : StrictMath.sin(Math.PI * x) / (Math.PI * x);
        table[p][k] = sinc * bessel0(BETA * Math.sqrt(1 - r * r));
        sum += table[p][k];
      }
      for (int k = 0; k < 2 * HALF; k++) {
        table[p][k] /= sum;
      }
    }
    return table;
  }

  /** I0, by its series. */
  private static double bessel0(double x) {
    double term = 1;
    double sum = 1;
    for (int k = 1; term > 1e-17 * sum; k++) {
      term *= x * x / (4.0 * k * k);
      sum += term;
    }
    return sum;
  }
}
