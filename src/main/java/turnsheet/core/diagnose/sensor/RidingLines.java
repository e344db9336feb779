package turnsheet.core.diagnose.sensor;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.LowBand;
import turnsheet.core.dsp.Window;

/** Finds what rides on a waveform away from the harmonics of its pulses and their side bands. */
final class RidingLines {

  private static final double TOP_HERTZ = 1050;
  private static final double LOWEST_HERTZ = 3;
  private static final double SIDE_BANDS_HERTZ = 215;
  private static final double STANDS_OUT = 16;
  private static final double WEAKEST_DB = -80;
  private static final int NEIGHBOUR_BINS = 60;
  private static final int MOST = 16;

  /** EN 50160 keeps the mains within 1 %; within this share they usually are. */
  private static final double MAINS_SHARE = 0.004;

  private final double pulses;
  private final double slope;
  private final double fundamental;
  private final @Nullable Double turnHertz;

  /**
   * @param slope of the waveform at its crossings, per second
   * @param fundamental peak of the pulses' first harmonic
   * @param turnHertz turning rate of the wheel; null where unknown
   */
  RidingLines(double pulses, double slope, double fundamental, @Nullable Double turnHertz) {
    this.pulses = pulses;
    this.slope = slope;
    this.fundamental = fundamental;
    this.turnHertz = turnHertz;
  }

  /** The lines that put the most into the edges, by rate. */
  List<RidingLine> of(Wave wave) {
    LowBand band = new LowBand(wave.rateHertz(), TOP_HERTZ);
    int count = band.process(wave.samples(), wave.samples().length);
    double[] power = power(band.values(), count);
    double step = band.rateHertz() / (2 * power.length);
    int pad = Math.max(1, 2 * power.length / count);
    int lobe = Window.BLACKMAN_HARRIS.lobeBins() * (pad + 1);
    List<RidingLine> found = new ArrayList<>();
    for (int k = Math.max(lobe, (int) Math.ceil(LOWEST_HERTZ / step));
        k < power.length - lobe && k * step < 0.97 * band.topHertz();
        k++) {
      if (isCrest(power, k, lobe) && !own(k * step)) {
        double noise = noise(power, k, lobe, NEIGHBOUR_BINS * pad);
        double db = 10 * Math.log10(power[k] / (fundamental * fundamental));
        if (power[k] > STANDS_OUT * noise && db > WEAKEST_DB) {
          found.add(refined(power, k, step));
        }
      }
    }
    return found.stream()
        .sorted(Comparator.comparingDouble(RidingLine::falsePeakPercent).reversed())
        .limit(MOST)
        .sorted(Comparator.comparingDouble(RidingLine::rateHz))
        .toList();
  }

  private static double[] power(double[] values, int count) {
    Fft fft = new Fft(Fft.lengthFor(2 * count));
    double[] work = new double[fft.length()];
    double[] window = Window.BLACKMAN_HARRIS.values(count);
    double scale = 2 / (count * Window.BLACKMAN_HARRIS.coherentGain());
    double mean = 0;
    for (int i = 0; i < count; i++) {
      mean += values[i] / count;
    }
    for (int i = 0; i < count; i++) {
      work[i] = (values[i] - mean) * window[i] * scale;
    }
    fft.real(work);
    double[] power = new double[fft.length() / 2];
    for (int k = 1; k < power.length; k++) {
      power[k] = work[2 * k] * work[2 * k] + work[2 * k + 1] * work[2 * k + 1];
    }
    return power;
  }

  private static boolean isCrest(double[] power, int k, int lobe) {
    for (int i = k - lobe; i <= k + lobe; i++) {
      if (power[i] > power[k]) {
        return false;
      }
    }
    return true;
  }

  /** About the pulses' harmonics lines are the shaft's own. */
  private boolean own(double hertz) {
    double harmonic = Math.rint(hertz / pulses) * pulses;
    return harmonic > 0 && Math.abs(hertz - harmonic) < Math.min(SIDE_BANDS_HERTZ, 0.45 * pulses);
  }

  private static double noise(double[] power, int k, int lobe, int reach) {
    int from = Math.max(1, k - Math.max(reach, 3 * lobe));
    int to = Math.min(power.length - 1, k + Math.max(reach, 3 * lobe));
    double[] beside = new double[to - from + 1];
    int n = 0;
    for (int i = from; i <= to; i++) {
      if (Math.abs(i - k) > lobe) {
        beside[n++] = power[i];
      }
    }
    Arrays.sort(beside, 0, n);
    return n == 0 ? Double.POSITIVE_INFINITY : beside[n / 2] / Math.log(2);
  }

  private RidingLine refined(double[] power, int k, double step) {
    double a = Math.log(power[k - 1] + Double.MIN_NORMAL);
    double b = Math.log(power[k]);
    double c = Math.log(power[k + 1] + Double.MIN_NORMAL);
    double bend = a - 2 * b + c;
    double shift = bend < 0 ? 0.5 * (a - c) / bend : 0;
    double peak = Math.exp((b - 0.25 * (a - c) * shift) / 2);
    double hertz = (k + shift) * step;
    double folded = Math.abs(hertz - Math.rint(hertz / pulses) * pulses);
    return new RidingLine(
        cause(hertz, step),
        hertz,
        peak,
        20 * Math.log10(peak / fundamental),
        folded,
        100 * 2 * Math.PI * folded * peak / slope);
  }

  private RidingLine.Cause cause(double hertz, double step) {
    boolean mains = false;
    for (double nominal : new double[] {50, 60}) {
      double order = Math.rint(hertz / nominal);
      mains |= order >= 1 && Math.abs(hertz / (order * nominal) - 1) < MAINS_SHARE;
    }
    Double turn = turnHertz;
    boolean wheel =
        turn != null && Math.abs(hertz - Math.rint(hertz / turn) * turn) < Math.max(0.1, 2 * step);
    return mains == wheel
        ? RidingLine.Cause.UNTOLD
        : mains ? RidingLine.Cause.MAINS : RidingLine.Cause.WHEEL;
  }
}
