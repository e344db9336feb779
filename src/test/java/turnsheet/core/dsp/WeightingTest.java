package turnsheet.core.dsp;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Table 1 of AES6-2008 (technically IEC 60386), nominal values as two secondary texts quote it. */
class WeightingTest {

  private static final double[][] TABLE = {
    {0.1, -48}, {0.2, -30.6}, {0.315, -19.7}, {0.4, -15}, {0.63, -8.4}, {0.8, -6}, {1, -4.2},
    {1.6, -1.8}, {2, -0.9}, {4, 0}, {6.3, -0.9}, {10, -2.1}, {20, -5.9}, {40, -10.4},
    {63, -14.2}, {100, -17.3}, {200, -23}
  };

  @Test
  void curveRunsThroughTheTable() {
    for (double[] row : TABLE) {
      // rounding of the logarithm
      assertThat(Weighting.decibels(row[0])).isCloseTo(row[1], within(1e-9));
    }
    assertThat(Weighting.decibels(0.05)).isCloseTo(-66, within(1e-9));
    assertThat(Weighting.decibels(400)).isCloseTo(-29, within(1e-9));
  }

  @Test
  void curveIsHighestAtFourHertzAndMonotoneOnEitherSide() {
    for (double f = 0.02; f < 390; f *= 1.01) {
      double rise = Weighting.decibels(f * 1.01) - Weighting.decibels(f);
      if (f * 1.01 <= 4) {
        assertThat(rise).as("%s Hz", f).isPositive();
      } else if (f >= 4) {
        assertThat(rise).as("%s Hz", f).isNegative();
      }
    }
  }

  /**
   * Monotone cubic through the table over log2 of the frequency, computed with another program's
   * interpolator of the same definition (PCHIP of a numerical Python library).
   */
  @Test
  void betweenTheTableItIsTheMonotoneCubic() {
    assertThat(Weighting.decibels(0.15)).isCloseTo(-37.7154011, within(1e-6));
    assertThat(Weighting.decibels(0.5)).isCloseTo(-11.4562848, within(1e-6));
    assertThat(Weighting.decibels(2.8)).isCloseTo(-0.2778250, within(1e-6));
    assertThat(Weighting.decibels(5)).isCloseTo(-0.3128515, within(1e-6));
    assertThat(Weighting.decibels(150)).isCloseTo(-20.4831688, within(1e-6));
  }

  @ParameterizedTest
  @ValueSource(doubles = {50, 200, 500, 1002.2727, 2000})
  void responseFollowsTheCurve(double rate) {
    double[] h = Weighting.response(rate);
    assertThat(h.length / rate).isBetween(8.0, 8.03);
    double worst = 0;
    for (double f = 0.1; f < Math.min(200, 0.45 * rate); f *= 1.07) {
      double error = 20 * Math.log10(gain(h, f / rate)) - Weighting.decibels(f);
      // the response is cut at 8 s: 0.07 dB at 0.1 Hz, 0.022 dB at most from 0.2 Hz on
      // the budget of weighted figures counts on the second
      assertThat(Math.abs(error)).as("%s Hz", f).isLessThan(f < 0.2 ? 0.07 : 0.0225);
      worst = f < 0.2 ? worst : Math.max(worst, Math.abs(error));
    }
    for (double[] row : TABLE) {
      if (row[0] < 0.45 * rate) {
        double error = 20 * Math.log10(gain(h, row[0] / rate)) - row[1];
        assertThat(Math.abs(error)).as("%s Hz", row[0]).isLessThan(row[0] < 0.2 ? 0.1 : 0.05);
      }
    }
    assertThat(worst).isGreaterThan(0);
  }

  /**
   * Jensen's formula: the logarithm of the first tap is the mean of the logarithm of the gain over
   * all frequencies if, and only if, no zero lies outside the unit circle, which is least delay.
   */
  @Test
  void responseIsOfLeastDelay() {
    double rate = 1000;
    int n = 1_000_000;
    double mean = 0;
    for (int i = 0; i < n; i++) {
      mean += Math.log(Weighting.gain((i + 0.5) / n * rate / 2)) / n;
    }
    // the cepstrum of a finite transform
    assertThat(Math.log(Weighting.response(rate)[0])).isCloseTo(mean, within(1e-3));
  }

  private static double gain(double[] h, double turnsPerSample) {
    double re = 0;
    double im = 0;
    for (int i = 0; i < h.length; i++) {
      double angle = 2 * Math.PI * turnsPerSample * i;
      re += h[i] * Math.cos(angle);
      im += h[i] * Math.sin(angle);
    }
    return Math.hypot(re, im);
  }
}
