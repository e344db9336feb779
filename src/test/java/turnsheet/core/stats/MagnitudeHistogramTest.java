package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import java.util.function.IntToDoubleFunction;
import org.junit.jupiter.api.Test;

class MagnitudeHistogramTest {

  private static final int COUNT = 200_000;

  private static double twoSigma(IntToDoubleFunction values) {
    MagnitudeHistogram h = new MagnitudeHistogram();
    for (int i = 0; i < COUNT; i++) {
      h.add(values.applyAsDouble(i));
    }
    return h.quantile(0.95);
  }

  /** Closed forms of the magnitude exceeded for 5 % of the time; not twice the rms. */
  @Test
  void readsTheAnalyticTwoSigmaValues() {
    double turn = 2 * Math.PI * 37 / COUNT;
    // 2e-4: width of a class is 2^-12, interpolated; the sine is even inside it
    assertThat(twoSigma(i -> 0.3 * Math.sin(turn * i)))
        .isCloseTo(0.3 * Math.sin(0.95 * Math.PI / 2), within(0.3 * 2e-4));
    assertThat(twoSigma(i -> 0.3 * (4 * Math.abs((i * 37.0 / COUNT) % 1 - 0.5) - 1)))
        .isCloseTo(0.3 * 0.95, within(0.3 * 2e-4));
    assertThat(twoSigma(i -> i % 2 == 0 ? 0.3 : -0.3)).isCloseTo(0.3, within(0.3 * 2.5e-4));
    Random random = new Random(11);
    // standard error of the quantile: sqrt(0.95 * 0.05 / n) / (2 phi(1.96)) = 0.0042; three of it
    assertThat(twoSigma(i -> 0.3 * random.nextGaussian()))
        .isCloseTo(0.3 * 1.959964, within(0.3 * 0.0126));
  }

  @Test
  void holdsZeroAndForgets() {
    MagnitudeHistogram h = new MagnitudeHistogram();
    assertThatThrownBy(() -> h.quantile(0.5)).isInstanceOf(IllegalStateException.class);
    h.add(0);
    h.add(-0.0);
    assertThat(h.quantile(0.95)).isCloseTo(0, within(1e-40));
    h.clear();
    assertThat(h.total()).isZero();
    h.add(5);
    assertThat(h.quantile(0.5)).isCloseTo(5, within(5 * 2.5e-4));
  }
}
