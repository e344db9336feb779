package turnsheet.core.measure;

import java.util.Arrays;
import java.util.Random;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.QuasiPeakDetector;
import turnsheet.core.dsp.Weighting;
import turnsheet.core.synth.SpeedFunction;

/**
 * What the figures of fluctuation must read, worked out on the speed function: each line shrunk as
 * the tabulated curve says and turned as a filter of least delay turns it, read over the stretch
 * that the product reads. No recording and no demodulator take part.
 */
final class SpeedTruth {

  private static final double GRID = 4000;

  private SpeedTruth() {}

  /** The figures, in percent of the mean speed. */
  record Figures(double twoSigma, double quasiPeak, double weightedRms, double unweightedRms) {}

  /**
   * Works them out.
   *
   * @param fromSeconds where the trace begins; two seconds of it are for running in
   * @param noise what the recording adds to the speed: a stretch of Gaussian noise of this density
   *     is drawn for the readings that depend on its shape
   * @param topHertz end of the unweighted band
   * @param traceHertz up to where the trace holds noise: the weighting does not end at 200 Hz
   */
  static Figures of(
      SpeedFunction speed,
      double fromSeconds,
      double toSeconds,
      TraceNoise noise,
      double topHertz,
      double traceHertz) {
    double[] response = Responses.TAPS;
    int from = (int) (fromSeconds * GRID);
    int count = (int) (toSeconds * GRID) - from;
    double[] weighted = noiseOf(noise, traceHertz, count);
    double plain = Math.pow(noise.floorPercent(0.1, topHertz), 2);
    for (SpeedFunction.Line line : speed.lines()) {
      double peak = 100 * line.peak() / (1 + speed.deviation());
      plain += peak * peak / 2;
      double re = 0;
      double im = 0;
      for (int n = 0; n < response.length; n++) {
        double angle = 2 * Math.PI * line.rateHertz() * n / Responses.RATE;
        re += response[n] * Math.cos(angle);
        im -= response[n] * Math.sin(angle);
      }
      double w = peak * Weighting.gain(line.rateHertz());
      double turn = Math.atan2(im, re) + line.phaseRadians();
      for (int i = 0; i < count; i++) {
        weighted[i] += w * Math.sin(2 * Math.PI * line.rateHertz() * (from + i) / GRID + turn);
      }
    }
    QuasiPeakDetector detector = new QuasiPeakDetector(GRID);
    double[] indicated = new double[count];
    for (int i = 0; i < count; i++) {
      indicated[i] = detector.next(weighted[i]);
    }
    int settled = (int) (2 * GRID);
    double squares = 0;
    for (int i = settled; i < count; i++) {
      squares += weighted[i] * weighted[i] / (count - settled);
    }
    return new Figures(
        percentile(Arrays.copyOfRange(weighted, settled, count)),
        percentile(Arrays.copyOfRange(indicated, settled, count)),
        Math.sqrt(squares),
        Math.sqrt(plain));
  }

  /** The two that need no stretch, without noise; the others are not worked out. */
  static Figures rms(SpeedFunction speed) {
    double plain = 0;
    double weighted = 0;
    for (SpeedFunction.Line line : speed.lines()) {
      double peak = 100 * line.peak() / (1 + speed.deviation());
      plain += peak * peak / 2;
      weighted += Math.pow(peak * Weighting.gain(line.rateHertz()), 2) / 2;
    }
    return new Figures(Double.NaN, Double.NaN, Math.sqrt(weighted), Math.sqrt(plain));
  }

  /** The taps are only asked how far they turn a line; the curve says how far they shrink it. */
  private static final class Responses {
    static final double RATE = 1000;
    static final double[] TAPS = Weighting.response(RATE);
  }

  /** Weighted speed noise, drawn in its spectrum. */
  private static double[] noiseOf(TraceNoise noise, double topHertz, int count) {
    if (noise.timeDensitySecondsSquaredPerHertz() == 0) {
      return new double[count];
    }
    Random random = new Random(5);
    int length = Fft.lengthFor(count);
    double[] spectrum = new double[length];
    double step = GRID / length;
    double density = Math.sqrt(noise.timeDensitySecondsSquaredPerHertz() * step);
    for (int k = 1; k * step <= topHertz; k++) {
      double f = k * step;
      // the inverse transform divides by the length and counts each bin twice
      double each = 100 * 2 * Math.PI * f * density * Weighting.gain(f) * length / 2;
      spectrum[2 * k] = each * random.nextGaussian();
      spectrum[2 * k + 1] = each * random.nextGaussian();
    }
    new Fft(length).realInverse(spectrum);
    return Arrays.copyOf(spectrum, count);
  }

  private static double percentile(double[] values) {
    double[] magnitudes = Arrays.stream(values).map(Math::abs).sorted().toArray();
    return magnitudes[(int) (0.95 * magnitudes.length)];
  }
}
