package turnsheet.core.diagnose.wheel;

/**
 * Least squares of complex values: a constant, and where wanted a known law times a second
 * constant. Values and law hold real and imaginary part of each.
 */
final class TwoPartFit {

  /** Below this share of its own length the law does not differ enough from a constant. */
  private static final double LEAST_APART = 1e-6;

  final double constantRe;
  final double constantIm;
  private final double lawRe;
  private final double lawIm;

  /** Sum of the squares of what is left. */
  final double rest;

  private final int n;
  private final double squares;
  private final double apart;

  static TwoPartFit constant(double[][] values) {
    return new TwoPartFit(values, new double[values.length][2]);
  }

  TwoPartFit(double[][] values, double[][] law) {
    n = values.length;
    double lr = 0;
    double li = 0;
    double vr = 0;
    double vi = 0;
    for (int i = 0; i < n; i++) {
      lr += law[i][0] / n;
      li += law[i][1] / n;
      vr += values[i][0] / n;
      vi += values[i][1] / n;
    }
    double all = 0;
    double about = 0;
    double crossRe = 0;
    double crossIm = 0;
    for (int i = 0; i < n; i++) {
      double a = law[i][0] - lr;
      double b = law[i][1] - li;
      double x = values[i][0] - vr;
      double y = values[i][1] - vi;
      all += law[i][0] * law[i][0] + law[i][1] * law[i][1];
      about += a * a + b * b;
      // the conjugate of the law times the value
      crossRe += a * x + b * y;
      crossIm += a * y - b * x;
    }
    squares = all;
    apart = about;
    boolean told = about > LEAST_APART * all;
    lawRe = told ? crossRe / about : 0;
    lawIm = told ? crossIm / about : 0;
    constantRe = vr - (lawRe * lr - lawIm * li);
    constantIm = vi - (lawRe * li + lawIm * lr);
    double left = 0;
    for (int i = 0; i < n; i++) {
      double x = values[i][0] - constantRe - (lawRe * law[i][0] - lawIm * law[i][1]);
      double y = values[i][1] - constantIm - (lawRe * law[i][1] + lawIm * law[i][0]);
      left += x * x + y * y;
    }
    rest = left;
  }

  /** Whether law and constant can be told apart. */
  boolean separate() {
    return apart > LEAST_APART * squares;
  }

  /** Size of what follows the law, where the law is 1. */
  double motion() {
    return Math.hypot(lawRe, lawIm);
  }

  /** Standard deviation of that from the scatter about the fit. */
  double motionScatter() {
    return Math.sqrt(rest / (n - 2) / apart);
  }

  /** Mean square of the error of the constant. */
  double constantNoise() {
    return rest / (n - 2) * squares / n / apart;
  }
}
