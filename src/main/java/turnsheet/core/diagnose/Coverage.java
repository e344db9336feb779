package turnsheet.core.diagnose;

import java.util.List;
import org.hipparchus.distribution.continuous.TDistribution;
import turnsheet.core.measure.Figure;
import turnsheet.core.stats.Budget;

/** Intervals from few observations: coverage factor by Student's t (JCGM 100, annex G.4). */
final class Coverage {

  /** Of a Gaussian within two standard deviations, so that k is 2 for many degrees of freedom. */
  private static final double LEVEL = 0.9545;

  /** Student's factor then differs from the Gaussian's by less than a thousandth. */
  static final double MANY = 1000;

  private Coverage() {}

  /** Standard uncertainty of a figure that has one. */
  static double standardUncertainty(Figure figure) {
    Double expanded = figure.expandedUncertainty();
    Double k = figure.k();
    if (expanded == null || k == null) {
      throw new IllegalArgumentException("no uncertainty: " + figure);
    }
    return expanded / k;
  }

  /** Effective degrees of freedom of two contributions (Welch and Satterthwaite, G.2b). */
  static double freedom(double one, double oneFreedom, double other, double otherFreedom) {
    double u4 = Math.pow(one * one + other * other, 2);
    double sum = Math.pow(one, 4) / oneFreedom + Math.pow(other, 4) / otherFreedom;
    return sum > 0 ? u4 / sum : Double.POSITIVE_INFINITY;
  }

  /** A value with its interval at about 95 %. */
  static Figure figure(double value, double standardUncertainty, double degreesOfFreedom) {
    double k = factor(degreesOfFreedom);
    return new Figure(value, k * standardUncertainty, k, null, List.of());
  }

  /** Degrees of freedom behind a coverage factor; infinite for 2 and less. */
  static double freedomOf(double factor) {
    if (factor <= Budget.K) {
      return Double.POSITIVE_INFINITY;
    }
    // the factor falls as the degrees of freedom rise
    double low = 0.1;
    double high = MANY;
    for (int i = 0; i < 100; i++) {
      double middle = Math.sqrt(low * high);
      if (factor(middle) > factor) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return high;
  }

  /** Coverage factor; exactly 2 for infinitely many degrees of freedom. */
  static double factor(double degreesOfFreedom) {
    return degreesOfFreedom > MANY
        ? Budget.K
        : new TDistribution(degreesOfFreedom).inverseCumulativeProbability((1 + LEVEL) / 2);
  }
}
