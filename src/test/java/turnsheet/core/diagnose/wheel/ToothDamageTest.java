package turnsheet.core.diagnose.wheel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.assertj.core.data.Percentage;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.measure.EdgeTimes;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WheelSynth;

/** Marks and teeth that stand out, by number. */
class ToothDamageTest {

  private static final SpeedFunction SPEED =
      SpeedFunction.constant(0.003).plusLine(0.91, 0.05, 1).plusLine(11.3, 0.08, 2);

  /** 60 places of which the last two lack their teeth; tooth 1 comes after them. */
  private static final WheelSynth MARKED = WheelSynth.uneven(60, 0.002, 4).without(58, 59);

  @ParameterizedTest
  @ValueSource(ints = {0, 20, 58})
  void teethHaveTheirNumbersFromTheMarkWhereverTheCaptureBegins(int first) throws Exception {
    WheelSynth wheel =
        MARKED.without(5, 58, 59).late(16, -0.15).late(30, 0.05).withSplit(9).startingAt(first);
    WheelFinding finding = Wheels.look(wheel.risingEdges(SPEED, 400, 20, 1e-6, 0, 5), 400, null);
    assertThat(finding.places()).isEqualTo(60);
    assertThat(finding.origin()).isEqualTo(WheelFinding.Origin.MARK);
    assertThat(finding.markMissing()).isEqualTo(2);
    assertThat(finding.lostEdges()).isZero();
    assertThat(finding.extraEdges()).isZero();
    assertThat(finding.damage())
        .extracting(d -> d.kind() + " " + d.tooth())
        .containsExactly("MISSING 6", "SPLIT 10", "EARLY 17", "LATE 31");
    // off the middle of its neighbours, which are uneven by 0.2 % themselves
    assertThat(finding.damage().get(2).percentOfPeriod()).isCloseTo(-15, within(0.6));
    assertThat(finding.damage().get(3).percentOfPeriod()).isCloseTo(5, within(0.6));
    assertThat(finding.patternRmsPercentOfPeriod().value())
        .isCloseTo(100 * wheel.rmsPeriods(), Percentage.withPercentage(1));
  }

  @Test
  void withoutAMarkTheyCountFromTheFirstEdge() throws Exception {
    WheelSynth wheel = WheelSynth.uneven(60, 0.002, 4).late(16, -0.15).withSplit(9);
    WheelFinding finding = Wheels.look(wheel.risingEdges(SPEED, 400, 20, 1e-6, 0, 5), 400, 60);
    assertThat(finding.markMissing()).isZero();
    // the list begins with place 1
    assertThat(finding.damage())
        .extracting(d -> d.kind() + " " + d.tooth())
        .containsExactly("SPLIT 9", "EARLY 16");
  }

  @Test
  void aMarkIsNoLossAndHarmsNoFlutter() throws Exception {
    double[] rises = MARKED.risingEdges(SPEED, 400, 20, 0, 0, 5);
    WheelFinding finding = Wheels.look(rises, 400, 60);
    assertThat(finding.origin()).isEqualTo(WheelFinding.Origin.STATED);
    assertThat(finding.lostEdges()).isZero();
    assertThat(finding.damage()).isEmpty();
    assertThat(finding.teeth()).hasSize(58);
    double[] even = WheelSynth.even(60).risingEdges(SPEED, 400, 20, 0, 0, 5);
    FlutterTrio truth = FlutterTrio.of(Wheels.measured(even, 400));
    assertThat(finding.flutterWithout().weightedTwoSigmaPercent().value())
        .isCloseTo(truth.weightedTwoSigmaPercent().value(), Percentage.withPercentage(1));
    assertThat(finding.flutterWithout().weightedRmsPercent().value())
        .isCloseTo(truth.weightedRmsPercent().value(), Percentage.withPercentage(1));
  }

  @Test
  void edgesLostAtRandomAreLostAndNoMark() throws Exception {
    double[] rises = WheelSynth.uneven(60, 0.003, 4).risingEdges(SPEED, 400, 20, 1e-6, 0, 5);
    double[] some = new double[rises.length];
    int n = 0;
    for (int k = 0; k < rises.length; k++) {
      if (k % 97 != 50 && k % 331 != 7) {
        some[n++] = rises[k];
      }
    }
    WheelFinding finding = Wheels.look(java.util.Arrays.copyOf(some, n), 400, 60);
    assertThat(finding.markMissing()).isZero();
    assertThat(finding.lostEdges()).isEqualTo(rises.length - n);
    assertThat(finding.damage()).isEmpty();
    assertThat(finding.patternRmsPercentOfPeriod().value())
        .isCloseTo(
            100 * WheelSynth.uneven(60, 0.003, 4).rmsPeriods(), Percentage.withPercentage(2));
  }

  @Test
  void aRenderedWaveformShowsTheSame() throws Exception {
    WheelSynth wheel = MARKED.late(16, -0.08).eccentric(0.01, 0).startingAt(33);
    double[] rises = wheel.risingEdges(SPEED, 400, 12, 0, 0, 5);
    double[] wave = WheelSynth.waveform(rises, 1 / 400.0, 16000, 12, 0.5, 0.001, 3);
    EdgeTimes edges =
        EdgeTimes.ofWaveform(
            () -> new Samples(wave, 16000),
            MeasureSettings.tachometer(400, null),
            WheelLook.MOST_EDGES);
    WheelFinding finding =
        WheelLook.find(edges, null, edges.measured(edges.risesSeconds(), null), done -> {});
    assertThat(finding.places()).isEqualTo(60);
    assertThat(finding.markMissing()).isEqualTo(2);
    assertThat(finding.damage())
        .extracting(d -> d.kind() + " " + d.tooth())
        .containsExactly("EARLY 17");
    // noise of the waveform over its slope is 0.02 % of a period an edge
    assertThat(finding.patternRmsPercentOfPeriod().value())
        .isCloseTo(100 * wheel.rmsPeriods(), Percentage.withPercentage(1));
  }
}
