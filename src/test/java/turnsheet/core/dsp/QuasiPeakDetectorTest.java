package turnsheet.core.dsp;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Dynamics of AES6 / IEC 60386: rectangular pulses to one side, one per second, of the peak-to-peak
 * size of a 4 Hz sine. 60 ms: 90 % and the fall to 40 % are printed in the abstract of AES6 (1985);
 * the other values and all tolerances are values from memory. The pulses enter before the weighting
 * (docs/interpretation.md).
 */
class QuasiPeakDetectorTest {

  @ParameterizedTest
  @ValueSource(doubles = {400, 1000, 1002.2727, 2000})
  void pulsesReadWhatTheTableSays(double rate) {
    assertThat(crest(pulses(rate, 0.010))).isCloseTo(21, within(3.0));
    assertThat(crest(pulses(rate, 0.030))).isCloseTo(62, within(6.0));
    assertThat(crest(pulses(rate, 0.060))).isCloseTo(90, within(6.0));
    double[] longest = pulses(rate, 0.100);
    assertThat(crest(longest)).isCloseTo(100, within(4.0));
    assertThat(trough(longest)).isCloseTo(40, within(4.0));
  }

  @Test
  void sineOfFourHertzReadsItsPeak() {
    for (double rate : new double[] {100, 1000}) {
      double[] sine = new double[(int) (20 * rate)];
      for (int i = 0; i < sine.length; i++) {
        sine[i] = Math.sin(2 * Math.PI * 4 * i / rate);
      }
      // the weighting is 0 dB at 4 Hz within 0.01 dB
      assertThat(crest(shown(sine, rate))).isCloseTo(100, within(0.2));
    }
  }

  @Test
  void eitherPolarityReadsTheSame() {
    double[] x = {0, 1, 0.2, -0.4, 2, -3, 0.1};
    QuasiPeakDetector a = new QuasiPeakDetector(1000);
    QuasiPeakDetector b = new QuasiPeakDetector(1000);
    for (double v : x) {
      assertThat(a.next(v)).isEqualTo(b.next(-v));
    }
  }

  private static double[] pulses(double rate, double seconds) {
    double[] in = new double[(int) (20 * rate)];
    for (int i = 0; i < in.length; i++) {
      double t = i / rate;
      // a sample stands for its step of time: pulses that end within one count for their share
      double inside = Math.max(0, Math.min(1, (seconds - (t - Math.floor(t))) * rate));
      in[i] = 2 * inside;
    }
    return shown(in, rate);
  }

  private static double[] shown(double[] in, double rate) {
    OverlapSaveFir fir = new OverlapSaveFir(Weighting.response(rate));
    double[] out = new double[fir.roomFor(in.length)];
    int n = fir.process(in, in.length, out);
    double[] rest = new double[fir.roomFor(0)];
    assertThat(fir.finish(rest)).isEqualTo(in.length - n);
    System.arraycopy(rest, 0, out, n, in.length - n);
    QuasiPeakDetector detector = new QuasiPeakDetector(rate);
    double[] shown = new double[in.length];
    for (int i = 0; i < in.length; i++) {
      shown[i] = 100 * detector.next(out[i]);
    }
    return java.util.Arrays.copyOfRange(shown, (int) (15 * rate), shown.length);
  }

  private static double crest(double[] shown) {
    return java.util.Arrays.stream(shown).max().orElseThrow();
  }

  private static double trough(double[] shown) {
    return java.util.Arrays.stream(shown).min().orElseThrow();
  }
}
