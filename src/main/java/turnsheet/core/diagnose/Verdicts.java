package turnsheet.core.diagnose;

import java.util.Objects;
import org.hipparchus.distribution.continuous.NormalDistribution;
import org.hipparchus.distribution.continuous.TDistribution;
import turnsheet.core.measure.Figure;

/** Figures against an upper bound of their magnitude, by the rule that the shop has chosen. */
public final class Verdicts {

  private static final NormalDistribution STANDARD_NORMAL = new NormalDistribution();

  private Verdicts() {}

  /**
   * Judges a figure.
   *
   * <p>A capture whose uncertainty reaches the limit cannot tell whether the limit is kept: the
   * figure is undecided by either rule, unless it is beyond the limit by more than its interval.
   * The floor of a capture needs no rule of its own, as what it may have added to a figure stands
   * in the figure's uncertainty: of a figure at its floor, 1.15 times the value.
   *
   * @param upperBound limit of the magnitude, in the unit of the figure, not negative
   */
  public static Judgement judge(Figure figure, double upperBound, DecisionRule rule) {
    if (!(upperBound >= 0 && Double.isFinite(upperBound))) {
      throw new IllegalArgumentException("limit " + upperBound);
    }
    Double value = figure.value();
    Double uncertainty = figure.expandedUncertainty();
    if (value == null || uncertainty == null) {
      return new Judgement(Verdict.UNDECIDED, null, Judgement.Why.NO_UNCERTAINTY, figure.why());
    }
    double magnitude = Math.abs(value);
    double standard = Coverage.standardUncertainty(figure);
    Double probability =
        standard > 0
            ? withinProbability(figure, upperBound)
            : Double.valueOf(magnitude <= upperBound ? 1 : 0);
    if (magnitude - uncertainty > upperBound) {
      return new Judgement(Verdict.OUTSIDE, probability, null, null);
    }
    if (uncertainty >= upperBound) {
      return new Judgement(Verdict.UNDECIDED, probability, Judgement.Why.NOT_RESOLVED, null);
    }
    if (rule == DecisionRule.SIMPLE) {
      Verdict verdict = magnitude <= upperBound ? Verdict.WITHIN : Verdict.OUTSIDE;
      return new Judgement(verdict, probability, null, null);
    }
    return magnitude + uncertainty <= upperBound
        ? new Judgement(Verdict.WITHIN, probability, null, null)
        : new Judgement(Verdict.UNDECIDED, probability, Judgement.Why.LIMIT_IN_INTERVAL, null);
  }

  /**
   * Probability that the true value lies within a limit of either sign: Gaussian at k = 2,
   * Student's with the degrees of freedom behind a larger k.
   */
  private static double withinProbability(Figure figure, double bound) {
    double value = Objects.requireNonNull(figure.value());
    double standard = Coverage.standardUncertainty(figure);
    double freedom = Coverage.freedomOf(Objects.requireNonNull(figure.k()));
    if (freedom >= Coverage.MANY) {
      return conformanceProbability(value, standard, -bound, bound);
    }
    TDistribution t = new TDistribution(freedom);
    return t.cumulativeProbability((bound - value) / standard)
        - t.cumulativeProbability((-bound - value) / standard);
  }

  /**
   * Probability that the true value keeps an upper limit, for a Gaussian result (JCGM 106:2012).
   *
   * @param standardUncertainty positive, in the unit of the value
   */
  public static double conformanceProbability(
      double value, double standardUncertainty, double upperLimit) {
    if (!(standardUncertainty > 0)) {
      throw new IllegalArgumentException("standard uncertainty " + standardUncertainty);
    }
    return STANDARD_NORMAL.cumulativeProbability((upperLimit - value) / standardUncertainty);
  }

  /** The same for two limits. */
  public static double conformanceProbability(
      double value, double standardUncertainty, double lowerLimit, double upperLimit) {
    return conformanceProbability(value, standardUncertainty, upperLimit)
        - conformanceProbability(value, standardUncertainty, lowerLimit);
  }
}
