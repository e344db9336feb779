package turnsheet.core.stats;

import org.hipparchus.stat.regression.SimpleRegression;

/**
 * The straight line through points by ordinary least squares, uncertainties from the scatter about
 * it.
 *
 * @param intercept at x = 0, in the unit of y
 * @param slope in the unit of y over that of x
 * @param interceptStdError standard uncertainty of the intercept
 * @param slopeStdError standard uncertainty of the slope, for scatter that is white from point to
 *     point
 * @param residualStdDev with n - 2
 * @param points how many, at least three
 */
public record LineFit(
    double intercept,
    double slope,
    double interceptStdError,
    double slopeStdError,
    double residualStdDev,
    long points) {

  /**
   * Fits points that come in any order.
   *
   * @param x not all equal
   * @param y as many
   */
  public static LineFit of(double[] x, double[] y) {
    if (x.length != y.length || x.length < 3) {
      throw new IllegalArgumentException(x.length + " x, " + y.length + " y");
    }
    SimpleRegression fit = new SimpleRegression();
    for (int i = 0; i < x.length; i++) {
      fit.addData(x[i], y[i]);
    }
    return new LineFit(
        fit.getIntercept(),
        fit.getSlope(),
        fit.getInterceptStdErr(),
        fit.getSlopeStdErr(),
        Math.sqrt(fit.getMeanSquareError()),
        fit.getN());
  }
}
