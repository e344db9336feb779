package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.io.IOException;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

class TonePlanTest {

  private static TonePlan.Result measure(double[] samples, double rate, MeasureSettings settings) {
    try {
      return new TonePlan(settings).measure(() -> new ArrayReader(samples, rate, 5000));
    } catch (IOException | RejectedException e) {
      throw new AssertionError(e);
    }
  }

  private static String refusal(double[] samples, double rate, double nominal) {
    RejectedException e =
        catchThrowableOfType(
            RejectedException.class,
            () ->
                new TonePlan(MeasureSettings.tone(nominal))
                    .measure(() -> new ArrayReader(samples, rate, 5000)));
    assertThat(e).isNotNull();
    assertThat(e.rejection().message()).endsWith(".").doesNotContain("NaN", "Infinity");
    return e.rejection().code();
  }

  /** Truth is computed on the speed function: amplitudes, weighting, closed-form two-sigma. */
  @ParameterizedTest
  @CsvSource({
    "8000, 3150, 0.2",
    "11025, 3000, -1.3",
    "44100, 3150, 4",
    "48000, 3150, -10",
    "48000, 1000, 10",
    "96000, 10000, 0.7",
    "96000, 3150, 0.01",
    "22050, 6300, 2",
    "48000, 600, -0.5",
  })
  void readsWhatTheSpeedFunctionSays(double rate, double nominal, double deviationPercent) {
    SpeedFunction speed =
        SpeedFunction.constant(deviationPercent / 100)
            .plusLine(0.5556, 0.02, 0.3)
            .plusLine(4.1, 0.1, 1)
            .plusLine(33, 0.05, 2);
    double[] samples = SignalSynth.tone(speed, nominal, rate, 32, 0.7, 70, 5);
    TonePlan.Result result = measure(samples, rate, MeasureSettings.tone(nominal));
    TraceFigures f = result.figures();
    double scale = 1 / (1 + deviationPercent / 100);
    // 0.0005: noise at 70 dB is far below; rest of the cut-off wow
    assertThat(value(f.speed().deviationPercent())).isCloseTo(deviationPercent, within(0.0005));
    double rms = 0;
    double weighted = 0;
    double[][] lines = {{0.5556, 0.02}, {4.1, 0.1}, {33, 0.05}};
    for (double[] line : lines) {
      double peak = line[1] * scale;
      rms += peak * peak / 2;
      double w = peak * Weighting.gain(line[0]);
      weighted += w * w / 2;
    }
    double floor = value(result.signal().floorPercent());
    // 1 %: 32 s hold no whole number of turns of the slow line, run-in of the weighting; the floor
    // adds its power
    assertThat(value(f.flutter().weightedRmsPercent()))
        .isCloseTo(Math.sqrt(weighted), within(0.01 * Math.sqrt(weighted)));
    assertThat(value(f.flutter().unweightedRmsPercent()))
        .isCloseTo(Math.sqrt(rms + floor * floor), within(0.01 * Math.sqrt(rms)));
    for (double[] line : lines) {
      assertThat(f.lines())
          .as("%s among %s", line[0], f.lines())
          .anySatisfy(
              l -> {
                assertThat(value(l.rateHz())).isCloseTo(line[0], within(0.01));
                assertThat(value(l.peakPercent()))
                    .isCloseTo(line[1] * scale, within(0.015 * line[1] + floor / 100));
              });
    }
    assertThat(f.lines()).hasSize(3);
    assertThat(result.signal().clippedSamples()).isZero();
    assertThat(result.signal().dropouts()).isEmpty();
    // 1 dB: noise density from the edge of the band, where the median of some hundred bins stands
    assertThat(value(result.signal().snrDb())).isCloseTo(70, within(1.0));
  }

