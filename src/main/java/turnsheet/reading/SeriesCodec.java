package turnsheet.reading;

import java.nio.ByteBuffer;
import turnsheet.core.measure.Series;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.stats.MagnitudeBlocks;
import turnsheet.reading.chart.Curve;

/**
 * Curves and histograms as bytes for the database.
 *
 * <p>A curve: layout number (int), start and step (double), samples per point (int), points (int),
 * then single precision values, all low ones and, where points are buckets, all high ones. A
 * histogram: layout number (int), start and width (double), classes (int), then counts (long).
 * Blocks: layout number, first class, blocks, classes (int), then each block's mean square (double)
 * and counts (int). A fluctuation: layout number, start, rate and step (double), samples (int),
 * then steps (short). Big endian.
 */
final class SeriesCodec {

  /** A longer curve is kept as lowest and highest per bucket: at most 2 MiB a curve. */
  static final int MOST_POINTS = 262_144;

  private static final int CURVE = 1;
  private static final int HISTOGRAM = 2;
  private static final int BLOCKS = 3;
  private static final int FLUCTUATION = 4;
  private static final int CURVE_HEADER_BYTES = 4 + 8 + 8 + 4 + 4;
  private static final int HISTOGRAM_HEADER_BYTES = 4 + 8 + 8 + 4;

  private SeriesCodec() {}

  static byte[] encode(Curve whole) {
    Curve curve = whole.reducedTo(MOST_POINTS);
    int rows = curve.isExact() ? 1 : 2;
    ByteBuffer out = ByteBuffer.allocate(CURVE_HEADER_BYTES + rows * curve.size() * Float.BYTES);
    out.putInt(CURVE).putDouble(curve.start()).putDouble(curve.step());
    out.putInt(curve.samplesPerPoint()).putInt(curve.size());
    for (int i = 0; i < curve.size(); i++) {
      out.putFloat(curve.low(i));
    }
    for (int i = 0; rows == 2 && i < curve.size(); i++) {
      out.putFloat(curve.high(i));
    }
    return out.array();
  }

  static Curve decodeCurve(byte[] content) {
    ByteBuffer in = ByteBuffer.wrap(content);
    requireLayout(CURVE, in.getInt());
    double start = in.getDouble();
    double step = in.getDouble();
    int samplesPerPoint = in.getInt();
    int size = in.getInt();
    float[] low = floats(in, size);
    return samplesPerPoint == 1
        ? Curve.ofSamples(start, step, low)
        : Curve.ofBuckets(start, step, samplesPerPoint, low, floats(in, size));
  }

  static byte[] encode(Series.Histogram histogram) {
    ByteBuffer out =
        ByteBuffer.allocate(HISTOGRAM_HEADER_BYTES + histogram.size() * Long.BYTES)
            .putInt(HISTOGRAM)
            .putDouble(histogram.fromMicroseconds())
            .putDouble(histogram.widthMicroseconds())
            .putInt(histogram.size());
    for (int i = 0; i < histogram.size(); i++) {
      out.putLong(histogram.count(i));
    }
    return out.array();
  }

  static Series.Histogram decodeHistogram(byte[] content) {
    ByteBuffer in = ByteBuffer.wrap(content);
    requireLayout(HISTOGRAM, in.getInt());
    double from = in.getDouble();
    double width = in.getDouble();
    long[] counts = new long[in.getInt()];
    in.asLongBuffer().get(counts);
    return new Series.Histogram(from, width, counts);
  }

  static byte[] encode(MagnitudeBlocks blocks) {
    int blockBytes = Double.BYTES + blocks.classes() * Integer.BYTES;
    ByteBuffer out =
        ByteBuffer.allocate(4 * Integer.BYTES + blocks.size() * blockBytes)
            .putInt(BLOCKS)
            .putInt(blocks.firstClass())
            .putInt(blocks.size())
            .putInt(blocks.classes());
    for (int b = 0; b < blocks.size(); b++) {
      out.putDouble(blocks.meanSquare(b));
      for (int k = 0; k < blocks.classes(); k++) {
        out.putInt(blocks.count(b, k));
      }
    }
    return out.array();
  }

  static MagnitudeBlocks decodeBlocks(byte[] content) {
    ByteBuffer in = ByteBuffer.wrap(content);
    requireLayout(BLOCKS, in.getInt());
    int firstClass = in.getInt();
    int[][] counts = new int[in.getInt()][in.getInt()];
    double[] meanSquares = new double[counts.length];
    for (int b = 0; b < counts.length; b++) {
      meanSquares[b] = in.getDouble();
      for (int k = 0; k < counts[b].length; k++) {
        counts[b][k] = in.getInt();
      }
    }
    return new MagnitudeBlocks(firstClass, counts, meanSquares);
  }

  static byte[] encode(Fluctuation fluctuation) {
    ByteBuffer out =
        ByteBuffer.allocate(
                2 * Integer.BYTES + 3 * Double.BYTES + fluctuation.length() * Short.BYTES)
            .putInt(FLUCTUATION)
            .putDouble(fluctuation.startSeconds())
            .putDouble(fluctuation.rateHertz())
            .putDouble(fluctuation.stepPercent())
            .putInt(fluctuation.length());
    for (int i = 0; i < fluctuation.length(); i++) {
      out.putShort(fluctuation.steps(i));
    }
    return out.array();
  }

  static Fluctuation decodeFluctuation(byte[] content) {
    ByteBuffer in = ByteBuffer.wrap(content);
    requireLayout(FLUCTUATION, in.getInt());
    double start = in.getDouble();
    double rate = in.getDouble();
    double step = in.getDouble();
    short[] steps = new short[in.getInt()];
    in.asShortBuffer().get(steps);
    return Fluctuation.ofSteps(start, rate, step, steps);
  }

  private static float[] floats(ByteBuffer in, int count) {
    float[] values = new float[count];
    for (int i = 0; i < count; i++) {
      values[i] = in.getFloat();
    }
    return values;
  }

  private static void requireLayout(int expected, int found) {
    if (expected != found) {
      throw new IllegalStateException("series layout " + found + " where " + expected + " stands");
    }
  }
}
