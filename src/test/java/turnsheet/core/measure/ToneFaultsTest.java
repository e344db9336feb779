package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.List;
import java.util.Random;
import java.util.function.ToDoubleFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.signal.Warning;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** What goes wrong with a recording is found, counted and told, and hardly moves a figure. */
class ToneFaultsTest {

  private static final double RATE = 48_000;
  private static final int SECONDS = 60;

  private static final SpeedFunction SPEED =
      SpeedFunction.constant(0.01)
          .plusLine(0.7, 0.05, 0.3)
          .plusLine(4, 0.1, 0)
          .plusLine(25, 0.05, 1);

  /** What is promised of every figure of fluctuation. */
  private static final double SHARE = 0.02;

  private static final double[] CLEAN = SignalSynth.tone(SPEED, 3150, RATE, SECONDS, 0.5, 60, 3);
  private static final TonePlan.Result OF_CLEAN = measured(CLEAN);

  private static TonePlan.Result measured(double[] samples) {
    return Tones.measured(samples, RATE, MeasureSettings.tone(3150));
  }

  private static TonePlan.Result hardlyMoved(double[] samples) {
    TonePlan.Result result = measured(samples);
    Reading.Flutter found = result.figures().flutter();
    Reading.Flutter clean = OF_CLEAN.figures().flutter();
    List<ToDoubleFunction<Reading.Flutter>> figures =
        List.of(
            f -> value(f.weightedTwoSigmaPercent()),
            f -> value(f.weightedQuasiPeakPercent()),
            f -> value(f.weightedRmsPercent()),
            f -> value(f.unweightedRmsPercent()));
    for (ToDoubleFunction<Reading.Flutter> figure : figures) {
      double truth = figure.applyAsDouble(clean);
      assertThat(figure.applyAsDouble(found)).isCloseTo(truth, within(SHARE * truth));
    }
    // the uncertainty of a mean over 60 s with three lines, some of it cut out
    assertThat(value(result.figures().speed().deviationPercent())).isCloseTo(1, within(0.0005));
    return result;
  }

  private static List<String> codes(TonePlan.Result result) {
    return result.warnings().stream().map(Warning::code).toList();
  }

  @Test
  void aSoundRecordingHasNothingToTell() {
    assertThat(OF_CLEAN.warnings()).isEmpty();
    assertThat(OF_CLEAN.signal().clippedSamples()).isZero();
  }

  @ParameterizedTest
  @ValueSource(doubles = {1.3, 60})
  void levelSwingingByHalf(double hertz) {
    double[] samples = CLEAN.clone();
    for (int i = 0; i < samples.length; i++) {
      samples[i] *= 1 + 0.5 * Math.sin(2 * Math.PI * hertz * i / RATE);
    }
    TonePlan.Result result = hardlyMoved(samples);
    assertThat(codes(result)).containsExactly("unsteadyLevel");
    assertThat(result.warnings().get(0).message()).contains("±50 %");
  }

  @Test
  void twentyDropoutsAMinute() {
    double[] samples = CLEAN.clone();
    Random random = new Random(1);
    for (int k = 0; k < 20; k++) {
      int at = (int) ((1 + 2.9 * k + random.nextDouble()) * RATE);
      for (int i = at; i < at + 0.005 * RATE; i++) {
        samples[i] *= 0.01;
      }
    }
    TonePlan.Result result = hardlyMoved(samples);
    assertThat(codes(result)).containsExactly("dropouts");
    assertThat(result.signal().dropouts()).hasSize(20);
  }

  @Test
  void clicks() {
    double[] samples = CLEAN.clone();
    Random random = new Random(2);
    for (int k = 0; k < 20; k++) {
      int at = (int) ((1 + 2.9 * k + random.nextDouble()) * RATE);
      for (int i = 0; i < 40; i++) {
        samples[at + i] += 0.9 * Math.exp(-i / 8.0);
      }
    }
    TonePlan.Result result = hardlyMoved(samples);
    assertThat(codes(result)).containsExactly("clicks");
    assertThat(result.warnings().get(0).message()).startsWith("20 clicks");
  }

  /** A step of the speed that stays is the machine's own and must not be taken for a click. */
  @Test
  void aJumpOfTheSpeedIsNoClick() {
    double[] samples = new double[(int) (20 * RATE)];
    double turns = 0;
    for (int i = 0; i < samples.length; i++) {
      turns += 3150 * (i / RATE % 4 < 2 ? 1.004 : 0.996) / RATE;
      samples[i] = 0.5 * Math.sin(2 * Math.PI * (turns - Math.rint(turns)));
    }
    TonePlan.Result result = measured(samples);
    assertThat(codes(result)).doesNotContain("clicks");
    // a square of 0.4 % about the mean; what lies above 200 Hz is missing
    assertThat(value(result.figures().flutter().unweightedRmsPercent()))
        .isCloseTo(0.4, within(0.01));
  }

  @Test
  void topsClippedBelowFullScale() {
    double[] samples = CLEAN.clone();
    for (int i = 0; i < samples.length; i++) {
      samples[i] = Math.max(-0.3, Math.min(0.3, samples[i]));
    }
    TonePlan.Result result = hardlyMoved(samples);
    assertThat(codes(result)).containsExactly("clipped");
    // a sine of peak 0.5 is beyond 0.3 for 1 - 2/pi asin(0.6) = 59 % of the time
    assertThat(result.signal().clippedSamples() / (double) samples.length)
        .isCloseTo(0.59, within(0.02));
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 0.0003})
  void aGapOfThreeSeconds(double noise) {
    double[] samples = CLEAN.clone();
    Random random = new Random(3);
    for (int i = (int) (25 * RATE); i < 28 * RATE; i++) {
      samples[i] = noise * random.nextGaussian();
    }
    TonePlan.Result result = hardlyMoved(samples);
    assertThat(codes(result)).containsExactly("dropouts");
    assertThat(result.signal().dropouts()).hasSize(1);
    assertThat(result.signal().dropouts().get(0).startSeconds()).isCloseTo(25, within(0.01));
    assertThat(result.signal().dropouts().get(0).durationSeconds()).isCloseTo(3, within(0.01));
  }

  @Test
  void theUnitStartsAndStops() {
    double[] samples = new double[CLEAN.length];
    Random random = new Random(4);
    double turns = 0;
    for (int i = 0; i < samples.length; i++) {
      double t = i / RATE;
      double run = Math.min(1, t / 3) * Math.min(1, Math.max(0, (SECONDS - t) / 2));
      turns += 3150 * SPEED.at(t) * run / RATE;
      samples[i] =
          0.5 * Math.sin(2 * Math.PI * (turns - Math.rint(turns))) + 0.0003 * random.nextGaussian();
    }
    assertThat(codes(hardlyMoved(samples))).contains("runUp", "runDown");
  }
}
