package turnsheet.core.diagnose.wheel;

/** Fourier coefficients of what goes round a wheel. */
final class Harmonics {

  private Harmonics() {}

  /**
   * Coefficients: mean over the places of value times exp(-2 pi i m j / places). Any number of
   * places; the effort grows with its square.
   */
  static void transform(double[] valueRe, double[] valueIm, double[] re, double[] im) {
    int n = valueRe.length;
    double[] cos = new double[n];
    double[] sin = new double[n];
    for (int j = 0; j < n; j++) {
      cos[j] = Math.cos(2 * Math.PI * j / n);
      sin[j] = Math.sin(2 * Math.PI * j / n);
    }
    for (int m = 0; m < n; m++) {
      double a = 0;
      double b = 0;
      int at = 0;
      for (int j = 0; j < n; j++) {
        a += valueRe[j] * cos[at] + valueIm[j] * sin[at];
        b += valueIm[j] * cos[at] - valueRe[j] * sin[at];
        at += m;
        at = at >= n ? at - n : at;
      }
      re[m] = a / n;
      im[m] = b / n;
    }
  }

  /** The real values round the wheel that coefficients 1 to half the places stand for. */
  static double[] values(int n, double[] re, double[] im) {
    double[] values = new double[n];
    for (int m = 1; m <= n / 2; m++) {
      int twice = 2 * m == n ? 1 : 2;
      for (int j = 0; j < n; j++) {
        double angle = 2 * Math.PI * ((long) m * j % n) / n;
        values[j] += twice * (re[m] * Math.cos(angle) - im[m] * Math.sin(angle));
      }
    }
    return values;
  }
}
