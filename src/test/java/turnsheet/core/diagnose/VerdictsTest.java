package turnsheet.core.diagnose;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
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
    assertThat(judge(Figure.absent("too short"), 1))
        .isEqualTo(
            new Judgement(Verdict.UNDECIDED, null, Judgement.Why.NO_UNCERTAINTY, "too short"));
    assertThat(judge(Figure.withoutUncertainty(9, "single value"), 1).detail())
        .isEqualTo("single value");
    assertThat(judge(Figure.of(1, 0.5), 1).why()).isEqualTo(Judgement.Why.LIMIT_IN_INTERVAL);
  }

  /** ILAC-G8:09/2019 clause 4.2, binary rule without guard band. */
  @Test
  void simpleAcceptanceLooksAtTheValueAlone() {
    assertThat(simple(Figure.of(0.5, 0.125))).isEqualTo(Verdict.WITHIN);
    assertThat(simple(Figure.of(0.5001, 0.125))).isEqualTo(Verdict.OUTSIDE);
    assertThat(simple(Figure.of(-0.5001, 0.125))).isEqualTo(Verdict.OUTSIDE);
  }

  @Test
  void aRecordingThatCannotResolveTheLimitPassesNothing() {
    for (DecisionRule rule : DecisionRule.values()) {
      Judgement judgement = Verdicts.judge(Figure.of(0.01, 0.5), 0.5, rule);
      assertThat(judgement.verdict()).isEqualTo(Verdict.UNDECIDED);
      assertThat(judgement.why()).isEqualTo(Judgement.Why.NOT_RESOLVED);
      assertThat(Verdicts.judge(Figure.of(2, 0.5), 0.5, rule).verdict()).isEqualTo(Verdict.OUTSIDE);
    }
  }

  /** Two limits: Phi((T - y) / u) - Phi((-T - y) / u), JCGM 106:2012; 0.6827 of a Gaussian. */
  @Test
  void statesTheProbabilityThatTheTrueMagnitudeKeepsTheLimit() {
    assertThat(judge(Figure.of(0, 2), 1).conformanceProbability())
        .isCloseTo(0.682689, within(1e-6));
    // u = 0.05, 1.4 u below the limit, the other limit far away: the worked example's 0.919
    assertThat(judge(Figure.of(5.33, 0.1), 5.40).conformanceProbability())
        .isCloseTo(0.919, within(5e-4));
    assertThat(judge(Figure.of(-5.33, 0.1), 5.40).conformanceProbability())
        .isCloseTo(0.919, within(5e-4));
    assertThat(judge(Figure.of(1, 0), 1).conformanceProbability()).isEqualTo(1);
  }

  /**
   * Student's t for one degree of freedom is the Cauchy distribution: 3/4 lie below u, 1/4 above.
   */
  @Test
  void fewDegreesOfFreedomMakeTheProbabilityStudents() {
    double k = Coverage.factor(1);
    Figure figure = new Figure(5.0, k, k, null, java.util.List.of()); // u = 1
    double below = 0.75; // of 6; of -6 next to nothing: arctan(11) leaves 0.0289
    assertThat(judge(figure, 6).conformanceProbability())
        .isCloseTo(below - Math.atan(1 / 11.0) / Math.PI, within(1e-6));
    assertThat(Coverage.freedomOf(Coverage.factor(7.5))).isCloseTo(7.5, within(1e-6));
    assertThat(Coverage.freedomOf(2)).isInfinite();
  }

  /**
   * JCGM 106:2012, example of resistors: production N(0, 0.12), tolerance 0.2, u 0.04 (ohm,
   * centred; set-up from memory, risks recomputed): global risks of consumer and producer 0.01894
   * and 0.03720 by simple acceptance, 0.000469 and 0.24767 with w = U. Here by summing over true
   * and measured values in steps whose cells end at the limits; tolerance: half of the last digit,
   * of 0.03720 and 0.000469, which are cut and not rounded, a whole one.
   */
  @Test
  void riskOfBothRulesIsThatOfTheWorkedExample() {
    assertThat(risks(DecisionRule.SIMPLE)[0]).isCloseTo(0.01894, within(5e-6));
    assertThat(risks(DecisionRule.SIMPLE)[1]).isCloseTo(0.03720, within(1e-5));
    assertThat(risks(DecisionRule.GUARDED)[0]).isCloseTo(0.000469, within(1e-6));
    assertThat(risks(DecisionRule.GUARDED)[1]).isCloseTo(0.24767, within(5e-6));
  }

  /** ILAC-G8:09/2019 table 1: below 2.5 % for w = U; of a Gaussian 2.275 %. */
  @Test
  void aUnitAtTheLimitIsCalledWithinInLessThanOneOfFortyCases() {
    Random random = new Random(1);
    int within = 0;
    int count = 200_000;
    for (int i = 0; i < count; i++) {
      within += verdict(0.5 + 0.0625 * random.nextGaussian()) == Verdict.WITHIN ? 1 : 0;
    }
    // four standard deviations of a count of 4550
    assertThat(within / (double) count).isCloseTo(0.02275, within(4 * 67.0 / count));
  }

  @Test
  void refusesALimitThatIsNone() {
    assertThatThrownBy(() -> judge(Figure.of(1, 1), Double.NaN))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> judge(Figure.of(1, 1), -1))
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

  private static Verdict verdict(double value) {
    return judge(Figure.of(value, 0.125), 0.5).verdict();
  }

  private static Judgement judge(Figure figure, double limit) {
    return Verdicts.judge(figure, limit, DecisionRule.GUARDED);
  }

  private static Verdict simple(Figure figure) {
    return Verdicts.judge(figure, 0.5, DecisionRule.SIMPLE).verdict();
  }

  /** Accepted though beyond the tolerance, and not accepted though within it. */
  private static double[] risks(DecisionRule rule) {
    double consumer = 0;
    double producer = 0;
    double truthStep = 0.002;
    double errorStep = 0.0004;
    for (int i = -360; i < 360; i++) {
      double truth = (i + 0.5) * truthStep;
      for (int k = -600; k <= 600; k++) {
        double error = k * errorStep;
        double share =
            density(truth / 0.12) * truthStep / 0.12 * density(error / 0.04) * errorStep / 0.04;
        boolean accepted =
            Verdicts.judge(Figure.of(truth + error, 0.08), 0.2, rule).verdict() == Verdict.WITHIN;
        boolean good = Math.abs(truth) <= 0.2;
        consumer += accepted && !good ? share : 0;
        producer += !accepted && good ? share : 0;
      }
    }
    return new double[] {consumer, producer};
  }

  private static double density(double z) {
    return Math.exp(-z * z / 2) / Math.sqrt(2 * Math.PI);
  }
}
