package turnsheet.core.stats;

import java.util.ArrayList;
import java.util.List;

/**
 * Uncertainty of one figure as a list of independent contributions, each already in the unit of the
 * figure.
 *
 * <p>Source: JCGM 100:2008 (GUM), 5.1.2 (root of the sum of squares for independent inputs) and
 * 6.2.1 (expanded uncertainty U = k u).
 */
public record Budget(List<Contribution> contributions) {

  /** Coverage factor for about 95 %, near-normal result, many degrees of freedom. */
  public static final double K = 2;

  public Budget {
    contributions = List.copyOf(contributions);
  }

  /**
   * One cause.
   *
   * @param cause for people
   * @param standardUncertainty in the unit of the figure
   */
  public record Contribution(String cause, double standardUncertainty) {
    public Contribution {
      if (!(standardUncertainty >= 0 && Double.isFinite(standardUncertainty))) {
        throw new IllegalArgumentException(cause + " " + standardUncertainty);
      }
    }
  }

  /** No contribution yet. */
  public static Budget empty() {
    return new Budget(List.of());
  }

  /** The same with one more contribution. */
  public Budget plus(String cause, double standardUncertainty) {
    var more = new ArrayList<>(contributions);
    more.add(new Contribution(cause, standardUncertainty));
    return new Budget(more);
  }

  /** A contribution known by its half width only, all values within being equally likely. */
  public Budget plusRectangular(String cause, double halfWidth) {
    return plus(cause, halfWidth / Math.sqrt(3));
  }

  /** The budget of the figure times a factor. */
  public Budget times(double factor) {
    return new Budget(
        contributions.stream()
            .map(c -> new Contribution(c.cause(), Math.abs(factor) * c.standardUncertainty()))
            .toList());
  }

  /** Combined standard uncertainty. */
  public double combined() {
    double sum = 0;
    for (Contribution c : contributions) {
      sum += c.standardUncertainty * c.standardUncertainty;
    }
    return Math.sqrt(sum);
  }

  /** Expanded uncertainty at k = 2. */
  public double expanded() {
    return K * combined();
  }
}
