package turnsheet.core.diagnose;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;
import turnsheet.core.measure.Causes;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.stats.Budget;

class DifferenceTest {

  private static Runs runs(Figure... figures) {
    List<Run> runs = new ArrayList<>();
    for (Figure figure : figures) {
      runs.add(Run.of(FigureName.DEVIATION, figure, null, Set.of()));
    }
    return new Runs(runs);
  }

  private static Difference of(Figure before, Figure after) {
    return Difference.of(runs(before), runs(after), 0);
  }

  /** Uncorrelated contributions add as squares (JCGM 100 clause 5.1.2): 3 and 4 make 5. */
  @Test
  void combinesTheUncertaintiesAsSquares() {
    Difference d = of(Figure.of(20, 3), Figure.of(10, 4));
    assertThat(d.difference()).isEqualTo(Figure.of(-10, 5));
    assertThat(d.change()).isEqualTo(Difference.Change.IMPROVED);
    assertThat(d.betweenRuns()).isFalse();
  }

  @Test
  void showsAChangeOnlyBeyondTheInterval() {
    assertThat(of(Figure.of(20, 3), Figure.of(15, 4)).change())
        .isEqualTo(Difference.Change.NO_CHANGE_SHOWN);
    assertThat(of(Figure.of(20, 3), Figure.of(25, 4)).change())
        .isEqualTo(Difference.Change.NO_CHANGE_SHOWN);
    assertThat(of(Figure.of(20, 3), Figure.of(25.5, 4)).change())
        .isEqualTo(Difference.Change.WORSE);
  }

  @Test
  void saysWhereAChangeIsShownButTooSmallToMatter() {
    Runs before = runs(Figure.of(20, 0.3));
    Runs after = runs(Figure.of(19, 0.4));
    assertThat(Difference.of(before, after, 2).change())
        .isEqualTo(Difference.Change.TOO_SMALL_TO_MATTER);
    assertThat(Difference.of(before, after, 1).change()).isEqualTo(Difference.Change.IMPROVED);
  }

  @Test
  void comparesMagnitudesOfSignedFigures() {
    Difference d = of(Figure.of(-0.5, 0.1), Figure.of(0.125, 0.1));
    assertThat(d.difference().value()).isEqualTo(0.625);
    assertThat(d.change()).isEqualTo(Difference.Change.IMPROVED);
  }

  @Test
  void bringsOtherCoverageFactorsToTwo() {
    Difference d = of(new Figure(1.0, 4.5, 3.0, null, List.of()), Figure.of(1, 4));
    assertThat(d.difference()).isEqualTo(Figure.of(0, 5));
  }

  @Test
  void saysWhichSideIsMissing() {
    assertThat(of(Figure.absent("too short"), Figure.of(1, 1)).difference())
        .isEqualTo(Figure.absent("before: too short"));
    Difference d = of(Figure.of(1, 1), Figure.withoutUncertainty(9, "single value"));
    assertThat(d.difference()).isEqualTo(Figure.withoutUncertainty(8, "after: single value"));
    assertThat(d.change()).isEqualTo(Difference.Change.NO_CHANGE_SHOWN);
  }

  /** A clock or a medium that both captures share moves both alike (JCGM 100, 5.2.2). */
  @Test
  void ofWhatBothSidesShareATenthCounts() {
    Budget budget =
        Budget.empty().plus(Causes.CLOCK, 6).plus(Causes.MEDIUM, 12).plus("unsteadiness", 4);
    Figure figure = Figure.of(1, budget);
    assertThat(figure.expandedUncertainty()).isEqualTo(28); // 2 times the root of 36 + 144 + 16
    assertThat(uncertainty(figure)).isEqualTo(14);
    assertThat(uncertainty(figure, Run.Common.MEDIUM))
        .isCloseTo(Math.sqrt(36 + 16 + 1.44), within(1e-12));
    assertThat(uncertainty(figure, Run.Common.CLOCK, Run.Common.MEDIUM))
        .isCloseTo(Math.sqrt(16 + 0.36 + 1.44), within(1e-12));
  }

  private static double uncertainty(Figure figure, Run.Common... common) {
    return Run.of(FigureName.DEVIATION, figure, null, Set.of(common)).standardUncertainty();
  }

  /** Two runs each, 1 and 3 against 11 and 13: scatter 2, mean difference 10, df 2, t 4.526. */
  @Test
  void spreadBetweenRunsEntersWithStudentsFactor() {
    Difference d =
        Difference.of(
            runs(Figure.of(1, 0), Figure.of(3, 0)), runs(Figure.of(11, 0), Figure.of(13, 0)), 0);
    assertThat(d.betweenRuns()).isTrue();
    assertThat(d.difference().value()).isEqualTo(10);
    // table of t for 95.45 % in JCGM 100 annex G: 4.53 at 2 degrees of freedom
    assertThat(d.difference().k()).isCloseTo(4.53, within(0.005));
    assertThat(d.difference().expandedUncertainty()).isCloseTo(4.5265 * Math.sqrt(2), within(1e-3));
  }

  @Test
  void aSingleRunOnOneSideLeavesTheSpreadOut() {
    Difference d = Difference.of(runs(Figure.of(1, 1)), runs(Figure.of(3, 1), Figure.of(5, 1)), 0);
    assertThat(d.betweenRuns()).isFalse();
  }

  /**
   * Pairs of equal conditions whose runs differ by up to three times their own uncertainty. A
   * change is called in 7 of 100 at most (4.55 wanted; the variance between runs is itself
   * estimated). Four standard deviations of a count of 7 of 100 in 4000 are 1.6.
   */
  @Test
  void equalConditionsAreRarelyCalledDifferent() {
    Random random = new Random(3);
    for (int count = 2; count <= 4; count++) {
      for (double between : new double[] {0, 0.5, 1, 3}) {
        int called = 0;
        for (int i = 0; i < 4000; i++) {
          Difference d =
              Difference.of(drawn(count, between, random), drawn(count, between, random), 0);
          called += d.change() == Difference.Change.NO_CHANGE_SHOWN ? 0 : 1;
        }
        assertThat(called / 40.0).as("%s runs, %s", count, between).isLessThan(7 + 1.6);
      }
    }
  }

  private static Runs drawn(int count, double between, Random random) {
    Figure[] figures = new Figure[count];
    for (int i = 0; i < count; i++) {
      double value = 100 + random.nextGaussian() + between * random.nextGaussian();
      figures[i] = Figure.of(value, 2);
    }
    return runs(figures);
  }

  @Test
  void pooledRunsHaveMeanSpreadAndWorst() {
    Runs runs = runs(Figure.of(-1, 0.5), Figure.of(-2, 0.5), Figure.of(-6, 0.5));
    assertThat(runs.mean()).isEqualTo(-3);
    assertThat(runs.spread()).isCloseTo(Math.sqrt(7), within(1e-12));
    assertThat(runs.worst()).isEqualTo(-6);
    Figure pooled = runs.figure();
    // own 0.25, of the mean sqrt(7/3) = 1.528 with 2 degrees of freedom
    double u = Math.hypot(0.25, Math.sqrt(7 / 3.0));
    double k = Objects.requireNonNull(pooled.k());
    assertThat(pooled.expandedUncertainty()).isCloseTo(k * u, within(1e-12));
    assertThat(k).isBetween(4.2, 4.53);
  }
}
