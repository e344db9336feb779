package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

class TimeGridTest {

  @Test
  void findsTheStepOfRoundedTimes() {
    for (double step : new double[] {4e-6, 1e-6, 1 / 12e6, 1e-3 / 128}) {
      // steps are known to a share of one step over the largest count of steps
      assertThat(TimeGrid.stepSeconds(durations(step)).orElseThrow())
          .isCloseTo(step, within(1e-3 * step));
    }
  }

  @Test
  void findsNoneInTimesThatWereNotRounded() {
    assertThat(TimeGrid.stepSeconds(durations(0))).isEmpty();
  }

  @Test
  void findsNoneWhereAllDurationsAreEqual() {
    assertThat(TimeGrid.stepSeconds(new double[] {0.01, 0.01, 0.01})).isEmpty();
  }

  private static double[] durations(double step) {
    Random random = new Random(2);
    double[] durations = new double[2000];
    double last = 0;
    double exact = 0;
    for (int i = 0; i < durations.length; i++) {
      exact += 625e-6 * (1 + 0.005 * random.nextGaussian());
      double time = step > 0 ? Math.rint(exact / step) * step : exact;
      durations[i] = time - last;
      last = time;
    }
    return durations;
  }
}
