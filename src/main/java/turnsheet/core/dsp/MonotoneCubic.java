package turnsheet.core.dsp;

/**
 * Piecewise cubic through given points that adds no extremum of its own.
 *
 * <p>Source: F. N. Fritsch and J. Butland, "A method for constructing local monotone piecewise
 * cubic interpolants", SIAM J. Sci. Stat. Comput. 5 (1984), 300-304: inner slopes are weighted
 * harmonic means, end slopes follow from three points and are held to the sign of the first secant.
 */
final class MonotoneCubic {

  private final double[] x;
  private final double[] y;
  private final double[] slope;

  /** Takes at least three points in ascending order of x. */
  MonotoneCubic(double[] x, double[] y) {
    this.x = x.clone();
    this.y = y.clone();
    this.slope = slopes(x, y);
  }

  /** The value at a place between the first and the last point. */
  double at(double place) {
    int k = 0;
    while (k < x.length - 2 && place > x[k + 1]) {
      k++;
    }
    double h = x[k + 1] - x[k];
    double t = (place - x[k]) / h;
    double u = 1 - t;
    return u * u * ((1 + 2 * t) * y[k] + t * h * slope[k])
        + t * t * ((1 + 2 * u) * y[k + 1] - u * h * slope[k + 1]);
  }

  private static double[] slopes(double[] x, double[] y) {
    int n = x.length;
    double[] h = new double[n - 1];
    double[] secant = new double[n - 1];
    for (int k = 0; k < n - 1; k++) {
      h[k] = x[k + 1] - x[k];
      secant[k] = (y[k + 1] - y[k]) / h[k];
    }
    double[] d = new double[n];
    for (int k = 1; k < n - 1; k++) {
      if (secant[k - 1] * secant[k] > 0) {
        double a = 2 * h[k] + h[k - 1];
        double b = h[k] + 2 * h[k - 1];
        d[k] = (a + b) / (a / secant[k - 1] + b / secant[k]);
      }
    }
    d[0] = endSlope(h[0], h[1], secant[0], secant[1]);
    d[n - 1] = endSlope(h[n - 2], h[n - 3], secant[n - 2], secant[n - 3]);
    return d;
  }

  private static double endSlope(double h0, double h1, double s0, double s1) {
    double d = ((2 * h0 + h1) * s0 - h0 * s1) / (h0 + h1);
    if (d * s0 <= 0) {
      return 0;
    }
    return s0 * s1 <= 0 && Math.abs(d) > 3 * Math.abs(s0) ? 3 * s0 : d;
  }
}