  @Test
  void floorFollowsTheNoise() {
    for (double snrDb : new double[] {80, 60, 40}) {
      double rate = 48000;
      double[] samples = SignalSynth.tone(SpeedFunction.constant(0), 3150, rate, 30, 0.5, snrDb, 9);
      TonePlan.Result result = measure(samples, rate, MeasureSettings.tone(3150));
      // S_phi = 2 N0 / A^2 = 1 / (snr * rate / 2), one-sided; S_y = (f/f0)^2 S_phi up to 200 Hz
      double phase = 2 / (Math.pow(10, snrDb / 10) * rate);
      double theory = 100 / 3150.0 * Math.sqrt(phase * 200 * 200 * 200 / 3);
      assertThat(value(result.signal().floorPercent()))
          .as("%s dB", snrDb)
          .isCloseTo(theory, within(0.1 * theory));
      assertThat(value(result.figures().flutter().unweightedRmsPercent()))
          .isCloseTo(theory, within(0.1 * theory));
      assertThat(result.figures().lines()).isEmpty();
      assertThat(result.warnings()).extracting(Warning::code).contains("atFloor");
    }
  }

  @Test
  void fastClockIsCorrected() {
    // a clock fast by 200 ppm takes 48009.6 samples in a true second and calls them 48000 Hz
    double[] samples =
        SignalSynth.tone(
            SpeedFunction.constant(0).plusLine(10, 0.1, 0), 3150, 48009.6, 20, 0.5, 80, 1);
    MeasureSettings plain = MeasureSettings.tone(3150);
    MeasureSettings corrected = new MeasureSettings(CaptureKind.TONE, 1, 3150, 12, null, 1, 200, 0);
    assertThat(value(measure(samples, 48000, plain).figures().speed().deviationPercent()))
        .isCloseTo(-0.02, within(0.0003));
    TraceFigures f = measure(samples, 48000, corrected).figures();
    assertThat(value(f.speed().deviationPercent())).isCloseTo(0, within(0.0003));
    assertThat(value(f.lines().get(0).rateHz())).isCloseTo(10, within(0.001));
  }

  @Test
  void dropoutsAreFoundAndLeftOut() {
    double rate = 48000;
    SpeedFunction speed = SpeedFunction.constant(0.01).plusLine(4, 0.1, 0).plusLine(25, 0.05, 0);
    double[] clean = SignalSynth.tone(speed, 3150, rate, 30, 0.5, 60, 3);
    double[] broken = clean.clone();
    for (int k = 0; k < 10; k++) {
      int at = (int) ((1.7 + 2.77 * k) * rate);
      for (int i = 0; i < 0.005 * rate; i++) {
        broken[at + i] *= 0.01;
      }
    }
    TonePlan.Result a = measure(clean, rate, MeasureSettings.tone(3150));
    TonePlan.Result b = measure(broken, rate, MeasureSettings.tone(3150));
    assertThat(b.signal().dropouts()).hasSize(10);
    assertThat(b.signal().dropouts().get(0).startSeconds()).isCloseTo(1.7, within(0.002));
    assertThat(b.signal().dropouts().get(0).durationSeconds()).isCloseTo(0.005, within(0.002));
    assertThat(b.warnings()).extracting(Warning::code).contains("dropouts");
    double whole = value(a.figures().flutter().weightedTwoSigmaPercent());
    assertThat(value(b.figures().flutter().weightedTwoSigmaPercent()))
        .isCloseTo(whole, within(0.02 * whole));
    double rms = value(a.figures().flutter().unweightedRmsPercent());
    assertThat(value(b.figures().flutter().unweightedRmsPercent()))
        .isCloseTo(rms, within(0.02 * rms));
  }

  @Test
  void runUpAndRunDownAreLeftOut() {
    double rate = 16000;
    double[] samples = new double[(int) (30 * rate)];
    double turns = 0;
    for (int i = 0; i < samples.length; i++) {
      double t = i / rate;
      double ends = 1 - 0.6 * Math.exp(-t / 0.25) - 0.6 * Math.exp(-(30 - t) / 0.25);
      turns += 3150 * 1.003 * (ends + 0.001 * Math.sin(2 * Math.PI * 4 * t)) / rate;
      samples[i] = 0.5 * Math.sin(2 * Math.PI * turns);
    }
    TonePlan.Result result = measure(samples, rate, MeasureSettings.tone(3150));
    assertThat(result.warnings()).extracting(Warning::code).contains("runUp", "runDown");
    // the last per mille of the approach remains in the first second
    assertThat(value(result.figures().speed().deviationPercent())).isCloseTo(0.3, within(0.003));
    assertThat(value(result.figures().flutter().weightedTwoSigmaPercent()))
        .isCloseTo(0.0997, within(0.002));
  }

