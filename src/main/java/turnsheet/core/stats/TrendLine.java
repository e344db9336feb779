package turnsheet.core.stats;

import java.util.Arrays;
import java.util.Optional;
import org.hipparchus.distribution.continuous.NormalDistribution;
import org.hipparchus.distribution.continuous.TDistribution;

/**
 * A weighted straight line through values of which each has an uncertainty of its own, while the
 * thing measured also wanders by itself: the variance of a value is u² plus one variance common to
 * all.
 *
 * <p>The common variance is the one at which the weighted squares of the residuals add up to n - 2,
 * or none where they add up to less without it (Paule and Mandel, J. Res. NBS 87 (1982) 377-385;
 * for lines DerSimonian and Kacker, Contemp. Clin. Trials 28 (2007) 105-114). Intervals hold 95 of
 * 100: the larger of what the scatter about the line says, with Student's t (Knapp and Hartung,
 * Stat. Med. 22 (2003) 2693-2710), and of what the variances say, with the normal distribution
 * (external and internal consistency after Birge, Phys. Rev. 40 (1932) 207-227). Values that happen
 * to lie closer to a line than their uncertainties allow therefore do not make it more certain.
 *
 * @param centre weighted mean of x
 * @param level of the line at the centre, in the unit of y
 * @param slope in the unit of y over that of x
 * @param commonVariance of the wandering, in the squared unit of y; 0 where the uncertainties
 *     explain the scatter or none were given
 * @param levelStdError standard uncertainty of the level from the variances alone
 * @param slopeStdError the same of the slope
 * @param factor half widths of 95 % in standard uncertainties
 * @param points how many, at least three
 */
public record TrendLine(
    double centre,
    double level,
    double slope,
    double commonVariance,
    double levelStdError,
    double slopeStdError,
    double factor,
    int points) {

  /** Share of the interval on one side of the line and below it. */
  private static final double SHARE = 0.975;

  private static final double NORMAL = new NormalDistribution().inverseCumulativeProbability(SHARE);
  private static final int HALVINGS = 200;

  /**
   * Fits values in any order.
   *
   * @param x not all equal
   * @param y as many
   * @param u standard uncertainties, as many; where one is not positive all are passed over, and
   *     the line is that of ordinary least squares
   */
  public static TrendLine of(double[] x, double[] y, double[] u) {
    int n = x.length;
    if (n < 3 || y.length != n || u.length != n) {
      throw new IllegalArgumentException(n + " x, " + y.length + " y, " + u.length + " u");
    }
    double students = new TDistribution(n - 2).inverseCumulativeProbability(SHARE);
    if (!Arrays.stream(u).allMatch(one -> one > 0)) {
      double[] alike = new double[n];
      Arrays.fill(alike, 1);
      Weighted plain = Weighted.fit(x, y, alike);
      return plain.line(0, students * Math.sqrt(plain.squares() / (n - 2)), n);
    }
    double common = commonVariance(x, y, u);
    Weighted fit = Weighted.fit(x, y, weights(u, common));
    double external = students * Math.sqrt(fit.squares() / (n - 2));
    return fit.line(common, Math.max(external, NORMAL), n);
  }

  public double at(double x) {
    return level + slope * (x - centre);
  }

  /** Half width of the band that holds the line itself, at one place, in 95 of 100 cases. */
  public double halfWidthAt(double x) {
    return factor * Math.hypot(levelStdError, slopeStdError * (x - centre));
  }

  public double slopeHalfWidth() {
    return factor * slopeStdError;
  }

  /** Whether the slope differs from none at 95 %. */
  public boolean isSignificant() {
    return Math.abs(slope) > slopeHalfWidth();
  }

  /**
   * Where the line meets a level, with the places where its band does (Fieller, J. R. Stat. Soc. B
   * 16 (1954) 175-185).
   *
   * @return empty where the slope cannot be told from none: the places are not bounded then
   */
  public Optional<Crossing> crossing(double value) {
    if (!isSignificant()) {
      return Optional.empty();
    }
    // (slope d - rise)² = factor² (levelStdError² + slopeStdError² d²), d from the centre
    double rise = value - level;
    double quadratic = slope * slope - slopeHalfWidth() * slopeHalfWidth();
    double halfLinear = slope * rise;
    double constant = rise * rise - factor * factor * levelStdError * levelStdError;
    double root = Math.sqrt(Math.max(0, halfLinear * halfLinear - quadratic * constant));
    return Optional.of(
        new Crossing(
            centre + rise / slope,
            centre + (halfLinear - root) / quadratic,
            centre + (halfLinear + root) / quadratic));
  }

  /**
   * A place on the axis of x with its interval of 95 %, which need not lie evenly about it.
   *
   * @param from not above {@code at}
   * @param to not below {@code at}
   */
  public record Crossing(double at, double from, double to) {}

  /** The sum of weighted squares falls as the variance grows, so that halving finds it. */
  private static double commonVariance(double[] x, double[] y, double[] u) {
    double wanted = x.length - 2.0;
    double low = 0;
    if (squares(x, y, u, low) <= wanted) {
      return 0;
    }
    double high = Arrays.stream(u).map(one -> one * one).max().orElseThrow();
    while (squares(x, y, u, high) > wanted) {
      low = high;
      high *= 2;
    }
    for (int i = 0; i < HALVINGS; i++) {
      double middle = low + (high - low) / 2;
      if (middle <= low || middle >= high) {
        break;
      }
      if (squares(x, y, u, middle) > wanted) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return high;
  }

  private static double squares(double[] x, double[] y, double[] u, double common) {
    return Weighted.fit(x, y, weights(u, common)).squares();
  }

  private static double[] weights(double[] u, double common) {
    return Arrays.stream(u).map(one -> 1 / (one * one + common)).toArray();
  }

  /**
   * Least squares with weights.
   *
   * @param spread weighted squares of x about the centre
   * @param squares weighted squares of the residuals
   */
  private record Weighted(
      double sum, double centre, double level, double slope, double spread, double squares) {

    static Weighted fit(double[] x, double[] y, double[] weights) {
      double sum = 0;
      double centre = 0;
      double level = 0;
      for (int i = 0; i < x.length; i++) {
        sum += weights[i];
        centre += weights[i] * x[i];
        level += weights[i] * y[i];
      }
      centre /= sum;
      level /= sum;
      double spread = 0;
      double together = 0;
      for (int i = 0; i < x.length; i++) {
        spread += weights[i] * (x[i] - centre) * (x[i] - centre);
        together += weights[i] * (x[i] - centre) * (y[i] - level);
      }
      if (!(spread > 0)) {
        throw new IllegalArgumentException("all x alike");
      }
      double slope = together / spread;
      double squares = 0;
      for (int i = 0; i < x.length; i++) {
        double residual = y[i] - level - slope * (x[i] - centre);
        squares += weights[i] * residual * residual;
      }
      return new Weighted(sum, centre, level, slope, spread, squares);
    }

    TrendLine line(double common, double factor, int points) {
      return new TrendLine(
          centre, level, slope, common, 1 / Math.sqrt(sum), 1 / Math.sqrt(spread), factor, points);
    }
  }
}
