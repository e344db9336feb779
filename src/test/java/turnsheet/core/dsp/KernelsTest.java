package turnsheet.core.dsp;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Filters against the sums that define them, and against any cutting of their stream. */
class KernelsTest {

  private final double[] in = new Random(7).doubles(20_000, -1, 1).toArray();
  private final double[] taps = new Random(8).doubles(301, -1, 1).toArray();

  @Test
  void decimatorIsTheSumThatDefinesIt() {
    for (int factor : new int[] {1, 2, 3, 4, 7, 8, 14, 65, 400, 5000}) {
      FirDecimator kernel = new FirDecimator(taps, factor);
      double[] out = new double[kernel.roomFor(in.length)];
      int n = kernel.process(in, in.length, out);
      assertThat(n).isEqualTo((in.length - taps.length) / factor + 1);
      for (int m = 0; m < n; m++) {
        // order of summation
        assertThat(out[m]).isCloseTo(sum(taps, factor * m), within(1e-12));
      }
    }
  }

  @Test
  void decimatorAppliesSeveralFilters() {
    double[] other = new Random(9).doubles(taps.length, -1, 1).toArray();
    FirDecimator kernel = new FirDecimator(new double[][] {taps, other}, 14);
    double[][] out = new double[2][kernel.roomFor(in.length)];
    int n = kernel.process(in, in.length, out);
    for (int m = 0; m < n; m += 97) {
      assertThat(out[0][m]).isCloseTo(sum(taps, 14 * m), within(1e-12));
      assertThat(out[1][m]).isCloseTo(sum(other, 14 * m), within(1e-12));
    }
  }

  private double sum(double[] weights, int at) {
    double sum = 0;
    for (int i = 0; i < weights.length; i++) {
      sum += weights[i] * in[at + i];
    }
    return sum;
  }

  @Test
  void overlapSaveIsTheSumThatDefinesIt() {
    double[] out = overlapSave(in.length);
    assertThat(out).hasSameSizeAs(in);
    for (int k = 0; k < in.length; k += 331) {
      double sum = 0;
      for (int i = 0; i < taps.length && i <= k; i++) {
        sum += taps[i] * in[k - i];
      }
      // rounding of the transform
      assertThat(out[k]).isCloseTo(sum, within(1e-11));
    }
  }

  @Test
  void cuttingTheStreamChangesNoBit() {
    double[] whole = overlapSave(in.length);
    double[] decimated = decimate(in.length, 7);
    double[] dense = decimate(in.length, 1);
    double[] sparse = decimate(in.length, 5000);
    for (int block : new int[] {1, 13, 4096, 9999}) {
      assertThat(overlapSave(block)).isEqualTo(whole);
      assertThat(decimate(block, 7)).isEqualTo(decimated);
      assertThat(decimate(block, 1)).isEqualTo(dense);
      assertThat(decimate(block, 5000)).isEqualTo(sparse);
    }
  }

  @Test
  void demodulatorGivesTheSameBitsHoweverFed() {
    ToneBand band = ToneBand.of(3150, 48000);
    double[] whole = baseband(band, ToneDemodulator.blockSamples());
    assertThat(baseband(band, 100)).isEqualTo(whole);
    assertThat(whole.length).isGreaterThan(100);
  }

  private double[] baseband(ToneBand band, int block) {
    ToneDemodulator kernel = new ToneDemodulator(band);
    double[] out = new double[in.length];
    int n = 0;
    for (int at = 0; at < in.length; at += block) {
      double[] part = Arrays.copyOfRange(in, at, Math.min(in.length, at + block));
      int count = kernel.process(part, part.length);
      for (int i = 0; i < count; i++) {
        out[n++] = kernel.re()[i];
        out[n++] = kernel.im()[i];
      }
    }
    return Arrays.copyOf(out, n);
  }

  private double[] decimate(int block, int factor) {
    FirDecimator kernel = new FirDecimator(taps, factor);
    double[] out = new double[0];
    for (int at = 0; at < in.length; at += block) {
      double[] part = Arrays.copyOfRange(in, at, Math.min(in.length, at + block));
      double[] made = new double[kernel.roomFor(part.length)];
      out = joined(out, made, kernel.process(part, part.length, made));
    }
    return out;
  }

  private double[] overlapSave(int block) {
    OverlapSaveFir kernel = new OverlapSaveFir(taps);
    double[] out = new double[0];
    double[] made = new double[kernel.roomFor(block)];
    for (int at = 0; at < in.length; at += block) {
      double[] part = Arrays.copyOfRange(in, at, Math.min(in.length, at + block));
      out = joined(out, made, kernel.process(part, part.length, made));
    }
    return joined(out, made, kernel.finish(made));
  }

  private static double[] joined(double[] head, double[] tail, int count) {
    double[] all = Arrays.copyOf(head, head.length + count);
    System.arraycopy(tail, 0, all, head.length, count);
    return all;
  }

  @Test
  void lowPassKeepsAndStopsWhatItSays() {
    double rate = 48000;
    double[] h = KaiserFir.lowPass(600, 900, 90, rate);
    assertThat(h.length % 2).isOne();
    for (double f = 0; f < rate / 2; f += 20) {
      double gain = 0;
      for (int i = 0; i < h.length; i++) {
        gain += h[i] * Math.cos(2 * Math.PI * f / rate * (i - h.length / 2));
      }
      // the formula for the number of taps is good to about a decibel
      double ripple = Math.pow(10, -88 / 20.0);
      if (f <= 600) {
        assertThat(gain).as("%s Hz", f).isCloseTo(1, within(ripple));
      } else if (f >= 900) {
        assertThat(Math.abs(gain)).as("%s Hz", f).isLessThan(ripple);
      }
    }
  }

  @Test
  void smootherIsFlatUpToTwoHundredHertz() {
    ToneBand band = ToneBand.of(3150, 96000);
    double rate = band.phaseRateHertz();
    for (double f : new double[] {0.5, 10, 100, 150, 200}) {
      double[] steps = new double[(int) (4 * rate)];
      double w = 2 * Math.PI * f / rate;
      for (int i = 0; i < steps.length; i++) {
        // phase of the speed 1 Hz * cos(2 pi f t), differenced
        steps[i] = (Math.sin(w * (i + 1)) - Math.sin(w * i)) / f;
      }
      SpeedSmoother smoother = new SpeedSmoother(band);
      double[] out = new double[smoother.roomFor(steps.length)];
      int n = smoother.process(steps, steps.length, out);
      double delay = smoother.delaySeconds();
      for (int i = 0; i < n; i++) {
        double t = delay + i / band.traceRateHertz();
        // ripple of the low pass, 80 dB
        assertThat(out[i]).isCloseTo(Math.cos(2 * Math.PI * f * t), within(3e-4));
      }
    }
  }

  @Test
  void transformTakesPowersOfTwoOnly() {
    assertThatThrownBy(() -> new Fft(1000)).isInstanceOf(IllegalArgumentException.class);
    assertThat(Fft.lengthFor(1000)).isEqualTo(1024);
    assertThat(Fft.lengthFor(1024)).isEqualTo(1024);
    assertThat(Fft.lengthFor(1)).isEqualTo(2);
  }
}
