package turnsheet.core.diagnose;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import turnsheet.core.measure.Figure;

class VerdictsTest {

  /** ILAC-G8:09/2019 clause 4.2, non-binary rule with w = U; limit 0.5, U 0.125 (binary exact). */
  @Test
  void keepsAGuardBandOfTheUncertaintyOnBothSidesOfTheLimit() {
    assertThat(verdict(0.25)).isEqualTo(Verdict.WITHIN);
    assertThat(verdict(0.375)).isEqualTo(Verdict.WITHIN);
    assertThat(verdict(0.3751)).isEqualTo(Verdict.UNDECIDED);
    assertThat(verdict(0.5)).isEqualTo(Verdict.UNDECIDED);
    assertThat(verdict(0.625)).isEqualTo(Verdict.UNDECIDED);
    assertThat(verdict(0.6251)).isEqualTo(Verdict.OUTSIDE);
  }

  @Test
  void judgesTheMagnitudeOfASignedFigure() {
    assertThat(verdict(-0.25)).isEqualTo(Verdict.WITHIN);
    assertThat(verdict(-0.5)).isEqualTo(Verdict.UNDECIDED);
    assertThat(verdict(-0.75)).isEqualTo(Verdict.OUTSIDE);
  }

  @Test
  void decidesNothingWithoutValueOrUncertaintyAndSaysWhy() {
    assertThat(Verdicts.judge(Figure.absent("too short"), 1))
        .isEqualTo(new Judgement(Verdict.UNDECIDED, "too short"));
    assertThat(Verdicts.judge(Figure.withoutUncertainty(9, "single value"), 1))
        .isEqualTo(new Judgement(Verdict.UNDECIDED, "single value"));
    assertThat(Verdicts.judge(Figure.of(1, 0.5), 1).why()).contains("limit lies inside");
  }

  @Test
  void refusesALimitThatIsNone() {
    assertThatThrownBy(() -> Verdicts.judge(Figure.of(1, 1), Double.NaN))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> Verdicts.judge(Figure.of(1, 1), -1))
        .isInstanceOf(IllegalArgumentException.class);
  }

  /**
   * JCGM 106:2012, example with upper limit -5.40 V, value -5.47 V, u 0.05 V (set-up: value from
   * memory; 0.919 recomputed as Phi(1.4)). Tolerance: half of the last digit stated.
   */
  @Test
  void statesTheConformanceProbabilityOfTheWorkedExample() {
    assertThat(Verdicts.conformanceProbability(-5.47, 0.05, -5.40)).isCloseTo(0.919, within(5e-4));
  }

  /**
   * One-sided normal quantiles (any table) and the risk at the acceptance limit for w = U = 2u:
   * below 2.5 % in ILAC-G8:09/2019 table 1, 2.275 % exactly. Tolerance: the printed digits.
   */
  @Test
  void agreesWithTheTableOfTheNormalDistribution() {
    double[][] table = {{0.8416, 0.80}, {1.2816, 0.90}, {1.6449, 0.95}, {2.3263, 0.99}};
    for (double[] row : table) {
      assertThat(Verdicts.conformanceProbability(0, 1, row[0])).isCloseTo(row[1], within(2e-5));
    }
    assertThat(1 - Verdicts.conformanceProbability(0, 1, 2)).isCloseTo(0.02275, within(5e-6));
  }

  @Test
  void printsItsRule() {
    assertThat(Verdicts.ruleSentence()).contains("ILAC-G8:09/2019").contains("k = 2");
  }

  private static Verdict verdict(double value) {
    return Verdicts.judge(Figure.of(value, 0.125), 0.5).verdict();
  }
}
