package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Window;
import turnsheet.core.signal.RejectedException;

/**
 * Looks for the tone at the beginning of a recording: short windowed spectra, each judged by
 * itself, then the median of those that show a tone. A run-up, speech or a single beep therefore
 * does not decide.
 *
 * <p>A segment shows a tone where the power within {@value #TONE_SHARE} of the peak's frequency has
 * at least {@value #TONE_OVER_NOISE} times the density found in the rest of the range. The margins
 * are our own: white noise reaches about 3, one voice of a chord less than 10 with its neighbours
 * in the range.
 */
final class ToneProbe {

  private static final double SEGMENT_SECONDS = 0.5;
  private static final double TONE_SHARE = 0.015;
  private static final double TONE_OVER_NOISE = 20;
  private static final double AGREEMENT_SHARE = 0.04;
  private static final double LEAST_TONE_SEGMENTS = 0.5;
  private static final double QUIET = 1e-4;
  private static final double LOWEST_HERTZ = 100;

  private final MeasureSettings settings;
  private final double rate;
  private final Fft fft;
  private final double[] window;
  private final double[] work;
  private final double[] power;
  private final double[] average;
  private final List<Segment> wanted = new ArrayList<>();
  private final List<Segment> other = new ArrayList<>();
  private double largest;
  private double smallest = Double.POSITIVE_INFINITY;
  private double highest = Double.NEGATIVE_INFINITY;
  private int filled;

  /**
   * @param tonePower half the squared peak
   */
  private record Segment(double hertz, double tonePower, double allPower, boolean tone) {}

  /**
   * What was found.
   *
   * @param amplitude peak, in the recording's unit
   */
  record Found(double hertz, double amplitude, List<Reading.MainsLine> mains) {}

  ToneProbe(double rate, MeasureSettings settings) {
    this.rate = rate;
    this.settings = settings;
    fft = new Fft(Fft.lengthFor((int) Math.ceil(SEGMENT_SECONDS * rate)));
    window = Window.BLACKMAN_HARRIS.values(fft.length());
    work = new double[fft.length()];
    power = new double[fft.length() / 2];
    average = new double[fft.length() / 2];
  }

  /** Takes samples. */
  void add(double[] samples, int count) {
    seeRange(samples, count);
    int taken = 0;
    while (taken < count) {
      int part = Math.min(count - taken, work.length - filled);
      System.arraycopy(samples, taken, work, filled, part);
      taken += part;
      filled += part;
      if (filled == work.length) {
        judge();
        filled = 0;
      }
    }
  }

  private void seeRange(double[] samples, int count) {
    double low = smallest;
    double high = highest;
    for (int i = 0; i < count; i++) {
      low = Math.min(low, samples[i]);
      high = Math.max(high, samples[i]);
    }
    smallest = low;
    highest = high;
  }

  private void judge() {
    double scale = 2 / (work.length * Window.BLACKMAN_HARRIS.coherentGain());
    shape(sum() / work.length, scale);
    fft.real(work);
    double all = powers() / (2 * Window.BLACKMAN_HARRIS.noiseBandwidthBins());
    largest = Math.max(largest, all);
    double reach = settings.searchPercent() / 100;
    double nominal = settings.nominalHz();
    wanted.add(strongest(nominal * (1 - reach), nominal * (1 + reach), reach, all));
    other.add(strongest(LOWEST_HERTZ, 0.48 * rate, reach, all));
  }

  private double sum() {
    double sum = 0;
    for (double x : work) {
      sum += x;
    }
    return sum;
  }

  private void shape(double mean, double scale) {
    for (int i = 0; i < work.length; i++) {
      work[i] = (work[i] - mean) * window[i] * scale;
    }
  }

  private double powers() {
    double all = 0;
    for (int k = 1; k < power.length; k++) {
      double p = work[2 * k] * work[2 * k] + work[2 * k + 1] * work[2 * k + 1];
      power[k] = p;
      average[k] += p;
      all += p;
    }
    return all;
  }

  private Segment strongest(double fromHertz, double toHertz, double reach, double all) {
    double step = rate / work.length;
    int from = Math.max(2, (int) Math.ceil(fromHertz / step));
    int to = Math.min(power.length - 2, (int) Math.floor(toHertz / step));
    int best = highest(from, to);
    if (to < from || power[best] == 0) {
      return new Segment(0, 0, all, false);
    }
    double a = Math.log(Math.max(power[best - 1], Double.MIN_NORMAL));
    double b = Math.log(power[best]);
    double c = Math.log(Math.max(power[best + 1], Double.MIN_NORMAL));
    double shift = a - 2 * b + c < 0 ? 0.5 * (a - c) / (a - 2 * b + c) : 0;
    int half = (int) Math.ceil(TONE_SHARE * best) + Window.BLACKMAN_HARRIS.lobeBins();
    int wide = Math.max((int) Math.ceil(reach * best), 3 * half);
    double near = sum(best - half, best + half);
    double around = sum(best - wide, best + wide) - near;
    double density = around / (2 * (wide - half));
    boolean tone = near / (2 * half + 1) > TONE_OVER_NOISE * density;
    double bins = 2 * Window.BLACKMAN_HARRIS.noiseBandwidthBins();
    return new Segment((best + shift) * step, near / bins, all, tone);
  }

