package turnsheet.core.dsp;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.hipparchus.complex.Complex;
import org.hipparchus.transform.DftNormalization;
import org.hipparchus.transform.FastFourierTransformer;
import org.hipparchus.transform.TransformType;
import org.junit.jupiter.api.Test;

/** The transform against the sum that defines it and against a general-purpose library. */
class FftTest {

  @Test
  void complexIsTheSumThatDefinesIt() {
    for (int n = 2; n <= 256; n *= 2) {
      double[] data = new Random(n).doubles(2L * n, -1, 1).toArray();
      double[] bins = data.clone();
      new Fft(n).complex(bins);
      for (int k = 0; k < n; k++) {
        double re = 0;
        double im = 0;
        for (int i = 0; i < n; i++) {
          double angle = -2 * Math.PI * i * k / n;
          re += data[2 * i] * Math.cos(angle) - data[2 * i + 1] * Math.sin(angle);
          im += data[2 * i] * Math.sin(angle) + data[2 * i + 1] * Math.cos(angle);
        }
        // rounding of the sums
        assertThat(bins[2 * k]).isCloseTo(re, within(1e-13 * n));
        assertThat(bins[2 * k + 1]).isCloseTo(im, within(1e-13 * n));
      }
    }
  }

  @Test
  void realGivesTheBinsOfTheLibrary() {
    FastFourierTransformer library = new FastFourierTransformer(DftNormalization.STANDARD);
    for (int n = 2; n <= 4096; n *= 2) {
      double[] data = new Random(n).doubles(n, -1, 1).toArray();
      double[] bins = data.clone();
      new Fft(n).real(bins);
      Complex[] expected = library.transform(data, TransformType.FORWARD);
      // rounding, mostly that of the library: the sums of the next test are met far closer
      double rounding = 1e-14 * n;
      assertThat(bins[0]).isCloseTo(expected[0].getReal(), within(rounding));
      assertThat(bins[1]).isCloseTo(expected[n / 2].getReal(), within(rounding));
      for (int k = 1; k < n / 2; k++) {
        assertThat(bins[2 * k]).isCloseTo(expected[k].getReal(), within(rounding));
        assertThat(bins[2 * k + 1]).isCloseTo(expected[k].getImaginary(), within(rounding));
      }
    }
  }

  @Test
  void longTransformsAreTheSumThatDefinesThem() {
    int n = 1 << 18;
    double[] data = new Random(n).doubles(n, -1, 1).toArray();
    double[] bins = data.clone();
    new Fft(n).real(bins);
    for (int k : new int[] {1, 2, 777, n / 8, n / 8 + 1, n / 4, n / 4 + 1, n / 2 - 1}) {
      double re = 0;
      double im = 0;
      for (int i = 0; i < n; i++) {
        double angle = -2 * Math.PI * ((long) i * k % n) / n;
        re += data[i] * Math.cos(angle);
        im += data[i] * Math.sin(angle);
      }
      // rounding of the sum: half a unit of the last place of about 300, at random n times
      double rounding = 0x1p-45 * Math.sqrt(n);
      assertThat(bins[2 * k]).isCloseTo(re, within(rounding));
      assertThat(bins[2 * k + 1]).isCloseTo(im, within(rounding));
    }
  }

  @Test
  void theInverseUndoesTheTransform() {
    for (int n = 2; n <= 1 << 18; n *= 2) {
      double[] data = new Random(n).doubles(n, -1, 1).toArray();
      double[] back = data.clone();
      Fft fft = new Fft(n);
      fft.real(back);
      fft.realInverse(back);
      double worst = 0;
      for (int i = 0; i < n; i++) {
        worst = Math.max(worst, Math.abs(back[i] - data[i]));
      }
      // a few units of the last place
      assertThat(worst).isLessThan(2e-15);
    }
  }

  @Test
  void lengthsMayChangeBetweenRealAndComplex() {
    Fft fft = new Fft(8);
    double[] one = {1, 0, 0, 0, 0, 0, 0, 0};
    fft.real(one);
    assertThat(one).containsExactly(new double[] {1, 1, 1, 0, 1, 0, 1, 0}, within(0.0));
    double[] two = new double[16];
    two[0] = 1;
    fft.complex(two);
    for (int k = 0; k < 8; k++) {
      assertThat(two[2 * k]).isEqualTo(1);
      assertThat(two[2 * k + 1]).isZero();
    }
  }
}
