package turnsheet.core.diagnose.wheel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Objects;
import org.assertj.core.data.Percentage;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.measure.Figure;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WheelSynth;

/** Wheels whose teeth are known on shafts whose speed has a closed form. */
class WheelLookTest {

  /** Three lines at no multiple of a turn. */
  private static final SpeedFunction SPEED =
      SpeedFunction.constant(0.003).plusLine(0.91, 0.05, 1).plusLine(11.3, 0.08, 2);

  @ParameterizedTest
  @CsvSource({
    // teeth, pulses per second, seconds
    "2, 60, 20",
    "3, 90, 20",
    "15, 300, 20",
    "47, 400, 20",
    "60, 400, 30",
    "120, 800, 30"
  })
  void theSpacingComesOutAndTheFlutterWithoutIt(int teeth, double rate, double seconds)
      throws Exception {
    WheelSynth wheel = WheelSynth.uneven(teeth, 0.006, 3);
    double[] rises = wheel.risingEdges(SPEED, rate, seconds, 0, 0, 1);
    double[] even = WheelSynth.even(teeth).risingEdges(SPEED, rate, seconds, 0, 0, 1);

    WheelFinding finding = Wheels.look(rises, rate, teeth);

    assertThat(finding.places()).isEqualTo(teeth);
    assertThat(finding.origin()).isEqualTo(WheelFinding.Origin.STATED);
    // no noise: what is left is the fluctuation that leaks through the Hann weights
    assertThat(value(finding.patternRmsPercentOfPeriod()))
        .isCloseTo(100 * wheel.rmsPeriods(), Percentage.withPercentage(1));
    assertThat(value(finding.patternRmsArcSeconds()))
        .isCloseTo(1296000 * wheel.rmsPeriods() / teeth, Percentage.withPercentage(1));
    FlutterTrio truth = FlutterTrio.of(Wheels.measured(even, rate));
    assertSame(finding.flutterWithout(), truth, 1);
    // the pattern was worth removing; that of two teeth lies above what is shown
    assertThat(value(finding.flutter().unweightedRmsPercent()))
        .isGreaterThan((teeth > 2 ? 1.05 : 0.9) * value(truth.unweightedRmsPercent()));
  }

  @Test
  void eachToothStandsWhereItWasPut() throws Exception {
    WheelSynth wheel = WheelSynth.uneven(60, 0.006, 1).eccentric(0.01, 1);
    double[] rises = wheel.risingEdges(SPEED, 400, 30, 2e-6, 1e-6, 5);

    WheelFinding finding = Wheels.look(rises, 400, 60);

    double mean = 0;
    for (double late : wheel.latePeriods()) {
      mean += late / 60;
    }
    assertThat(finding.teeth()).hasSize(60);
    int inside = 0;
    for (WheelPlace place : finding.teeth()) {
      // the list begins with place 1, as no edge can come before time zero
      double truth = 100 * (wheel.latePeriods()[place.tooth() % 60] - mean);
      inside +=
          Math.abs(place.percentOfPeriod() - truth) <= finding.placeUncertaintyPercent() ? 1 : 0;
      assertThat(place.arcSeconds()).isCloseTo(place.percentOfPeriod() * 216, within(1e-6));
    }
    // 95 of 100 are meant to: fewer than 51 of 60 come once in 1000 draws
    assertThat(inside).isGreaterThanOrEqualTo(51);
  }

  @Test
  void noiseAndStepsOfTheTimerAreNoPattern() throws Exception {
    WheelSynth wheel = WheelSynth.uneven(60, 0.003, 2);
    double[] rises = wheel.risingEdges(SPEED, 400, 30, 5e-6, 1e-6, 5);
    WheelFinding finding = Wheels.look(rises, 400, null);
    assertThat(finding.origin()).isEqualTo(WheelFinding.Origin.REPETITION);
    assertThat(finding.places()).isEqualTo(60);
    assertHolds(finding.patternRmsPercentOfPeriod(), 100 * wheel.rmsPeriods());
    assertThat(value(finding.patternRmsPercentOfPeriod()))
        .isCloseTo(100 * wheel.rmsPeriods(), Percentage.withPercentage(5));
    // an even wheel under the same noise: what is left of the pattern is its own noise
    double[] even = WheelSynth.even(60).risingEdges(SPEED, 400, 30, 5e-6, 1e-6, 5);
    assertSame(finding.flutterWithout(), FlutterTrio.of(Wheels.measured(even, 400)), 3);
  }

