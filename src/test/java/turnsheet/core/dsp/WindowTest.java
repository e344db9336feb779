package turnsheet.core.dsp;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class WindowTest {

  /**
   * Computed with N = 4096, in agreement with F. J. Harris, Proc. IEEE 66 (1978), table 1, as
   * remembered. Scallop loss in dB, correlation of segments that overlap by half and three
   * quarters.
   */
  @ParameterizedTest
  @CsvSource({
    "HANN, 0.5000, 1.5000, 1.4236, 0.1667, 0.6592",
    "BLACKMAN_HARRIS, 0.3588, 2.0044, 0.8256, 0.0376, 0.4600",
    "FLAT_TOP, 0.2156, 3.7702, 0.0098, -0.0153, 0.0455",
  })
  void hasTheTabulatedProperties(
      Window window, double gain, double noise, double scallop, double half, double quarter) {
    int n = 4096;
    double[] w = window.values(n);
    double sum = 0;
    double squares = 0;
    double re = 0;
    double im = 0;
    double halfSum = 0;
    double quarterSum = 0;
    for (int i = 0; i < n; i++) {
      sum += w[i];
      squares += w[i] * w[i];
      re += w[i] * Math.cos(Math.PI * i / n);
      im += w[i] * Math.sin(Math.PI * i / n);
      halfSum += i + n / 2 < n ? w[i] * w[i + n / 2] : 0;
      quarterSum += i + n / 4 < n ? w[i] * w[i + n / 4] : 0;
    }
    // the table has four decimals
    assertThat(sum / n).isCloseTo(gain, within(6e-5));
    assertThat(window.coherentGain()).isCloseTo(sum / n, within(1e-12));
    assertThat(n * squares / (sum * sum)).isCloseTo(noise, within(6e-5));
    assertThat(window.noiseBandwidthBins()).isCloseTo(n * squares / (sum * sum), within(1e-9));
    assertThat(-20 * Math.log10(Math.hypot(re, im) / sum)).isCloseTo(scallop, within(6e-5));
    assertThat(halfSum / squares).isCloseTo(half, within(6e-5));
    assertThat(quarterSum / squares).isCloseTo(quarter, within(6e-5));
  }
}
