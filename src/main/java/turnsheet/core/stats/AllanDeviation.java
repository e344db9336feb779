package turnsheet.core.stats;

/**
 * Time-domain stability of an evenly spaced phase, after NIST Special Publication 1065 (2008)
 * section 5 and IEEE Std 1139.
 *
 * <p>Phase values x[0..N-1] in seconds, spaced by tau0 seconds; averaging over m steps, tau = m
 * tau0. The results are relative frequencies, but for the time deviation, which is in seconds.
 * Where fewer phases come than one term needs the result is NaN.
 */
public final class AllanDeviation {

  private AllanDeviation() {}

  /** Phase of a sequence of relative frequencies: a running sum that starts at zero, N + 1 long. */
  public static double[] phaseOf(double[] frequency, double tau0Seconds) {
    double[] phase = new double[frequency.length + 1];
    double sum = 0;
    double rest = 0;
    for (int i = 0; i < frequency.length; i++) {
      double step = frequency[i] * tau0Seconds - rest;
      double next = sum + step;
      rest = (next - sum) - step;
      sum = next;
      phase[i + 1] = sum;
    }
    return phase;
  }

  /** Allan deviation from adjoining averages, without overlap. */
  public static double plain(double[] phase, double tau0Seconds, int m) {
    return secondDifferences(phase, tau0Seconds, m, m);
  }

  /** Allan deviation from every start: the usual estimator. */
  public static double overlapping(double[] phase, double tau0Seconds, int m) {
    return secondDifferences(phase, tau0Seconds, m, 1);
  }

  /** Modified Allan deviation. */
  public static double modified(double[] phase, double tau0Seconds, int m) {
    int terms = phase.length - 3 * m + 1;
    if (m < 1 || terms < 1) {
      return Double.NaN;
    }
    double inner = 0;
    for (int i = 0; i < m; i++) {
      inner += phase[i + 2 * m] - 2 * phase[i + m] + phase[i];
    }
    double sum = inner * inner;
    for (int j = 1; j < terms; j++) {
      inner +=
          phase[j - 1 + 3 * m] - 3 * phase[j - 1 + 2 * m] + 3 * phase[j - 1 + m] - phase[j - 1];
      sum += inner * inner;
    }
    double tau = m * tau0Seconds;
    return Math.sqrt(sum / (2.0 * m * m * terms)) / tau;
  }

  /** Time deviation, in seconds. */
  public static double time(double[] phase, double tau0Seconds, int m) {
    return modified(phase, tau0Seconds, m) * m * tau0Seconds / Math.sqrt(3);
  }

  /** Hadamard deviation from adjoining averages, without overlap: blind to linear drift. */
  public static double hadamard(double[] phase, double tau0Seconds, int m) {
    return thirdDifferences(phase, tau0Seconds, m, m);
  }

  /** Hadamard deviation from every start. */
  public static double overlappingHadamard(double[] phase, double tau0Seconds, int m) {
    return thirdDifferences(phase, tau0Seconds, m, 1);
  }

  private static double secondDifferences(double[] x, double tau0Seconds, int m, int step) {
    double sum = 0;
    long terms = 0;
    for (int i = 0; m >= 1 && i + 2 * m < x.length; i += step) {
      double d = x[i + 2 * m] - 2 * x[i + m] + x[i];
      sum += d * d;
      terms++;
    }
    return Math.sqrt(sum / (2.0 * terms)) / (m * tau0Seconds);
  }

  private static double thirdDifferences(double[] x, double tau0Seconds, int m, int step) {
    double sum = 0;
    long terms = 0;
    for (int i = 0; m >= 1 && i + 3 * m < x.length; i += step) {
      double d = x[i + 3 * m] - 3 * x[i + 2 * m] + 3 * x[i + m] - x[i];
      sum += d * d;
      terms++;
    }
    return Math.sqrt(sum / (6.0 * terms)) / (m * tau0Seconds);
  }
}
