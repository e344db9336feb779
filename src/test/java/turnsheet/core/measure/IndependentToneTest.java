package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.util.Arrays;
import org.hipparchus.complex.Complex;
import org.hipparchus.transform.DftNormalization;
import org.hipparchus.transform.FastFourierTransformer;
import org.hipparchus.transform.TransformType;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/**
 * The same captures the slow way of the textbooks, with another library's transform and none of our
 * code: the analytic signal of the whole capture at once (A. V. Oppenheim and R. W. Schafer,
 * "Discrete-Time Signal Processing", chapter on the discrete Hilbert transform, from memory), its
 * phase unwrapped and differenced, the fluctuation weighted bin by bin.
 */
class IndependentToneTest {

  private static final double RATE = 8192;
  private static final int COUNT = 1 << 19;
  private static final double TONE = 3150;

  /** AES6-2008 table 1 at the rates used here, in decibels (as quoted by two secondary texts). */
  private static double weighting(double hertz) {
    double[][] table = {{0.8, -6}, {4, 0}, {10, -2.1}, {40, -10.4}, {100, -17.3}};
    for (double[] row : table) {
      if (Math.abs(row[0] - hertz) < 1e-9) {
        return Math.pow(10, row[1] / 20);
      }
    }
    throw new IllegalArgumentException(hertz + " Hz");
  }

  @ParameterizedTest
  @CsvSource({"0.8, 0.004, 60", "4, -0.031, 60", "10, 0.02, 45", "40, 0.07, 50", "100, 0, 60"})
  void agreesWithTheWholeCaptureAtOnce(double hertz, double deviation, double snrDb) {
    SpeedFunction speed = SpeedFunction.constant(deviation).plusLine(hertz, 0.1, 1.1);
    double[] samples = SignalSynth.tone(speed, TONE, RATE, COUNT / RATE, 0.6, snrDb, 11);
    double[] hertzOfTone = instantaneous(samples);
    // the ends of a transform of something that does not repeat are of no use
    double[] inner = Arrays.copyOfRange(hertzOfTone, COUNT / 16, COUNT - COUNT / 16);
    double mean = Arrays.stream(inner).average().orElseThrow();
    double[] spectrum = squaredPeaks(inner, mean);
    double step = RATE / padded(inner.length);
    double plain = band(spectrum, step, 0.1, 200, 1);
    double weighted = band(spectrum, step, hertz - 0.5, hertz + 0.5, weighting(hertz));

    TraceFigures figures = Tones.measured(samples, RATE, MeasureSettings.tone(TONE)).figures();

    // the plain mean of 56 s with a wow cut off in mid-turn: 0.1 % / (pi f 56 s) at most
    double cut = 0.1 / (Math.PI * hertz * 56) + 1e-5;
    assertThat(value(figures.speed().deviationPercent()))
        .isCloseTo(100 * (mean / TONE - 1), within(cut));
    assertThat(value(figures.flutter().unweightedRmsPercent()))
        .isCloseTo(plain, within(0.01 * plain));
    assertThat(value(figures.flutter().weightedRmsPercent()))
        .isCloseTo(weighted, within(0.01 * weighted + 0.0003));
    assertThat(value(figures.flutter().weightedTwoSigmaPercent()))
        // the 95th percentile of |sin|, sin(0.95 pi / 2)
        .isCloseTo(Math.sqrt(2) * 0.996917 * weighted, within(0.01 * weighted + 0.0006));
  }

  private static Complex[] transform(double[] real, TransformType type) {
    return new FastFourierTransformer(DftNormalization.STANDARD).transform(real, type);
  }

  /** Frequency of the tone at each sample, from the analytic signal of a band around it. */
  private static double[] instantaneous(double[] samples) {
    Complex[] bins = transform(samples, TransformType.FORWARD);
    double step = RATE / bins.length;
    for (int k = 0; k < bins.length; k++) {
      double f = k * step;
      bins[k] = Math.abs(f - TONE) < 0.22 * TONE ? bins[k].multiply(2) : Complex.ZERO;
    }
    Complex[] analytic =
        new FastFourierTransformer(DftNormalization.STANDARD)
            .transform(bins, TransformType.INVERSE);
    double[] hertz = new double[analytic.length];
    for (int i = 1; i < hertz.length; i++) {
      hertz[i] =
          analytic[i].multiply(analytic[i - 1].conjugate()).getArgument() * RATE / (2 * Math.PI);
    }
    hertz[0] = hertz[1];
    return hertz;
  }

  private static int padded(int n) {
    return Integer.highestOneBit(n - 1) << 1;
  }

  /** Squared peaks in percent of the mean, of a Hann-windowed, padded transform. */
  private static double[] squaredPeaks(double[] hertz, double mean) {
    double[] work = new double[padded(hertz.length)];
    for (int i = 0; i < hertz.length; i++) {
      double hann = 0.5 - 0.5 * Math.cos(2 * Math.PI * i / hertz.length);
      work[i] = 100 * (hertz[i] / mean - 1) * hann;
    }
    Complex[] bins = transform(work, TransformType.FORWARD);
    double[] squares = new double[bins.length / 2];
    // half of the sum of Hann weights for a peak; 1.5 bins of noise bandwidth, before padding
    double scale = 4.0 / hertz.length;
    for (int k = 0; k < squares.length; k++) {
      double peak = bins[k].norm() * scale;
      squares[k] = peak * peak / 1.5 * hertz.length / bins.length;
    }
    return squares;
  }

  private static double band(double[] squares, double step, double from, double to, double gain) {
    double sum = 0;
    for (int k = Math.max(1, (int) Math.ceil(from / step)); k * step <= to; k++) {
      sum += squares[k];
    }
    return gain * Math.sqrt(sum / 2);
  }
}
