package turnsheet.reading.chart;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

class CurveTest {

  private static final Curve TEN =
      Curve.ofSamples(1.0, 0.5, new float[] {3, 1, 4, 1, 5, 9, 2, 6, 5, 3});

  @Test
  void windowOfFewSamplesIsExactAndReachesOnePointBeyondBothEdges() {
    // 1.7 lies between points 1 (1.5) and 2 (2.0); 2.9 between 3 (2.5) and 4 (3.0)
    Curve window = TEN.window(1.7, 2.9, 100);

    assertThat(window.isExact()).isTrue();
    assertThat(window.size()).isEqualTo(4);
    assertThat(window.x(0)).isEqualTo(1.5);
    assertThat(new float[] {window.low(0), window.low(1), window.low(2), window.low(3)})
        .containsExactly(1, 4, 1, 5);
    assertThat(window.high(3)).isEqualTo(5);
  }

  @Test
  void bucketsHoldLowestAndHighestAndLieAtTheirMiddle() {
    Curve window = TEN.window(1.0, 5.5, 4);

    // ten points in at most four buckets: three a bucket, the last with one
    assertThat(window.samplesPerPoint()).isEqualTo(3);
    assertThat(window.size()).isEqualTo(4);
    assertThat(new float[] {window.low(0), window.low(1), window.low(2), window.low(3)})
        .containsExactly(1, 1, 2, 3);
    assertThat(new float[] {window.high(0), window.high(1), window.high(2), window.high(3)})
        .containsExactly(4, 9, 6, 3);
    assertThat(window.x(0)).isEqualTo(1.5);
    assertThat(window.step()).isEqualTo(1.5);
  }

  @Test
  void movedWindowShowsTheSameBuckets() {
    Curve whole = TEN.window(1.0, 5.5, 4);
    Curve later = TEN.window(2.5, 5.5, 3);

    assertThat(later.samplesPerPoint()).isEqualTo(3);
    assertThat(later.x(0)).isEqualTo(whole.x(1));
    assertThat(later.high(0)).isEqualTo(whole.high(1));
  }

  @Test
  void pointsWithoutValueDoNotHideTheirNeighbours() {
    Curve curve =
        Curve.ofSamples(0, 1, new float[] {Float.NaN, 2, Float.NaN, Float.NaN, 7, Float.NaN});
    Curve window = curve.window(0, 5, 3);

    assertThat(window.low(0)).isEqualTo(2);
    assertThat(window.high(1)).isNaN();
    assertThat(window.high(2)).isEqualTo(7);
  }

  @Test
  void reducingInTwoStepsLosesNoExtreme() {
    Random random = new Random(20);
    float[] values = new float[10_000];
    for (int i = 0; i < values.length; i++) {
      values[i] = (float) random.nextGaussian();
    }
    values[1234] = 50;
    values[8765] = -50;
    Curve whole = Curve.ofSamples(0, 0.001, values);
    Curve once = whole.reducedTo(1000);
    Curve twice = once.reducedTo(100);

    assertThat(twice.size()).isEqualTo(100);
    assertThat(twice.samplesPerPoint()).isEqualTo(100);
    assertThat(twice.high(12)).isEqualTo(50);
    assertThat(twice.low(87)).isEqualTo(-50);
    // bucket 12 holds samples 1200 to 1299: middle 1.2495 s but for rounding of the sums
    assertThat(twice.x(12)).isCloseTo(1.2495, within(1e-12));
  }

  @Test
  void neverGivesMorePointsThanAskedFor() {
    Curve curve = Curve.ofSamples(0, 1, new float[997]);
    for (int points = 2; points < 60; points++) {
      for (int from = 0; from < 40; from++) {
        assertThat(curve.window(from, 900 - from, points).size()).isBetween(1, points);
      }
    }
  }

  @Test
  void windowBesideTheCurveShowsItsEdge() {
    assertThat(TEN.window(100, 200, 10).size()).isEqualTo(1);
    assertThat(TEN.window(-1e18, 1e18, 10).size()).isEqualTo(10);
  }

  @Test
  void refusesAWindowThatEndsBeforeItStarts() {
    assertThatIllegalArgumentException().isThrownBy(() -> TEN.window(2, 1, 10));
    assertThatIllegalArgumentException().isThrownBy(() -> TEN.window(Double.NaN, 1, 10));
  }
}
