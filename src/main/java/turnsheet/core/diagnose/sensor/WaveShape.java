package turnsheet.core.diagnose.sensor;

import turnsheet.core.dsp.BetweenSamples;

/**
 * The mean pulse of a waveform, from one rising crossing to the next, and what its flanks are like.
 */
final class WaveShape {

  static final int POINTS = 128;
  private static final int MOST_PERIODS = 2000;
  private static final int MOST_HARMONICS = 10;

  /** Periods that differ by more are none. */
  private static final double UNEVEN = 0.3;

  private final Wave wave;
  private final BetweenSamples between;
  private final double[] points = new double[POINTS];

  WaveShape(Wave wave) {
    this.wave = wave;
    this.between = new BetweenSamples(wave.samples(), wave.samples().length);
    double middle = wave.periodSamples();
    double[] rises = wave.rises();
    int every = Math.max(1, rises.length / MOST_PERIODS);
    int taken = 0;
    for (int r = 0; r + 1 < rises.length; r += every) {
      double period = rises[r + 1] - rises[r];
      if (Math.abs(period / middle - 1) < UNEVEN
          && between.holds(rises[r])
          && between.holds(rises[r + 1])) {
        for (int i = 0; i < POINTS; i++) {
          points[i] += between.at(rises[r] + period * i / POINTS);
        }
        taken++;
      }
    }
    for (int i = 0; i < POINTS; i++) {
      points[i] /= Math.max(1, taken);
    }
  }

  /** The mean pulse at even places of its period. */
  double[] points() {
    return points.clone();
  }

  /** Root mean square about the mean. */
  double rms() {
    double mean = 0;
    double squares = 0;
    for (double p : points) {
      mean += p / POINTS;
      squares += p * p / POINTS;
    }
    return Math.sqrt(Math.max(0, squares - mean * mean));
  }

  /** Peaks of the fundamental and its harmonics, as far as the recording shows them. */
  double[] harmonics() {
    int count = (int) Math.max(1, Math.min(MOST_HARMONICS, 0.45 * wave.periodSamples()));
    double[] peaks = new double[count];
    for (int h = 1; h <= count; h++) {
      double re = 0;
      double im = 0;
      for (int i = 0; i < POINTS; i++) {
        re += points[i] * Math.cos(2 * Math.PI * h * i / POINTS);
        im += points[i] * Math.sin(2 * Math.PI * h * i / POINTS);
      }
      peaks[h - 1] = Math.hypot(re, im) * 2 / POINTS;
    }
    return peaks;
  }

  /** A mean with its standard deviation. */
  record Mean(double value, double standardUncertainty) {}

  /** Slope of the waveform where it crosses the level, per second. */
  Mean slope(double[] edges) {
    double sum = 0;
    double squares = 0;
    int n = 0;
    for (double edge : edges) {
      if (between.holds(edge)) {
        double slope = between.slope(edge) * wave.rateHertz();
        sum += slope;
        squares += slope * slope;
        n++;
      }
    }
    double mean = sum / Math.max(1, n);
    double variance = squares / Math.max(1, n) - mean * mean;
    return new Mean(mean, Math.sqrt(Math.max(0, variance) / Math.max(1, n)));
  }

  /** Samples that the mean flank takes from 10 to 90 % of the pulse; NaN where it never does. */
  double riseSamples() {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    for (double p : points) {
      lowest = Math.min(lowest, p);
      highest = Math.max(highest, p);
    }
    double from = lowest + 0.1 * (highest - lowest);
    double to = lowest + 0.9 * (highest - lowest);
    double grain = wave.periodSamples() / POINTS;
    double after = walk(to, 1, POINTS / 2) * grain;
    double before = walk(from, -1, POINTS / 2) * grain;
    if (Double.isNaN(after) || Double.isNaN(before)) {
      return Double.NaN;
    }
    double fine = Math.max(1 / 16.0, (after + before) / 64);
    return fineWalk(to, fine, 2 * after + 4) + fineWalk(from, -fine, 2 * before + 4);
  }

  private double walk(double level, int step, int most) {
    for (int i = 1; i <= most; i++) {
      double value = points[Math.floorMod(i * step, POINTS)];
      if (step > 0 ? value >= level : value <= level) {
        return i;
      }
    }
    return Double.NaN;
  }

  /** How far from the crossing the mean of many flanks reaches a level. */
  private double fineWalk(double level, double step, double most) {
    double last = wave.level();
    for (double way = step; Math.abs(way) <= most; way += step) {
      double value = meanAt(way);
      if (step > 0 ? value >= level : value <= level) {
        return Math.abs(way) - Math.abs(step) * (value - level) / (value - last);
      }
      last = value;
    }
    return most;
  }

  private double meanAt(double way) {
    double sum = 0;
    int n = 0;
    double[] rises = wave.rises();
    int every = Math.max(1, rises.length / 300);
    for (int r = 0; r < rises.length; r += every) {
      if (between.holds(rises[r] + way)) {
        sum += between.at(rises[r] + way);
        n++;
      }
    }
    return n == 0 ? wave.level() : sum / n;
  }
}
