package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.FirDecimator;
import turnsheet.core.dsp.KaiserFir;
import turnsheet.core.dsp.Window;

/**
 * Averaged power spectrum of the fluctuation: overlapping windowed segments, padded with zeros.
 *
 * <p>Units: bin k at {@code k * stepHertz()} holds the squared peak, in percent of the mean speed,
 * of a line at its middle.
 *
 * <p>Source: P. D. Welch, "The use of fast Fourier transform for the estimation of power spectra",
 * IEEE Trans. Audio Electroacoust. 15 (1967), 70-73.
 */
final class SpeedSpectrum {

  /** A whole capture up to this length is one segment; beyond, memory would grow with it. */
  private static final double LONGEST_SEGMENT_SECONDS = 128;

  private static final double USUAL_SEGMENT_SECONDS = 64;

  private static final double THINNING_DB = 140;

  private final Window window;
  private final double stepHertz;
  private final int segmentSamples;
  private final int fftLength;
  private final int padding;
  private final int segments;
  private final double[] power;

  private SpeedSpectrum(
      Window window, double rate, int segmentSamples, int fftLength, int segments, double[] power) {
    this.window = window;
    this.stepHertz = rate / fftLength;
    this.segmentSamples = segmentSamples;
    this.fftLength = fftLength;
    this.padding = (int) Math.ceil((double) fftLength / segmentSamples);
    this.segments = segments;
    this.power = power;
  }

  /** Averages over everything that is long enough; bins reach up to a frequency. */
  static SpeedSpectrum of(Residual residual, Window window, double toHertz) {
    double rate = residual.clean().rateHertz();
    int longest = residual.clean().longestPiece().length();
    int segment =
        longest <= LONGEST_SEGMENT_SECONDS * rate
            ? longest
            : (int) Math.round(USUAL_SEGMENT_SECONDS * rate);
    int fftLength = Fft.lengthFor(2 * segment);
    double[] taps = thinning(rate, toHertz);
    int thinned = taps.length == 0 ? 1 : 2;
    Fft fft = new Fft(fftLength / thinned);
    double[] shape = window.values(segment);
    scale(shape, 2 * thinned / (segment * window.coherentGain()));
    double[] samples = new double[segment + taps.length];
    double[] work = new double[fft.length()];
    double[] power =
        new double[Math.min(fft.length() / 2, (int) Math.ceil(toHertz * fftLength / rate) + 1)];
    List<Integer> starts = starts(residual.clean(), segment);
    for (int start : starts) {
      residual.copy(start, samples, segment);
      weigh(samples, shape, segment);
      int count = thin(samples, segment, taps, work);
      Arrays.fill(work, count, work.length, 0);
      fft.real(work);
      addPowers(work, power);
    }
    scale(power, 1.0 / starts.size());
    return new SpeedSpectrum(window, rate, segment, fftLength, starts.size(), power);
  }

  private static void weigh(double[] samples, double[] shape, int count) {
    for (int i = 0; i < count; i++) {
      samples[i] *= shape[i];
    }
  }

  private static void scale(double[] values, double factor) {
    for (int i = 0; i < values.length; i++) {
      values[i] *= factor;
    }
  }

  private static void addPowers(double[] work, double[] power) {
    for (int k = 1; k < power.length; k++) {
      power[k] += work[2 * k] * work[2 * k] + work[2 * k + 1] * work[2 * k + 1];
    }
  }

  /**
   * Half the values do where nothing above a quarter of their rate is asked for. The filter before
   * it changes no bin asked for by more than 1e-7.
   *
   * @return taps, an odd number; none where all values are needed
   */
  private static double[] thinning(double rate, double toHertz) {
    return rate < 5 * toHertz
        ? new double[0]
        : KaiserFir.lowPass(toHertz, rate / 2 - toHertz, THINNING_DB, rate);
  }

  /** A windowed segment is zero beyond its ends, so that the filter invents nothing there. */
  private static int thin(double[] samples, int segment, double[] taps, double[] into) {
    if (taps.length == 0) {
      System.arraycopy(samples, 0, into, 0, segment);
      return segment;
    }
    int lead = taps.length / 2;
    System.arraycopy(samples, 0, samples, lead, segment);
    Arrays.fill(samples, 0, lead, 0);
    Arrays.fill(samples, lead + segment, samples.length, 0);
    return new FirDecimator(taps, 2).process(samples, 2 * lead + segment, into);
  }

  private static List<Integer> starts(CleanTrace clean, int segment) {
    List<Integer> starts = new ArrayList<>();
    for (CleanTrace.Piece piece : clean.pieces()) {
      int spare = piece.length() - segment;
      int steps = (int) Math.ceil(spare / (segment / 2.0));
      for (int i = 0; spare >= 0 && i <= steps; i++) {
        starts.add(piece.from() + (steps == 0 ? 0 : (int) ((long) spare * i / steps)));
      }
    }
    return starts;
  }

  double stepHertz() {
    return stepHertz;
  }

  int size() {
    return power.length;
  }

  double power(int bin) {
    return power[bin];
  }

  /** How many segments were averaged. */
  int segments() {
    return segments;
  }

  double segmentSeconds() {
    return 1 / resolutionHertz();
  }

  /** Width of one bin before padding. */
  double resolutionHertz() {
    return stepHertz * fftLength / segmentSamples;
  }

  /** Bins per bin before padding, rounded up. */
  int padding() {
    return padding;
  }

  /** Half of the main lobe's width in bins. */
  int lobeBins() {
    return window.lobeBins() * padding;
  }

  /** Root mean square of the fluctuation between two frequencies. */
  double rmsPercent(double fromHertz, double toHertz) {
    double sum = 0;
    int last = (int) Math.min(power.length - 1, Math.floor(toHertz / stepHertz));
    for (int k = (int) Math.max(1, Math.ceil(fromHertz / stepHertz)); k <= last; k++) {
      sum += power[k];
    }
    // a line's squared peak, spread by window and padding, halved to its mean square
    return Math.sqrt(sum / (2 * window.noiseBandwidthBins()) * segmentSamples / fftLength);
  }
}
