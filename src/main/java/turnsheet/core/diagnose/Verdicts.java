package turnsheet.core.diagnose;

import org.hipparchus.distribution.continuous.NormalDistribution;
import turnsheet.core.measure.Figure;

/**
 * The decision rule for figures against an upper bound of their magnitude.
 *
 * <p>Non-binary with guard band after ILAC-G8:09/2019 clause 4.2, guard band w = U. The guide's
 * conditional pass and conditional fail are told as one word, undecided.
 */
public final class Verdicts {

  private static final NormalDistribution STANDARD_NORMAL = new NormalDistribution();

  private Verdicts() {}

  /**
   * Judges a figure.
   *
   * @param upperBound limit of the magnitude, in the unit of the figure, not negative
   */
  public static Judgement judge(Figure figure, double upperBound) {
    if (!(upperBound >= 0 && Double.isFinite(upperBound))) {
      throw new IllegalArgumentException("limit " + upperBound);
    }
    Double value = figure.value();
    Double uncertainty = figure.expandedUncertainty();
    if (value == null || uncertainty == null) {
      return new Judgement(Verdict.UNDECIDED, figure.why());
    }
    double magnitude = Math.abs(value);
    if (magnitude + uncertainty <= upperBound) {
      return new Judgement(Verdict.WITHIN, null);
    }
    if (magnitude - uncertainty > upperBound) {
      return new Judgement(Verdict.OUTSIDE, null);
    }
    return new Judgement(
        Verdict.UNDECIDED, "the limit lies inside the interval of the figure's uncertainty");
  }

  /** The rule in one sentence, to be printed beside every verdict. */
  public static String ruleSentence() {
    return "Decision rule: guard band equal to the expanded uncertainty U (k = 2) on both sides of"
        + " the limit, after ILAC-G8:09/2019, non-binary; within where value plus U keeps the"
        + " limit, outside where value minus U is beyond it, otherwise undecided.";
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
}
