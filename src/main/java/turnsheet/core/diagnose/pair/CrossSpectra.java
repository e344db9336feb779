package turnsheet.core.diagnose.pair;

import java.util.Arrays;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Window;

/**
 * Autospectra and cross-spectrum of two series, averaged over overlapping Hann segments.
 *
 * <p>Units: one-sided densities, squared relative speed per hertz; bin k is at {@code k *
 * stepHertz()}.
 *
 * <p>Source: J. S. Bendat and A. G. Piersol, "Random data", chapters on spectral estimates and
 * their errors (from memory).
 */
final class CrossSpectra {

  private final Fft fft;
  private final double rateHertz;
  private final double[] window;
  private final double scale;
  private final double[] first;
  private final double[] second;
  private final double[] real;
  private final double[] imaginary;
  private int segments;

  CrossSpectra(int length, double rateHertz) {
    // the mean square of a Hann window is 3/8 (F. J. Harris, Proc. IEEE 66 (1978), 51-83)
    this(new Fft(length), rateHertz, Window.HANN.values(length), 2 / (rateHertz * length * 0.375));
  }

  /** An empty one of the same shape, which works in turns with the other. */
  CrossSpectra empty() {
    return new CrossSpectra(fft, rateHertz, window, scale);
  }

  private CrossSpectra(Fft fft, double rateHertz, double[] window, double scale) {
    this.fft = fft;
    this.rateHertz = rateHertz;
    this.window = window;
    this.scale = scale;
    this.first = new double[window.length / 2];
    this.second = new double[window.length / 2];
    this.real = new double[window.length / 2];
    this.imaginary = new double[window.length / 2];
  }

  /** Forgets everything. */
  void clear() {
    Arrays.fill(first, 0);
    Arrays.fill(second, 0);
    Arrays.fill(real, 0);
    Arrays.fill(imaginary, 0);
    segments = 0;
  }

  /** Adds one segment; both arrays are overwritten. */
  void add(double[] one, double[] other) {
    transform(one);
    transform(other);
    for (int k = 1; k < first.length; k++) {
      double a = one[2 * k];
      double b = one[2 * k + 1];
      double c = other[2 * k];
      double d = other[2 * k + 1];
      first[k] += scale * (a * a + b * b);
      second[k] += scale * (c * c + d * d);
      real[k] += scale * (a * c + b * d);
      imaginary[k] += scale * (b * c - a * d);
    }
    segments++;
  }

  private void transform(double[] values) {
    for (int i = 0; i < window.length; i++) {
      values[i] *= window[i];
    }
    fft.real(values);
  }

  /** Adds what another has averaged over. */
  void add(CrossSpectra other) {
    for (int k = 1; k < first.length; k++) {
      first[k] += other.first[k];
      second[k] += other.second[k];
      real[k] += other.real[k];
      imaginary[k] += other.imaginary[k];
    }
    segments += other.segments;
  }

  int segments() {
    return segments;
  }

  int size() {
    return first.length;
  }

  double stepHertz() {
    return rateHertz / window.length;
  }

  /** Density of the first series. */
  double first(int bin) {
    return first[bin] / segments;
  }

  /** Density of the second series. */
  double second(int bin) {
    return second[bin] / segments;
  }

  /** Real part of the cross-spectrum: what both show at the same moment. */
  double common(int bin) {
    return real[bin] / segments;
  }

  double imaginary(int bin) {
    return imaginary[bin] / segments;
  }

  /** Density of the first less the second. */
  double difference(int bin) {
    return (first[bin] + second[bin] - 2 * real[bin]) / segments;
  }

  /** What the first shows and the second does not. */
  double firstAlone(int bin) {
    return (first[bin] - real[bin]) / segments;
  }

  /** What the second shows and the first does not. */
  double secondAlone(int bin) {
    return (second[bin] - real[bin]) / segments;
  }
}
