package turnsheet.core.dsp;

/**
 * Filters a stream with given taps and keeps every n-th value. Bits do not depend on how the stream
 * is cut.
 *
 * <p>Shape: output m is the sum of {@code taps[i] * in[m * factor + i]}: it belongs to the middle
 * of its taps, and nothing is invented before the first or behind the last sample.
 */
public final class FirDecimator {

  private static final int ROOM = 4096;

  private final double[] taps;
  private final int factor;
  private final double[] buffer;
  private int filled;

  /** Where in the buffer the next output begins; may lie beyond what is filled. */
  private int next;

  public FirDecimator(double[] taps, int factor) {
    if (taps.length == 0 || factor < 1) {
      throw new IllegalArgumentException(taps.length + " taps, factor " + factor);
    }
    this.taps = taps.clone();
    this.factor = factor;
    this.buffer = new double[taps.length + Math.max(ROOM, factor)];
  }

  /** Samples between the first input and the middle of the first output. */
  public double delaySamples() {
    return (taps.length - 1) / 2.0;
  }

  /** How many values {@link #process} may write for a number read. */
  public int roomFor(int count) {
    return count / factor + 1;
  }

  /**
   * Filters samples.
   *
   * @param in read from index 0, left alone
   * @param out written from index 0
   * @return how many were written
   */
  public int process(double[] in, int count, double[] out) {
    int written = 0;
    int read = 0;
    while (read < count) {
      int part = Math.min(count - read, buffer.length - filled);
      System.arraycopy(in, read, buffer, filled, part);
      filled += part;
      read += part;
      while (next + taps.length <= filled) {
        out[written++] = sum(next);
        next += factor;
      }
      int drop = Math.min(next, filled);
      System.arraycopy(buffer, drop, buffer, 0, filled - drop);
      filled -= drop;
      next -= drop;
    }
    return written;
  }

  /** Four sums side by side keep the processor's adders busy. */
  private double sum(int at) {
    double a = 0;
    double b = 0;
    double c = 0;
    double d = 0;
    int i = 0;
    for (; i + 3 < taps.length; i += 4) {
      a += taps[i] * buffer[at + i];
      b += taps[i + 1] * buffer[at + i + 1];
      c += taps[i + 2] * buffer[at + i + 2];
      d += taps[i + 3] * buffer[at + i + 3];
    }
    for (; i < taps.length; i++) {
      a += taps[i] * buffer[at + i];
    }
    return (a + b) + (c + d);
  }
}
