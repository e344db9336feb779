package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.Arrays;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** What must not change a figure does not, and what must change it does so in proportion. */
class InvarianceTest {

  private static final double RATE = 16_000;
  private static final SpeedFunction SPEED =
      SpeedFunction.constant(0.004).plusLine(1, 0.05, 0.2).plusLine(5, 0.08, 1);
  private static final double[] SAMPLES = SignalSynth.tone(SPEED, 3150, RATE, 30, 0.25, 70, 5);

  private static Reading reading(double[] samples) throws Exception {
    TonePlan.Result result = Tones.measured(samples, RATE, MeasureSettings.tone(3150));
    return new Reading(
        new Reading.Source("", "", CaptureKind.TONE, 1, RATE, result.durationSeconds()),
        new Reading.Method("", MeasureSettings.tone(3150)),
        result.figures().speed(),
        result.figures().flutter(),
        result.figures().lines(),
        null,
        result.signal(),
        result.warnings());
  }

  private static double[] figures(double[] samples) throws Exception {
    Reading reading = reading(samples);
    return Stream.of(
            FigureName.DEVIATION,
            FigureName.WEIGHTED_TWO_SIGMA,
            FigureName.WEIGHTED_QUASI_PEAK,
            FigureName.WEIGHTED_RMS,
            FigureName.UNWEIGHTED_RMS)
        .mapToDouble(name -> value(name.of(reading)))
        .toArray();
  }

  @Test
  void aLevelFourTimesAsHighChangesNoFigure() throws Exception {
    double[] louder = Arrays.stream(SAMPLES).map(x -> 4 * x).toArray();
    // a power of two changes exponents only, but for the level's starting value in a table
    assertThat(figures(louder)).containsExactly(figures(SAMPLES), within(1e-9));
  }

  @Test
  void reversedPolarityChangesNoFigure() throws Exception {
    double[] reversed = Arrays.stream(SAMPLES).map(x -> -x).toArray();
    assertThat(figures(reversed)).containsExactly(figures(SAMPLES), within(1e-9));
  }

  @Test
  void aLaterStartHardlyChangesAFigure() throws Exception {
    // both lines stand in whole turns on the second: the same machine a second later
    double[] all = SignalSynth.tone(SPEED, 3150, RATE, 31, 0.25, 70, 5);
    double[] later = Arrays.copyOfRange(all, (int) RATE, all.length);
    // noise at 70 dB is another in the new second: some 1e-5 percentage points
    assertThat(figures(later)).containsExactly(figures(SAMPLES), within(5e-5));
  }

  @Test
  void twiceTheFluctuationReadsTwice() throws Exception {
    SpeedFunction twice = SpeedFunction.constant(0.004).plusLine(1, 0.1, 0.2).plusLine(5, 0.16, 1);
    double[] doubled = figures(SignalSynth.tone(twice, 3150, RATE, 30, 0.25, 70, 5));
    double[] once = figures(SAMPLES);
    // the first figure is the deviation, which stays; noise of 0.0009 % adds its power to both
    assertThat(doubled[0]).isCloseTo(once[0], within(1e-4));
    for (int i = 1; i < once.length; i++) {
      assertThat(doubled[i]).isCloseTo(2 * once[i], within(0.001 * once[i]));
    }
  }

  @Test
  void twoThreadsGiveTheSameBits() throws Exception {
    ExecutorService threads = Executors.newFixedThreadPool(2);
    try {
      Callable<Reading> one = () -> reading(SAMPLES);
      List<Future<Reading>> both = threads.invokeAll(List.of(one, one));
      assertThat(both.get(0).get()).isEqualTo(reading(SAMPLES));
      assertThat(both.get(1).get()).isEqualTo(both.get(0).get());
    } finally {
      threads.shutdown();
    }
  }
}
