package turnsheet.core.diagnose.filter;

import java.util.Arrays;
import turnsheet.core.dsp.Fft;

/** One pulse of a waveform, the mean of many, as harmonics of the pulse rate. */
final class MeanWave {

  private static final int POINTS = 4096;

  private final double toothHz;

  /** From 0 on: half the peak with its phase, the mean for 0. */
  private final Complex[] harmonics;

  private MeanWave(double toothHz, Complex[] harmonics) {
    this.toothHz = toothHz;
    this.harmonics = harmonics;
  }

  /** Pulse rate. */
  double toothHz() {
    return toothHz;
  }

  double mean() {
    return harmonics[0].re();
  }

  /** The wave over one period. */
  static final class Shape {

    private final double[] values;

    /** Change per second at each point. */
    private final double[] slopes;

    private Shape(double[] values, double[] slopes) {
      this.values = values;
      this.slopes = slopes;
    }

    /** The value at a place in the period, 0 to 1. */
    double at(double place) {
      double point = place * POINTS;
      int before = (int) point % POINTS;
      double share = point - Math.floor(point);
      return values[before] * (1 - share) + values[(before + 1) % POINTS] * share;
    }

    double low() {
      return Arrays.stream(values).min().orElse(0);
    }

    double high() {
      return Arrays.stream(values).max().orElse(0);
    }

    /**
     * Mean square of the time by which one unit of level moves a rising edge: the mean of one over
     * the squared slope at the crossings that count; NaN where none does.
     */
    double squareSecondsPerUnit(Threshold at) {
      double sum = 0;
      int edges = 0;
      boolean armed = false;
      double slope = Double.NaN;
      double up = at.level() + at.half();
      // the second time round the first crossing has been prepared
      for (int i = 1; i <= 2 * POINTS; i++) {
        double before = values[(i - 1) % POINTS];
        double now = values[i % POINTS];
        if (before < up && now >= up) {
          double share = (up - before) / (now - before);
          slope = slopes[(i - 1) % POINTS] * (1 - share) + slopes[i % POINTS] * share;
        }
        if (armed && now > at.level() + at.band()) {
          armed = false;
          if (i > POINTS && !Double.isNaN(slope)) {
            sum += 1 / (slope * slope);
            edges++;
          }
        } else if (now < at.level() - at.band()) {
          armed = true;
        }
      }
      return edges == 0 ? Double.NaN : sum / edges;
    }
  }

  /** Peak of the fundamental. */
  double peak() {
    return 2 * harmonics[1].magnitude();
  }

  /**
   * The same shape at another speed.
   *
   * @param gain of everything but the mean
   */
  MeanWave at(double hertz, double gain, double highestHertz) {
    int most = (int) Math.min(harmonics.length - 1, Math.floor(highestHertz / hertz));
    Complex[] scaled = Arrays.copyOf(harmonics, Math.max(2, most + 1));
    for (int k = 1; k < scaled.length; k++) {
      scaled[k] = scaled[k].times(gain);
    }
    return new MeanWave(hertz, scaled);
  }

  /** What a filter leaves of it. */
  MeanWave behind(DiscreteFilter filter) {
    Complex[] left = new Complex[harmonics.length];
    for (int k = 0; k < left.length; k++) {
      left[k] = harmonics[k].times(filter.response(k * toothHz));
    }
    return new MeanWave(toothHz, left);
  }

  Shape shape() {
    double[] values = new double[POINTS];
    double[] slopes = new double[POINTS];
    int most = Math.min(harmonics.length - 1, POINTS / 2 - 1);
    values[0] = POINTS * harmonics[0].re();
    for (int k = 1; k <= most; k++) {
      double re = POINTS * harmonics[k].re();
      double im = POINTS * harmonics[k].im();
      double w = 2 * Math.PI * k * toothHz;
      values[2 * k] = re;
      values[2 * k + 1] = im;
      slopes[2 * k] = -w * im;
      slopes[2 * k + 1] = w * re;
    }
    Fft fft = new Fft(POINTS);
    fft.realInverse(values);
    fft.realInverse(slopes);
    return new Shape(values, slopes);
  }

  /**
   * Adds up harmonics over chosen stretches of a waveform, each sample weighed by its place between
   * the two pulses around it.
   */
  static final class Builder {

    /** Products of one sample with one harmonic, most: a fraction of a second of work. */
    private static final double MOST_PRODUCTS = 6e7;

    private static final int MOST_HARMONICS = 200;
    private static final double STRETCH_SECONDS = 0.25;

    private final Pulses pulses;
    private final double rateHertz;
    private final double[] re;
    private final double[] im;

    /** One stretch in so many is used. */
    private final int every;

    private long used;
    private int pulse;
    private long sample;

    Builder(Pulses pulses, double rateHertz) {
      this.pulses = pulses;
      this.rateHertz = rateHertz;
      double hertz = 1 / pulses.meanPeriodSeconds();
      int most = (int) Math.max(1, Math.min(MOST_HARMONICS, Math.floor(0.45 * rateHertz / hertz)));
      this.re = new double[most + 1];
      this.im = new double[most + 1];
      double products = (pulses.last() - pulses.first()) * rateHertz * (most + 1);
      this.every = (int) Math.max(1, Math.ceil(products / MOST_PRODUCTS));
    }

    void add(double[] samples, int count) {
      double[] times = pulses.times();
      for (int i = 0; i < count; i++, sample++) {
        double t = sample / rateHertz;
        if ((long) (t / STRETCH_SECONDS) % every != 0) {
          continue;
        }
        while (pulse + 1 < times.length && times[pulse + 1] <= t) {
          pulse++;
        }
        if (pulse + 1 < times.length
            && times[pulse] <= t
            && pulses.real()[pulse]
            && pulses.real()[pulse + 1]) {
          add(samples[i], (t - times[pulse]) / (times[pulse + 1] - times[pulse]));
        }
      }
    }

    private void add(double value, double phase) {
      double c = Math.cos(2 * Math.PI * phase);
      double s = -Math.sin(2 * Math.PI * phase);
      double x = value;
      double y = 0;
      for (int k = 0; k < re.length; k++) {
        re[k] += x;
        im[k] += y;
        double next = x * c - y * s;
        y = x * s + y * c;
        x = next;
      }
      used++;
    }

    MeanWave build() {
      Complex[] harmonics = new Complex[re.length];
      for (int k = 0; k < re.length; k++) {
        harmonics[k] = new Complex(re[k] / used, im[k] / used);
      }
      return new MeanWave(1 / pulses.meanPeriodSeconds(), harmonics);
    }
  }
}
