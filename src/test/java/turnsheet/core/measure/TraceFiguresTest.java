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
}