  @Test
  void clippingAndHumAreTold() {
    double rate = 48000;
    double[] samples = SignalSynth.tone(SpeedFunction.constant(0), 3150, rate, 10, 1.5, 60, 3);
    for (int i = 0; i < samples.length; i++) {
      samples[i] += 0.03 * Math.sin(2 * Math.PI * 50 * i / rate);
      samples[i] = Math.rint(32767 * Math.max(-1, Math.min(1, samples[i]))) / 32768;
    }
    TonePlan.Result result = measure(samples, rate, MeasureSettings.tone(3150));
    // a sine of peak 1.5 is beyond 1 for 1 - 2/pi asin(2/3) = 53.5 % of the time, in runs of four
    // samples; hum and noise move single samples at the ends of runs
    assertThat(result.signal().clippedSamples() / (double) samples.length)
        .isCloseTo(0.535, within(0.06));
    // clipping a sine of peak a at 1 leaves a fundamental of 2/pi (a asin(1/a) + sqrt(1 - 1/a^2))
    // and
    // passes a small signal for the share of time 2/pi asin(1/a) only (describing function)
    double fundamental = 2 / Math.PI * (1.5 * Math.asin(1 / 1.5) + Math.sqrt(1 - 1 / 2.25));
    double hum = 0.03 * 2 / Math.PI * Math.asin(1 / 1.5);
    assertThat(result.signal().mains()).hasSize(1);
    assertThat(result.signal().mains().get(0).rateHz()).isEqualTo(50);
    // 1 dB: 50 Hz may lie between two bins of half a second
    assertThat(result.signal().mains().get(0).relativeDb())
        .isCloseTo(20 * Math.log10(hum / fundamental), within(1.0));
    assertThat(result.warnings()).extracting(Warning::code).contains("clipped", "hum");
  }

  @Test
  void lowToneSaysHowFarItSees() {
    double[] samples =
        SignalSynth.tone(
            SpeedFunction.constant(0.003).plusLine(4, 0.2, 0), 300, 8000, 30, 0.5, 70, 3);
    TonePlan.Result result = measure(samples, 8000, MeasureSettings.tone(300));
    assertThat(value(result.figures().speed().deviationPercent())).isCloseTo(0.3, within(0.001));
    assertThat(result.warnings()).extracting(Warning::code).contains("lowTone");
  }

  @Test
  void refusesWhatIsNoTone() {
    double rate = 16000;
    int n = (int) (10 * rate);
    Random random = new Random(4);
    double[] silent = new double[n];
    double[] noise = new double[n];
    double[] chirp = new double[n];
    double[] voice = new double[n];
    double pitch = 0;
    for (int i = 0; i < n; i++) {
      double t = i / rate;
      noise[i] = 0.2 * random.nextGaussian();
      chirp[i] = 0.5 * Math.sin(2 * Math.PI * (500 * t + 300 * t * t));
      pitch += (140 + 30 * Math.sin(2 * Math.PI * 0.7 * t)) / rate;
      for (int h = 1; h < 40; h++) {
        voice[i] += 0.02 * Math.sin(2 * Math.PI * h * pitch);
      }
    }
    assertThat(refusal(silent, rate, 3150)).isEqualTo("silent");
    assertThat(refusal(noise, rate, 3150)).isEqualTo("noTone");
    assertThat(refusal(chirp, rate, 3150)).isEqualTo("noTone");
    assertThat(refusal(voice, rate, 3150)).isEqualTo("noTone");
    double[] quiet = noise.clone();
    for (int i = 0; i < n; i++) {
      quiet[i] *= 1e-4;
    }
    assertThat(refusal(quiet, rate, 3150)).isEqualTo("silent");
    double[] other = SignalSynth.tone(SpeedFunction.constant(0), 1000, rate, 10, 0.5, 60, 1);
    assertThat(refusal(other, rate, 3150)).isEqualTo("otherTone");
    assertThat(refusal(java.util.Arrays.copyOf(other, 20000), rate, 1000)).isEqualTo("tooShort");
    assertThat(refusal(new double[0], rate, 1000)).isEqualTo("tooShort");
    assertThat(refusal(other, rate, 9000)).isEqualTo("rateTooLow");
  }
}