  private int highest(int from, int to) {
    int best = from;
    for (int k = from; k <= to; k++) {
      best = power[k] > power[best] ? k : best;
    }
    return best;
  }

  private double sum(int from, int to) {
    double sum = 0;
    for (int k = Math.max(1, from); k <= Math.min(power.length - 1, to); k++) {
      sum += power[k];
    }
    return sum;
  }

  /**
   * The verdict on everything added.
   *
   * @throws RejectedException if there is no tone to measure
   */
  Found found() throws RejectedException {
    double nominal = settings.nominalHz();
    double reach = settings.searchPercent();
    if (wanted.isEmpty() || !(highest > smallest) || Math.sqrt(largest) < QUIET * 1e-3) {
      throw new RejectedException(
          "silent",
          "The channel is silent: every sample reads the same or next to it. Choose another channel"
              + " or check the cable, and record again.");
    }
    double[] hertz = agreeing(wanted);
    if (hertz.length > 0) {
      double middle = median(hertz);
      double[] powers =
          wanted.stream()
              .filter(s -> s.tone && agrees(s.hertz, middle))
              .mapToDouble(Segment::tonePower)
              .toArray();
      double amplitude = Math.sqrt(2 * median(powers));
      return new Found(middle, amplitude, mains(amplitude));
    }
    double[] elsewhere = agreeing(other);
    if (elsewhere.length > 0) {
      double middle = median(elsewhere);
      throw new RejectedException(
          "otherTone",
          String.format(
              Locale.ROOT,
              "No tone lies within %.3g %% of %.6g Hz, but a steady one at %.5g Hz (%+.1f %%): choose"
                  + " that as the nominal tone if the tape or record carries it, or check the speed"
                  + " setting.",
              reach,
              nominal,
              middle,
              100 * (middle / nominal - 1)));
    }
    if (Math.sqrt(2 * largest) < QUIET) {
      throw new RejectedException(
          "silent",
          String.format(
              Locale.ROOT,
              "The channel holds nothing but noise at %.0f dB below full scale: choose another"
                  + " channel or check the cable, and record again.",
              -20 * Math.log10(Math.sqrt(2 * largest))));
    }
    long showing = wanted.stream().filter(Segment::tone).count();
    throw new RejectedException(
        "noTone",
        String.format(
            Locale.ROOT,
            "No steady tone stands out within %.3g %% of %.6g Hz (a tone showed in %d of %d stretches"
                + " of %.1f s): record the test tone alone, or give its nominal frequency.",
            reach,
            nominal,
            showing,
            wanted.size(),
            work.length / rate));
  }

  /** Frequencies of segments that show one and the same tone; empty where too few do. */
  private double[] agreeing(List<Segment> segments) {
    // a pause before or after the tone does not speak against it
    List<Segment> loud = segments.stream().filter(s -> s.allPower > 1e-4 * largest).toList();
    double[] tones = loud.stream().filter(Segment::tone).mapToDouble(Segment::hertz).toArray();
    if (tones.length == 0) {
      return tones;
    }
    double middle = median(tones);
    double[] same = Arrays.stream(tones).filter(f -> agrees(f, middle)).toArray();
    return same.length >= LEAST_TONE_SEGMENTS * loud.size() ? same : new double[0];
  }

  private static boolean agrees(double hertz, double middle) {
    return Math.abs(hertz - middle) <= AGREEMENT_SHARE * middle;
  }

  private static double median(double[] values) {
    double[] sorted = values.clone();
    Arrays.sort(sorted);
    int n = sorted.length;
    return (sorted[(n - 1) / 2] + sorted[n / 2]) / 2;
  }

  /** Mains lines that stand out of their neighbourhood, relative to the tone. */
  private List<Reading.MainsLine> mains(double amplitude) {
    List<Reading.MainsLine> mains = new ArrayList<>();
    double step = rate / work.length;
    int lobe = Window.BLACKMAN_HARRIS.lobeBins();
    for (double hertz : new double[] {50, 60, 100, 120, 150, 180}) {
      int at = (int) Math.round(hertz / step);
      if (at + 4 * lobe >= average.length || at - 1 <= lobe) {
        continue;
      }
      double peak = 0;
      for (int k = at - 1; k <= at + 1; k++) {
        peak = Math.max(peak, average[k]);
      }
      double[] beside = new double[4 * lobe];
      for (int i = 0; i < 2 * lobe; i++) {
        beside[i] = average[Math.max(1, at - lobe - 1 - i)];
        beside[2 * lobe + i] = average[at + lobe + 1 + i];
      }
      double relativeDb =
          10 * Math.log10(peak / wanted.size() / (amplitude * amplitude) + Double.MIN_NORMAL);
      if (peak > 10 * median(beside) && relativeDb > -60) {
        mains.add(new Reading.MainsLine(hertz, relativeDb));
      }
    }
    return List.copyOf(mains);
  }
}
