package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.synth.SpeedFunction;

class TraceFiguresTest {

  private static final MeasureSettings SETTINGS = MeasureSettings.tone(3150);

  static SpeedTrace trace(SpeedFunction speed, double rate, double seconds) {
    SpeedTrace.Builder builder = new SpeedTrace.Builder();
    for (int i = 0; i < seconds * rate; i++) {
      builder.add(100 * (speed.at(i / rate) - 1));
    }
    return builder.build(0, rate);
  }

  private static TraceFigures figures(SpeedFunction speed, double rate, double seconds) {
    return TraceFigures.of(
        trace(speed, rate, seconds), List.of(), TraceNoise.NONE, rate / 2, SETTINGS);
  }

  static double value(Figure figure) {
    return java.util.Objects.requireNonNull(figure.value(), String.valueOf(figure.why()));
  }

  @Test
  void oneLineReadsItsWeightedPeak() {
    double mean = 1.004;
    double peak = 0.1 / mean; // lines are relative to the mean speed
    for (double rate : new double[] {400, 1000, 1002.27, 1600}) {
      for (double hertz : new double[] {0.5556, 1.3, 4, 10.1, 33, 120}) {
        TraceFigures f = figures(SpeedFunction.constant(0.004).plusLine(hertz, 0.1, 1), rate, 40);
        double weighted = peak * Weighting.gain(hertz);
        // 0.5 %: run-in of the weighting at 0.6 Hz, 40 s hold no whole number of turns
        assertThat(value(f.flutter().weightedTwoSigmaPercent()))
            .as("%s Hz at %s", hertz, rate)
            .isCloseTo(0.996917 * weighted, within(0.007 * weighted));
        assertThat(value(f.flutter().weightedRmsPercent()))
            .isCloseTo(weighted / Math.sqrt(2), within(0.007 * weighted));
        assertThat(value(f.flutter().unweightedRmsPercent()))
            .isCloseTo(peak / Math.sqrt(2), within(0.003 * peak));
        assertThat(value(f.speed().deviationPercent())).isCloseTo(0.4, within(0.0001));
        Reading.Line line = f.lines().get(0);
        assertThat(f.lines()).hasSize(1);
        assertThat(value(line.rateHz())).isCloseTo(hertz, within(0.001));
        assertThat(value(line.peakPercent())).isCloseTo(peak, within(0.003 * peak));
      }
    }
  }

  /**
   * Two lines 0.02 Hz apart beat 1.2 times in a minute. The unweighted figure weighs the middle of
   * it most; its interval must hold the rms of the stretch recorded, in closed form.
   */
  @Test
  void theIntervalOfTheUnweightedFigureHoldsASlowBeat() {
    double worst = 0;
    for (int i = 0; i < 8; i++) {
      double lag = i * Math.PI / 4;
      SpeedFunction speed = SpeedFunction.constant(0).plusLine(7, 0.1, 0).plusLine(7.02, 0.08, lag);
      Figure figure = figures(speed, 1000, 60).flutter().unweightedRmsPercent();
      double beat = 2 * Math.PI * 0.02 * 60;
      double cosine = (Math.sin(beat + lag) - Math.sin(lag)) / beat;
      double truth = Math.sqrt((0.1 * 0.1 + 0.08 * 0.08) / 2 + 0.1 * 0.08 * cosine);
      double off = value(figure) - truth;
      worst = Math.max(worst, Math.abs(off) / truth);
      assertThat(Math.abs(off))
          .as("lag %s", lag)
          .isLessThan(java.util.Objects.requireNonNull(figure.expandedUncertainty()));
    }
    System.out.printf("slow beat: unweighted rms off by up to %.3f%n", worst);
    assertThat(worst).isGreaterThan(0.05);
  }

  /** Lines alone: what blocks of a few turns scatter is no scatter of the capture. */
  @Test
  void linesAloneHaveANarrowInterval() {
    TraceFigures f =
        figures(SpeedFunction.constant(0).plusLine(0.7, 0.1, 1).plusLine(5.3, 0.05, 2), 1000, 40);
    Figure rms = f.flutter().weightedRmsPercent();
    double truth =
        Math.sqrt(
            (Math.pow(0.1 * Weighting.gain(0.7), 2) + Math.pow(0.05 * Weighting.gain(5.3), 2)) / 2);
    double half = java.util.Objects.requireNonNull(rms.expandedUncertainty());
    System.out.printf(
        "lines alone: U %.5f of %.5f, off by %.6f%n", half, truth, value(rms) - truth);
    assertThat(Math.abs(value(rms) - truth)).isLessThan(half);
    assertThat(half).isLessThan(0.015 * truth);
  }
}
