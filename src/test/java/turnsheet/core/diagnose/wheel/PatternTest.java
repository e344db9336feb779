package turnsheet.core.diagnose.wheel;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WheelSynth;

class PatternTest {

  private static final int DRAWS = 60;

  @Test
  void theIntervalHoldsTheTruthAsOftenAsItSays() {
    SpeedFunction speed = SpeedFunction.constant(0).plusLine(0.91, 0.05, 1).plusLine(11.3, 0.08, 2);
    int held = 0;
    double error = 0;
    for (int seed = 1; seed <= DRAWS; seed++) {
      WheelSynth wheel = WheelSynth.uneven(24, 0.001, seed);
      double[] rises = wheel.risingEdges(speed, 200, 10, 1e-5, 0, 100 + seed);
      EdgeTrain train = EdgeTrain.of(rises, 1 / 200.0);
      Numbering numbering = Numbering.of(train, 24, null);
      Deviations deviations = Deviations.of(train, 24);
      TurnAverage average = TurnAverage.of(train, deviations, numbering);
      Pattern pattern = new Pattern(train, deviations, numbering, average, 200 / 24.0);
      double rms = pattern.rms(pattern.values(true));
      double off = rms - wheel.rmsPeriods();
      held += Math.abs(off) <= 2 * pattern.rmsUncertainty(rms) ? 1 : 0;
      error += off / wheel.rmsPeriods() / DRAWS;
    }
    // 95 of 100 are meant to: fewer than 51 of 60 come once in 1000 such tests
    assertThat(held).isGreaterThanOrEqualTo(51);
    // noise adds to a mean square; it is taken off, so that no bias is left but that of 60 draws
    assertThat(error).isBetween(-0.02, 0.02);
  }

  @Test
  void valuesAndCoefficientsAreEachOthersInverse() {
    for (int places : new int[] {2, 3, 8, 47}) {
      double[] late = WheelSynth.uneven(places, 1, places).latePeriods();
      double mean = java.util.Arrays.stream(late).average().orElseThrow();
      double[] re = new double[places];
      double[] im = new double[places];
      Harmonics.transform(late, new double[places], re, im);
      double[] back = Harmonics.values(places, re, im);
      for (int j = 0; j < places; j++) {
        assertThat(back[j])
            .isCloseTo(late[j] - mean, org.assertj.core.api.Assertions.within(1e-12));
      }
    }
  }
}
