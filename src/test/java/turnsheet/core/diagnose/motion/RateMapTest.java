package turnsheet.core.diagnose.motion;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import turnsheet.core.signal.Fluctuation;

class RateMapTest {

  private static Fluctuation fluctuation(double seconds, java.util.function.DoubleUnaryOperator x) {
    double[] samples = new double[(int) (seconds * 500)];
    for (int i = 0; i < samples.length; i++) {
      samples[i] = x.applyAsDouble(i / 500.0);
    }
    return Fluctuation.of(0, 500, samples);
  }

  private static int rowOf(RateMap map, double hertz) {
    int row = 0;
    while (map.hertz(row + 1) <= hertz) {
      row++;
    }
    return row;
  }

  @Test
  void aLineLiesInItsRowAllAlongWithItsPeak() {
    RateMap map = RateMap.of(fluctuation(60, t -> 0.05 * Math.sin(2 * Math.PI * 10 * t)));

    for (int c = 0; c < map.columns(); c++) {
      // two bins of zero padding at most beside it: a quarter of the Hann scalloping, 4 %
      assertThat(map.peakPercent(c, rowOf(map, 10))).isCloseTo(0.05, within(0.002));
      assertThat(map.peakPercent(c, rowOf(map, 20))).isLessThan(0.0005);
    }
  }

  @Test
  void whatComesHalfWayIsSeenFromThere() {
    RateMap map =
        RateMap.of(fluctuation(60, t -> t < 30 ? 0 : 0.05 * Math.sin(2 * Math.PI * 10 * t)));

    int row = rowOf(map, 10);
    assertThat(map.peakPercent(0, row)).isLessThan(1e-5);
    assertThat(map.peakPercent(map.columns() - 1, row)).isCloseTo(0.05, within(0.002));
    // the first column that shows half of it looks at a window whose middle is 30 s
    int first = 0;
    while (map.peakPercent(first, row) < 0.025) {
      first++;
    }
    assertThat((map.seconds(first) + map.seconds(first + 1)) / 2)
        .isCloseTo(30, within(map.seconds(1) - map.seconds(0)));
  }

  @Test
  void tooShortACaptureHasNoMap() {
    Fluctuation brief = fluctuation(3, t -> 0);

    assertThat(RateMap.possible(brief)).isFalse();
    assertThatThrownBy(() -> RateMap.of(brief)).isInstanceOf(IllegalArgumentException.class);
  }
}
