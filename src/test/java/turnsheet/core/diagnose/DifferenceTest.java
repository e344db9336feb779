package turnsheet.core.diagnose;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import turnsheet.core.measure.Figure;

class DifferenceTest {

  /** Uncorrelated contributions add as squares (JCGM 100 clause 5.1.2): 3 and 4 make 5. */
  @Test
  void combinesTheUncertaintiesAsSquares() {
    Difference d = Difference.of(Figure.of(20, 3), Figure.of(10, 4));
    assertThat(d.difference()).isEqualTo(Figure.of(-10, 5));
    assertThat(d.change()).isEqualTo(Difference.Change.IMPROVED);
  }

  @Test
  void showsAChangeOnlyBeyondTheInterval() {
    assertThat(Difference.of(Figure.of(20, 3), Figure.of(15, 4)).change())
        .isEqualTo(Difference.Change.NO_CHANGE_SHOWN);
    assertThat(Difference.of(Figure.of(20, 3), Figure.of(25, 4)).change())
        .isEqualTo(Difference.Change.NO_CHANGE_SHOWN);
    assertThat(Difference.of(Figure.of(20, 3), Figure.of(25.5, 4)).change())
        .isEqualTo(Difference.Change.WORSE);
  }

  @Test
  void comparesMagnitudesOfSignedFigures() {
    Difference d = Difference.of(Figure.of(-0.5, 0.1), Figure.of(0.125, 0.1));
    assertThat(d.difference().value()).isEqualTo(0.625);
    assertThat(d.change()).isEqualTo(Difference.Change.IMPROVED);
  }

  @Test
  void bringsOtherCoverageFactorsToTwo() {
    Difference d =
        Difference.of(new Figure(1.0, 4.5, 3.0, null, java.util.List.of()), Figure.of(1, 4));
    assertThat(d.difference()).isEqualTo(Figure.of(0, 5));
  }

  @Test
  void saysWhichSideIsMissing() {
    assertThat(Difference.of(Figure.absent("too short"), Figure.of(1, 1)).difference())
        .isEqualTo(Figure.absent("before: too short"));
    Difference d = Difference.of(Figure.of(1, 1), Figure.withoutUncertainty(9, "single value"));
    assertThat(d.difference()).isEqualTo(Figure.withoutUncertainty(8, "after: single value"));
    assertThat(d.change()).isEqualTo(Difference.Change.NO_CHANGE_SHOWN);
  }
}
