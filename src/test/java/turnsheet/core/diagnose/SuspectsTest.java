package turnsheet.core.diagnose;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

class SuspectsTest {

  /** Rates f = v / (pi d) at 38.1 cm/s: capstan 10 mm, roller 32 mm, idler 48.5 mm. */
  private static final List<RotatingPart> PARTS =
      List.of(
          new RotatingPart("capstan", 381 / (Math.PI * 10)),
          new RotatingPart("roller", 381 / (Math.PI * 32)),
          new RotatingPart("idler", 381 / (Math.PI * 48.5)));

  /** 12.128 Hz for 10 mm at 38.1 cm/s, computed in print to five digits. */
  @Test
  void namesTheCapstanAtItsOwnRate() {
    List<Reading.Suspect> found = Suspects.of(12.128, PARTS, 60);
    assertThat(found.get(0).part()).isEqualTo("capstan");
    assertThat(found.get(0).harmonic()).isEqualTo(1);
    assertThat(found.get(0).rateHz()).isCloseTo(12.128, within(5e-4));
  }

  @Test
  void namesAHarmonic() {
    assertThat(Suspects.of(2 * 381 / (Math.PI * 32), PARTS, 60))
        .extracting(Reading.Suspect::part, Reading.Suspect::harmonic)
        .first()
        .isEqualTo(org.assertj.core.groups.Tuple.tuple("roller", 2));
  }

  @Test
  void reachesAsFarAsResolutionAndDiametersAllow() {
    var part = List.of(new RotatingPart("roller", 4));
    // 1.5 / 60 s + 1 % of 4 Hz = 0.065 Hz
    assertThat(Suspects.of(4.064, part, 60)).hasSize(1);
    assertThat(Suspects.of(4.066, part, 60)).isEmpty();
    assertThat(Suspects.of(4.066, part, 30)).hasSize(1);
  }

  @Test
  void putsTheBetterFitFirstAndAPartsOwnRateBeforeAnEqualHarmonic() {
    var parts =
        List.of(
            new RotatingPart("far", 10.09),
            new RotatingPart("half", 5),
            new RotatingPart("near", 10.0));
    assertThat(Suspects.of(10, parts, 60))
        .extracting(Reading.Suspect::part)
        .containsExactly("near", "half", "far");
  }

  @Test
  void followsAUnitThatRunsFast() {
    RotatingPart fast = new RotatingPart("platter", 0.5556).atDeviation(3);
    assertThat(fast.rateHertz()).isCloseTo(0.572268, within(1e-9));
    assertThat(Suspects.of(0.5723, List.of(fast), 600)).hasSize(1);
    assertThat(Suspects.of(0.5723, List.of(new RotatingPart("platter", 0.5556)), 600)).isEmpty();
  }

  @Test
  void leavesALineWithoutSuspectWhereNothingComesNear() {
    var line = new Reading.Line(Figure.of(31.7, 0.01), Figure.of(0.02, 0.001), List.of());
    var named = Suspects.name(List.of(line), PARTS, 60);
    assertThat(named).containsExactly(line);
  }
}
