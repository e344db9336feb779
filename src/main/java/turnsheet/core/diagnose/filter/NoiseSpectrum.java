package turnsheet.core.diagnose.filter;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Window;

/**
 * What a waveform holds beside its pulses: density over frequency with the harmonics of the pulse
 * rate bridged, and the lines of the mains.
 *
 * <p>Source: the averaged modified periodogram, P. D. Welch, IEEE Trans. Audio Electroacoustics 15
 * (1967) 70-73, half overlapping.
 */
final class NoiseSpectrum {

  private static final double SEGMENT_SECONDS = 1;

  /** Share of a harmonic's frequency to either side that its own fluctuation may fill. */
  private static final double FLUCTUATION_SHARE = 0.01;

  private static final int BESIDE = 20;
  private static final int HIGHEST_HUM = 7;

  /** A line is one where it stands so far above the density beside it. */
  private static final double HUM_OVER_NOISE = 10;

  /** A line of the mains. */
  record Line(double hertz, double peak) {}

  private final double stepHertz;
  private final int segments;
  private final double[] density;
  private final List<Line> hum;

  private NoiseSpectrum(double stepHertz, int segments, double[] density, List<Line> hum) {
    this.stepHertz = stepHertz;
    this.segments = segments;
    this.density = density;
    this.hum = hum;
  }

  /** Found lines at the mains' rate and its harmonics, not those that fall on the pulses'. */
  List<Line> hum() {
    return hum;
  }

  /** Root mean square of white noise as dense as the middle of this. */
  double whiteRms() {
    double[] sorted = density.clone();
    Arrays.sort(sorted);
    // the median of an average of exponentially distributed powers lies below their mean
    double v = 1 / (9.0 * segments);
    double mean = sorted[sorted.length / 2] / ((1 - v) * (1 - v) * (1 - v));
    return Math.sqrt(mean * stepHertz * sorted.length);
  }

  /**
   * Variance that the fourth difference of edges a period apart finds behind a filter, over 70:
   * each frequency weighs with (2 sin(pi f T))^8 / 70, so what is slow hardly counts and what
   * repeats with every pulse not at all.
   */
  double edgeVariance(DiscreteFilter filter, double periodSeconds) {
    double sum = 0;
    for (int k = Window.BLACKMAN_HARRIS.lobeBins(); k < density.length; k++) {
      double hertz = k * stepHertz;
      double s = 2 * Math.sin(Math.PI * hertz * periodSeconds);
      double square = s * s;
      double weight = square * square * square * square / 70;
      double gain = filter.response(hertz).magnitude();
      sum += density[k] * weight * gain * gain;
    }
    return sum * stepHertz;
  }

  /** Averages the spectra of a stream. */
  static final class Builder {

    private final double rateHertz;
    private final Fft fft;
    private final double[] window;
    private final double[] held;
    private final double[] work;
    private final double[] power;
    private int filled;
    private int segments;

    Builder(double rateHertz) {
      this.rateHertz = rateHertz;
      fft = new Fft(Fft.lengthFor((int) Math.ceil(SEGMENT_SECONDS * rateHertz)));
      window = Window.BLACKMAN_HARRIS.values(fft.length());
      held = new double[fft.length()];
      work = new double[fft.length()];
      power = new double[fft.length() / 2];
    }

    void add(double[] samples, int count) {
      int taken = 0;
      while (taken < count) {
        int part = Math.min(count - taken, held.length - filled);
        System.arraycopy(samples, taken, held, filled, part);
        taken += part;
        filled += part;
        if (filled == held.length) {
          segment();
          System.arraycopy(held, held.length / 2, held, 0, held.length / 2);
          filled = held.length / 2;
        }
      }
    }

    private void segment() {
      double mean = Arrays.stream(held).sum() / held.length;
      for (int i = 0; i < work.length; i++) {
        work[i] = (held[i] - mean) * window[i];
      }
      fft.real(work);
      for (int k = 1; k < power.length; k++) {
        power[k] += work[2 * k] * work[2 * k] + work[2 * k + 1] * work[2 * k + 1];
      }
      segments++;
    }

    /** Whether one whole segment has been seen. */
    boolean ready() {
      return segments > 0;
    }

    NoiseSpectrum build(double toothHertz) {
      double step = rateHertz / held.length;
      double squares = 0;
      for (double w : window) {
        squares += w * w;
      }
      double[] density = new double[power.length];
      for (int k = 0; k < power.length; k++) {
        density[k] = 2 * power[k] / segments / squares / rateHertz;
      }
      List<Line> hum = hum(density, step, toothHertz);
      bridge(density, step, toothHertz);
      return new NoiseSpectrum(step, segments, density, hum);
    }

    private static List<Line> hum(double[] density, double step, double toothHertz) {
      List<Line> found = new ArrayList<>();
      int lobe = Window.BLACKMAN_HARRIS.lobeBins();
      for (int base : new int[] {50, 60}) {
        for (int h = 1; h <= HIGHEST_HUM; h++) {
          double hertz = h * base;
          int at = (int) Math.round(hertz / step);
          double fromPulses =
              Math.abs(hertz - toothHertz * Math.max(1, Math.rint(hertz / toothHertz)));
          if (at <= 3 * lobe
              || at + 3 * lobe >= density.length
              || fromPulses < 2 * lobe * step + FLUCTUATION_SHARE * hertz
              || found.stream().anyMatch(line -> line.hertz == hertz)) {
            continue;
          }
          double power = 0;
          double highest = 0;
          for (int k = at - lobe; k <= at + lobe; k++) {
            power += density[k] * step;
            highest = Math.abs(k - at) > 1 ? highest : Math.max(highest, density[k]);
          }
          double beside = median(density, at - 3 * lobe, at - lobe, at + lobe, at + 3 * lobe);
          if (highest > HUM_OVER_NOISE * beside) {
            double own = power - beside * step * (2 * lobe + 1);
            found.add(new Line(hertz, Math.sqrt(2 * own)));
          }
        }
      }
      return List.copyOf(found);
    }

    /** Puts the density found beside each harmonic of the pulses in its place. */
    private static void bridge(double[] density, double step, double toothHertz) {
      double widest = toothHertz / step / 4;
      int lobe = Window.BLACKMAN_HARRIS.lobeBins();
      for (int h = 1; h * toothHertz / step < density.length; h++) {
        double at = h * toothHertz / step;
        double half = Math.min(widest, lobe + 2 + FLUCTUATION_SHARE * at);
        int from = (int) Math.max(1, Math.floor(at - half));
        int to = (int) Math.min(density.length - 1, Math.ceil(at + half));
        double beside = median(density, from - BESIDE, from, to, to + BESIDE);
        Arrays.fill(density, from, to + 1, beside);
      }
    }

    /** Of what lies from a to b and beyond c to d, without b and c themselves. */
    private static double median(double[] values, int a, int b, int c, int d) {
      double[] seen = new double[b - a + d - c];
      int n = 0;
      for (int k = Math.max(1, a); k < b; k++) {
        seen[n++] = values[k];
      }
      for (int k = c + 1; k <= Math.min(values.length - 1, d); k++) {
        seen[n++] = values[k];
      }
      if (n == 0) {
        return 0;
      }
      Arrays.sort(seen, 0, n);
      return seen[n / 2];
    }
  }
}
