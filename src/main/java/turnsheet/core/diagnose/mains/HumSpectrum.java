package turnsheet.core.diagnose.mains;

import java.util.Arrays;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Window;

/**
 * Spectrum of one stretch of the lower end of a recording: Hann window, padded with zeros so that
 * lines are seen between bins.
 *
 * <p>Units: power is the squared peak of a sine at that frequency, in the recording's unit.
 */
final class HumSpectrum {

  /** Bins for each bin without padding, at least. */
  private static final int PADDING = 4;

  /** Median of exponentially distributed powers over their mean. */
  private static final double MEDIAN_OVER_MEAN = Math.log(2);

  private final double stepHertz;
  private final double seconds;
  private final double[] power;

  HumSpectrum(double[] values, int from, int count, double rateHertz) {
    Fft fft = new Fft(Fft.lengthFor(PADDING * count));
    double[] work = new double[fft.length()];
    double mean = 0;
    for (int i = 0; i < count; i++) {
      mean += values[from + i] / count;
    }
    double[] window = Window.HANN.values(count);
    double scale = 2 / (count * Window.HANN.coherentGain());
    for (int i = 0; i < count; i++) {
      work[i] = (values[from + i] - mean) * window[i] * scale;
    }
    fft.real(work);
    power = new double[fft.length() / 2];
    for (int k = 1; k < power.length; k++) {
      power[k] = work[2 * k] * work[2 * k] + work[2 * k + 1] * work[2 * k + 1];
    }
    stepHertz = rateHertz / fft.length();
    seconds = count / rateHertz;
  }

  /** Length of the stretch. */
  double seconds() {
    return seconds;
  }

  /** The power at the bin nearest to a frequency; 0 beyond the spectrum. */
  double power(double hertz) {
    int k = (int) Math.round(hertz / stepHertz);
    return k < 1 || k >= power.length ? 0 : power[k];
  }

  /**
   * The crest about the highest place within a reach of a frequency, refined by a parabola through
   * logarithms.
   */
  Peak peak(double hertz, double reachHertz) {
    int from = Math.max(2, (int) Math.ceil((hertz - reachHertz) / stepHertz));
    int to = Math.min(power.length - 2, (int) Math.floor((hertz + reachHertz) / stepHertz));
    int best = Math.max(2, Math.min(power.length - 2, (int) Math.round(hertz / stepHertz)));
    for (int k = from; k <= to; k++) {
      best = power[k] > power[best] ? k : best;
    }
    while (best > 2 && power[best - 1] > power[best]) {
      best--;
    }
    while (best < power.length - 2 && power[best + 1] > power[best]) {
      best++;
    }
    double a = Math.log(power[best - 1] + Double.MIN_NORMAL);
    double b = Math.log(power[best] + Double.MIN_NORMAL);
    double c = Math.log(power[best + 1] + Double.MIN_NORMAL);
    double bend = a - 2 * b + c;
    double shift = bend < 0 ? Math.max(-0.5, Math.min(0.5, 0.5 * (a - c) / bend)) : 0;
    return new Peak((best + shift) * stepHertz, Math.exp(b - 0.25 * (a - c) * shift));
  }

  /**
   * Mean power of the noise about a frequency, from the median of what lies beside it.
   *
   * @param innerHertz nothing nearer counts
   * @param outerHertz nothing further counts
   */
  double noise(double hertz, double innerHertz, double outerHertz) {
    double[] beside = new double[2 * (int) Math.ceil((outerHertz - innerHertz) / stepHertz) + 4];
    int n = 0;
    for (int side = -1; side <= 1; side += 2) {
      int near = (int) Math.round((hertz + side * innerHertz) / stepHertz);
      int far = (int) Math.round((hertz + side * outerHertz) / stepHertz);
      for (int k = Math.min(near, far); k <= Math.max(near, far) && n < beside.length; k++) {
        if (k > 0 && k < power.length) {
          beside[n++] = power[k];
        }
      }
    }
    if (n == 0) {
      return Double.POSITIVE_INFINITY;
    }
    Arrays.sort(beside, 0, n);
    return beside[n / 2] / MEDIAN_OVER_MEAN;
  }

  /**
   * A place in the spectrum.
   *
   * @param power the squared peak of the sine there
   */
  record Peak(double hertz, double power) {}
}