  @Test
  void anEvenWheelHasNone() throws Exception {
    double[] rises = WheelSynth.even(60).risingEdges(SPEED, 400, 30, 2e-6, 0, 5);
    WheelFinding finding = Wheels.look(rises, 400, 60);
    assertHolds(finding.patternRmsPercentOfPeriod(), 0);
    assertThat(finding.damage()).isEmpty();
    assertThat(finding.open()).isFalse();
    assertThat(finding.flutterWithoutSpacing()).isNull();
    assertThatThrownBy(() -> Wheels.look(rises, 400, null))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("state how many");
  }

  @ParameterizedTest
  @CsvSource({"119", "121"})
  void aCountThatIsWrongByOneSaysSo(int stated) throws Exception {
    double[] rises = WheelSynth.uneven(120, 0.003, 4).risingEdges(SPEED, 800, 20, 1e-6, 0, 5);
    WheelFinding finding = Wheels.look(rises, 800, stated);
    assertThat(finding.places()).isEqualTo(120);
    assertThat(finding.origin()).isEqualTo(WheelFinding.Origin.REPETITION);
    assertThat(finding.statedTeeth()).isEqualTo(stated);
  }

  @Test
  void halfTheCountIsKeptAndSaid() throws Exception {
    double[] rises = WheelSynth.uneven(120, 0.003, 4).risingEdges(SPEED, 800, 20, 1e-6, 0, 5);
    WheelFinding finding = Wheels.look(rises, 800, 60);
    assertThat(finding.places()).isEqualTo(60);
    assertThat(finding.repeatsAfter()).isEqualTo(120);
  }

  @Test
  void anEccentricWheelAloneIsNotFoundByItself() throws Exception {
    double[] rises = WheelSynth.even(60).eccentric(0.01, 0).risingEdges(SPEED, 400, 20, 1e-6, 0, 5);
    assertThatThrownBy(() -> Wheels.look(rises, 400, null)).isInstanceOf(RejectedException.class);
    WheelFinding finding = Wheels.look(rises, 400, 60);
    assertThat(value(finding.patternRmsPercentOfPeriod()))
        .isCloseTo(1 / Math.sqrt(2), Percentage.withPercentage(1));
    // 0.01 periods are 0.01 / 60 turns; 2 pi times that is the speed that would look the same
    assertThat(finding.harmonics().get(0).sameSpeedPeakPercent())
        .isCloseTo(2 * Math.PI / 60, Percentage.withPercentage(1));
  }

  @Test
  void whatCannotBeSeenIsRefused() throws Exception {
    double[] one = WheelSynth.even(1).risingEdges(SPEED, 40, 20, 1e-6, 0, 5);
    assertThatThrownBy(() -> Wheels.look(one, 40, 1))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("every period is a whole turn");
    double[] few = WheelSynth.uneven(60, 0.003, 4).risingEdges(SPEED, 400, 1.6, 0, 0, 5);
    assertThatThrownBy(() -> Wheels.look(few, 400, 60))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("record longer");
  }

  private static void assertSame(FlutterTrio found, FlutterTrio truth, double percent) {
    if (truth.weightedRmsPercent().value() != null) {
      assertThat(value(found.weightedTwoSigmaPercent()))
          .isCloseTo(value(truth.weightedTwoSigmaPercent()), Percentage.withPercentage(percent));
      assertThat(value(found.weightedRmsPercent()))
          .isCloseTo(value(truth.weightedRmsPercent()), Percentage.withPercentage(percent));
    }
    assertThat(value(found.unweightedRmsPercent()))
        .isCloseTo(value(truth.unweightedRmsPercent()), Percentage.withPercentage(percent));
  }

  private static void assertHolds(Figure figure, double truth) {
    Double u = Objects.requireNonNull(figure.expandedUncertainty());
    assertThat(value(figure)).isCloseTo(truth, within(u));
  }

  private static double value(Figure figure) {
    Double value = figure.value();
    assertThat(value).as("%s", figure.why()).isNotNull();
    return Objects.requireNonNull(value);
  }
}
