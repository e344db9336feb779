package turnsheet.core.measure;

import turnsheet.core.dsp.Rotation;

/**
 * A trace without its mean and its straight line, relative to its own mean speed: what is left is
 * fluctuation. The line is fitted with weights that fade towards both ends (Hann), so that a wow
 * cut off in mid-turn hardly moves it.
 */
final class Residual {

  private static final int BLOCK = 4096;

  private final CleanTrace clean;
  private final double middle;
  private final double meanPercent;
  private final double slopePercentPerSecond;

  private Residual(CleanTrace clean, double meanPercent, double slopePercentPerSecond) {
    this.clean = clean;
    this.middle = (clean.trace().length() - 1) / 2.0;
    this.meanPercent = meanPercent;
    this.slopePercentPerSecond = slopePercentPerSecond;
  }

  /** Fits the line through the usable samples. */
  static Residual of(CleanTrace clean) {
    int n = clean.trace().length();
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double y0 = 0;
    double y1 = 0;
    Rotation rotation = new Rotation(0.5 / n, 1.0 / n);
    for (int i = 0; i < n; i++) {
      rotation.advance();
      if (clean.usable(i)) {
        double w = 0.5 - 0.5 * rotation.cosine();
        double t = (i - (n - 1) / 2.0) / clean.rateHertz();
        double y = clean.trace().percent(i);
        s0 += w;
        s1 += w * t;
        s2 += w * t * t;
        y0 += w * y;
        y1 += w * t * y;
      }
    }
    double slope = (s0 * y1 - s1 * y0) / (s0 * s2 - s1 * s1);
    return new Residual(clean, (y0 - slope * s1) / s0, slope);
  }

  CleanTrace clean() {
    return clean;
  }

  /** Deviation of the fitted line at the middle of the trace. */
  double meanPercent() {
    return meanPercent;
  }

  double slopePercentPerSecond() {
    return slopePercentPerSecond;
  }

  /**
   * Copies fluctuation of one piece, short gaps bridged.
   *
   * @param into receives {@code count} samples, percent of the mean speed
   */
  void copy(int from, double[] into, int count) {
    clean.copy(from, into, count);
    double scale = 1 / (1 + meanPercent / 100);
    double step = slopePercentPerSecond / clean.rateHertz();
    for (int i = 0; i < count; i++) {
      into[i] = (into[i] - meanPercent - step * (from + i - middle)) * scale;
    }
  }

  /** The same from the end backwards: {@code into[0]} is the sample at {@code last}. */
  void copyBackwards(int last, double[] into, int count) {
    copy(last - count + 1, into, count);
    for (int i = 0; i < count / 2; i++) {
      double kept = into[i];
      into[i] = into[count - 1 - i];
      into[count - 1 - i] = kept;
    }
  }

  /** Mean deviation of the trace itself over usable samples, in percent of nominal. */
  double averagePercent(int from, int to) {
    double sum = 0;
    int count = 0;
    for (int i = from; i < to; i++) {
      if (clean.usable(i)) {
        sum += clean.trace().percent(i);
        count++;
      }
    }
    return count == 0 ? Double.NaN : sum / count;
  }

  /**
   * How much more fluctuation the capture shows when all of it counts alike than when its middle
   * counts most (squared Hann weights): the quotient of the two root mean squares, less 1.
   */
  double swell() {
    int n = clean.trace().length();
    Rotation rotation = new Rotation(0.5 / n, 1.0 / n);
    double[] buffer = new double[BLOCK];
    double flat = 0;
    double count = 0;
    double middled = 0;
    double weights = 0;
    for (int from = 0; from < n; from += BLOCK) {
      int part = Math.min(BLOCK, n - from);
      copy(from, buffer, part);
      for (int i = 0; i < part; i++) {
        rotation.advance();
        if (clean.usable(from + i)) {
          double square = buffer[i] * buffer[i];
          double w = 0.5 - 0.5 * rotation.cosine();
          flat += square;
          count++;
          middled += w * w * square;
          weights += w * w;
        }
      }
    }
    return middled > 0 ? Math.sqrt(flat / count / (middled / weights)) - 1 : 0;
  }

  /** Standard deviation of the fluctuation's averages over blocks of a length. */
  double blockScatterPercent(int length) {
    double[] buffer = new double[BLOCK];
    double sum = 0;
    int blocks = 0;
    for (CleanTrace.Piece piece : clean.pieces()) {
      for (int from = piece.from(); from + length <= piece.to(); from += length) {
        double block = 0;
        for (int at = from; at < from + length; at += BLOCK) {
          int part = Math.min(BLOCK, from + length - at);
          copy(at, buffer, part);
          block += sum(buffer, part);
        }
        sum += block / length * (block / length);
        blocks++;
      }
    }
    return blocks < 2 ? Double.NaN : Math.sqrt(sum / (blocks - 1));
  }

  private static double sum(double[] values, int count) {
    double sum = 0;
    for (int i = 0; i < count; i++) {
      sum += values[i];
    }
    return sum;
  }
}
