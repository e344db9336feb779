package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static turnsheet.core.measure.TraceFiguresTest.value;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.signal.Warning;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** The tone is found anywhere within ten percent of nominal, whatever else is in the recording. */
class ToneSearchTest {

  private static final double RATE = 16_000;
  private static final double LEVEL = 0.3;

  /**
   * Bound on the mean deviation at 40 dB and 30 s, in percentage points. The Cramér-Rao bound on
   * the frequency of this tone is a thousandth of that; the rest is room for what does not belong.
   */
  private static final double CLOSE = 0.0005;

  private static double[] tone(double deviation) {
    return SignalSynth.tone(
        SpeedFunction.constant(deviation), 3150, RATE, 30, LEVEL, 40, Math.round(1e4 * deviation));
  }

  private static void add(double[] samples, double hertz, double level) {
    for (int i = 0; i < samples.length; i++) {
      samples[i] += level * Math.sin(2 * Math.PI * hertz * i / RATE + hertz);
    }
  }

  private static TonePlan.Result found(double[] samples, double deviation) {
    TonePlan.Result result = Tones.measured(samples, RATE, MeasureSettings.tone(3150));
    assertThat(value(result.figures().speed().deviationPercent()))
        .isCloseTo(100 * deviation, within(CLOSE));
    return result;
  }

  @ParameterizedTest
  @ValueSource(doubles = {-0.1, -0.07, -0.013, 0, 0.05, 0.1})
  void besideAnotherToneTwiceAsStrong(double deviation) {
    double[] samples = tone(deviation);
    add(samples, 1000, 2 * LEVEL);
    found(samples, deviation);
  }

  @ParameterizedTest
  @ValueSource(doubles = {-0.1, 0.0, 0.1})
  void aboveMainsTwentyDecibelsBelowWithItsHarmonics(double deviation) {
    double[] samples = tone(deviation);
    for (int harmonic = 1; harmonic <= 40; harmonic++) {
      add(samples, 50 * harmonic, 0.1 * LEVEL / Math.sqrt(harmonic));
    }
    assertThat(found(samples, deviation).warnings()).extracting(Warning::code).contains("hum");
  }

  @Test
  void onAnOffsetAsLargeAsItself() {
    double[] samples = tone(0.1);
    for (int i = 0; i < samples.length; i++) {
      samples[i] += LEVEL;
    }
    found(samples, 0.1);
  }
}
