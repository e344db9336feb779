package turnsheet.reading.chart;

import turnsheet.core.measure.Series;
import turnsheet.core.signal.SpeedTrace;

/**
 * An evenly spaced curve in which a point stands either for one sample or for a bucket of samples
 * by its lowest and highest. Immutable.
 *
 * <p>Point k lies at {@code start + k * step}. A bucket lies at its middle; where the last bucket
 * is not full it is drawn where the middle of a full one would be. NaN marks a point without a
 * value.
 */
public final class Curve {

  private final double start;
  private final double step;
  private final int samplesPerPoint;
  private final float[] low;
  private final float[] high;

  /** Takes the arrays over; {@code high} is {@code low} itself where points are samples. */
  private Curve(double start, double step, int samplesPerPoint, float[] low, float[] high) {
    if (!(step > 0 && Double.isFinite(step) && Double.isFinite(start))) {
      throw new IllegalArgumentException("start " + start + ", step " + step);
    }
    if (samplesPerPoint < 1 || low.length != high.length) {
      throw new IllegalArgumentException(
          samplesPerPoint + " samples per point, " + low.length + " and " + high.length);
    }
    this.start = start;
    this.step = step;
    this.samplesPerPoint = samplesPerPoint;
    this.low = low;
    this.high = high;
  }

  /** Samples as they are; copied. */
  public static Curve ofSamples(double start, double step, float[] values) {
    float[] copy = values.clone();
    return new Curve(start, step, 1, copy, copy);
  }

  /** Buckets that were made before; copied. */
  public static Curve ofBuckets(
      double start, double step, int samplesPerPoint, float[] low, float[] high) {
    return new Curve(start, step, samplesPerPoint, low.clone(), high.clone());
  }

  /** Speed in percent over seconds. */
  public static Curve of(SpeedTrace trace) {
    float[] values = new float[trace.length()];
    for (int i = 0; i < values.length; i++) {
      values[i] = (float) trace.percent(i);
    }
    return new Curve(trace.startSeconds(), 1 / trace.rateHertz(), 1, values, values);
  }

  /** Peak in percent over hertz. */
  public static Curve of(Series.Spectrum spectrum) {
    float[] values = new float[spectrum.size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = (float) spectrum.peakPercent(i);
    }
    return new Curve(0, spectrum.stepHz(), 1, values, values);
  }

  public double start() {
    return start;
  }

  public double step() {
    return step;
  }

  public int samplesPerPoint() {
    return samplesPerPoint;
  }

  public boolean isExact() {
    return samplesPerPoint == 1;
  }

  public int size() {
    return low.length;
  }

  public double x(int point) {
    return start + point * step;
  }

  public float low(int point) {
    return low[point];
  }

  public float high(int point) {
    return high[point];
  }

  /** Where the last point lies; the start where there is none. */
  public double end() {
    return size() == 0 ? start : x(size() - 1);
  }

  /**
   * The part between two places, one point further on both sides so that a line reaches the edge of
   * a drawing.
   *
   * <p>Where it has more points than asked for, points are joined in buckets. Bucket edges lie at
   * whole multiples of the bucket from the first point of this curve, so that a moved window shows
   * the same buckets.
   *
   * @param points most points of the result, at least 2
   */
  public Curve window(double from, double to, int points) {
    if (points < 2 || !(from <= to)) {
      throw new IllegalArgumentException(from + " to " + to + " in " + points + " points");
    }
    int first = clamp((int) Math.floor((from - start) / step));
    int last = clamp((int) Math.ceil((to - start) / step));
    if (size() == 0) {
      return this;
    }
    int width = Math.max(1, ceilDiv(last - first + 1, points));
    while (last / width - first / width + 1 > points) {
      width++;
    }
    return joined(first / width, last / width, width);
  }

  /** The whole curve in at most so many points. */
  public Curve reducedTo(int points) {
    return size() <= points ? this : window(start, end(), points);
  }

  private Curve joined(int firstBucket, int lastBucket, int width) {
    int count = lastBucket - firstBucket + 1;
    float[] lows = new float[count];
    float[] highs = width == 1 && isExact() ? lows : new float[count];
    for (int bucket = 0; bucket < count; bucket++) {
      int from = (firstBucket + bucket) * width;
      int to = Math.min(size(), from + width);
      float lowest = Float.NaN;
      float highest = Float.NaN;
      for (int i = from; i < to; i++) {
        lowest = Float.isNaN(lowest) || low[i] < lowest ? low[i] : lowest;
        highest = Float.isNaN(highest) || high[i] > highest ? high[i] : highest;
      }
      lows[bucket] = lowest;
      highs[bucket] = highest;
    }
    double middle = x(firstBucket * width) + (width - 1) * step / 2;
    return new Curve(middle, step * width, samplesPerPoint * width, lows, highs);
  }

  private int clamp(int index) {
    return Math.max(0, Math.min(size() - 1, index));
  }

  private static int ceilDiv(int dividend, int divisor) {
    return (dividend + divisor - 1) / divisor;
  }
}
