package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.io.IOException;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** Prints the table of docs/accuracy.md and holds its bounds. */
@Tag("accuracy")
class ToneAccuracyTest {

  private final Random random = new Random(3);

  /**
   * The last two columns bound the errors of the weighted and the unweighted figures, in percent.
   */
  @ParameterizedTest
  @CsvSource({
    "5, 0.5556, 6, 2",
    "5, 1, 2, 0.1",
    "5, 4, 1, 0.1",
    "5, 63, 0.1, 0.1",
    "10, 0.5556, 2, 0.1",
    "30, 0.2, 1.5, 0.1",
    "30, 0.5556, 0.5, 0.1",
    "60, 0.2, 1, 0.1",
    "60, 0.5556, 0.5, 0.1",
    "60, 4, 0.2, 0.1",
    "60, 200, 5, 0.1",
  })
  void oneLine(double seconds, double hertz, double weightedBound, double unweightedBound)
      throws IOException, RejectedException {
    double twoSigma = 0;
    double rms = 0;
    double unweighted = 0;
    double deviation = 0;
    for (int k = 0; k < 5; k++) {
      SpeedFunction speed =
          SpeedFunction.constant(0.004).plusLine(hertz, 0.1, 2 * Math.PI * random.nextDouble());
      double[] samples = SignalSynth.tone(speed, 3150, 16000, seconds, 0.5, 70, k);
      TraceFigures figures =
          new TonePlan(MeasureSettings.tone(3150))
              .measure(() -> new ArrayReader(samples, 16000, 8192))
              .figures();
      Reading.Flutter flutter = figures.flutter();
      double peak = 0.1 / 1.004;
      double weighted = peak * Weighting.gain(hertz);
      twoSigma = worse(twoSigma, value(flutter.weightedTwoSigmaPercent()), 0.996917 * weighted);
      rms = worse(rms, value(flutter.weightedRmsPercent()), weighted / Math.sqrt(2));
      unweighted = worse(unweighted, value(flutter.unweightedRmsPercent()), peak / Math.sqrt(2));
      deviation = Math.max(deviation, Math.abs(value(figures.speed().deviationPercent()) - 0.4));
    }
    System.out.printf(
        "%4.0f s %7.4f Hz  two-sigma %.3f %%  rms %.3f %%  unweighted %.3f %%  mean %.6f%n",
        seconds, hertz, twoSigma, rms, unweighted, deviation);
    assertThat(Math.max(twoSigma, rms)).isLessThan(weightedBound);
    assertThat(unweighted).isLessThan(unweightedBound);
  }

  private static double worse(double before, double value, double truth) {
    return Math.max(before, 100 * Math.abs(value / truth - 1));
  }
}
