package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/** Lines of the spectrum from a minute of tone: rates, peaks, neighbours, and none in noise. */
class SpectralLinesTest {

  private static final double RATE = 16_000;

  private static List<Reading.Line> lines(SpeedFunction speed, double snrDb, long seed) {
    double[] samples = SignalSynth.tone(speed, 3150, RATE, 60, 0.5, snrDb, seed);
    return Tones.measured(samples, RATE, MeasureSettings.tone(3150)).figures().lines();
  }

  /** 0.01 Hz and 1.5 % are what the product promises; at 70 dB noise takes a fifth of it. */
  private static void holds(List<Reading.Line> found, double hertz, double peakPercent) {
    assertThat(found)
        .as("%s Hz among %s", hertz, found)
        .anySatisfy(
            line -> {
              assertThat(value(line.rateHz())).isCloseTo(hertz, within(0.01));
              assertThat(value(line.peakPercent()))
                  .isCloseTo(peakPercent, within(0.015 * peakPercent));
            });
  }

  @ParameterizedTest
  @ValueSource(doubles = {0.002, 0.02, 0.2})
  void twoLinesFifteenHundredthsOfAHertzApart(double peak) {
    SpeedFunction speed =
        SpeedFunction.constant(0)
            .plusLine(6.03, peak, 1)
            .plusLine(6.18, peak, 2.2)
            .plusLine(13.337, peak, 0.4);
    List<Reading.Line> found = lines(speed, 70, 6);
    holds(found, 6.03, peak);
    holds(found, 6.18, peak);
    holds(found, 13.337, peak);
    assertThat(found).hasSize(3);
  }

  /** A bin of a minute is 1/60 Hz wide: 4 Hz stands on one, the others between two. */
  @ParameterizedTest
  @ValueSource(doubles = {4, 4.0042, 4.0083, 4.0125, 0.7083, 97.3})
  void anywhereBetweenTheBins(double hertz) {
    List<Reading.Line> found = lines(SpeedFunction.constant(0).plusLine(hertz, 0.02, 1), 70, 7);
    holds(found, hertz, 0.02);
    assertThat(found).hasSize(1);
  }

  @Test
  void whileTheMeanSpeedDrifts() {
    // 0.12 percentage points in the minute; lines are relative to the mean speed
    SpeedFunction speed =
        new SpeedFunction(0, 2e-5, List.of()).plusLine(2.222, 0.02, 1).plusLine(6.03, 0.01, 1);
    List<Reading.Line> found = lines(speed, 70, 8);
    holds(found, 2.222, 0.02);
    holds(found, 6.03, 0.01);
    assertThat(found).hasSize(2);
  }

  /** Fewer than one in twenty captures is promised; the chance of none in 20 is then above 1/3. */
  @Test
  void noneInNoise() {
    int found = 0;
    for (int k = 0; k < 20; k++) {
      found += lines(SpeedFunction.constant(0), 40 + 10 * (k % 4), 100 + k).size();
    }
    assertThat(found).isLessThanOrEqualTo(1);
  }
}
