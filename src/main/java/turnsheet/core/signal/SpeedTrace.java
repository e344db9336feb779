package turnsheet.core.signal;

import java.util.ArrayList;
import java.util.List;

/**
 * Relative deviation from nominal speed, evenly sampled. Immutable.
 *
 * <p>Units: percent, positive where faster than nominal. Sample k belongs to the time {@code
 * startSeconds + k / rateHertz} of the capture. Kept in single precision: a deviation of 10 % is
 * then rounded by at most 4e-7 percentage points.
 */
public final class SpeedTrace {

  private static final int BLOCK = 1 << 16;

  private final double startSeconds;
  private final double rateHertz;
  private final float[][] blocks;
  private final int length;

  private SpeedTrace(double startSeconds, double rateHertz, float[][] blocks, int length) {
    if (!(rateHertz > 0 && Double.isFinite(rateHertz))) {
      throw new IllegalArgumentException("rate " + rateHertz + " Hz");
    }
    this.startSeconds = startSeconds;
    this.rateHertz = rateHertz;
    this.blocks = blocks;
    this.length = length;
  }

  /** A trace of given samples. */
  public static SpeedTrace of(double startSeconds, double rateHertz, float[] percent) {
    Builder builder = new Builder();
    for (float p : percent) {
      builder.add(p);
    }
    return builder.build(startSeconds, rateHertz);
  }

  public double startSeconds() {
    return startSeconds;
  }

  public double rateHertz() {
    return rateHertz;
  }

  public int length() {
    return length;
  }

  public double durationSeconds() {
    return length / rateHertz;
  }

  public double percent(int index) {
    return blocks[index / BLOCK][index % BLOCK];
  }

  /**
   * Copies samples.
   *
   * @param from first index
   * @param into receives {@code count} samples from index 0
   */
  public void copyTo(int from, double[] into, int count) {
    int done = 0;
    while (done < count) {
      int at = (from + done) % BLOCK;
      int part = Math.min(count - done, BLOCK - at);
      widen(blocks[(from + done) / BLOCK], at, into, done, part);
      done += part;
    }
  }

  private static void widen(float[] in, int at, double[] out, int to, int count) {
    for (int i = 0; i < count; i++) {
      out[to + i] = in[at + i];
    }
  }

  /**
   * Collects the samples of a trace, block by block, so that the trace of half a day is never held
   * twice. One use.
   */
  public static final class Builder {
    private final List<float[]> blocks = new ArrayList<>();
    private float[] open = new float[0];
    private int used;

    public void add(double percent) {
      if (used == open.length) {
        open = new float[BLOCK];
        blocks.add(open);
        used = 0;
      }
      open[used++] = (float) percent;
    }

    public int length() {
      return blocks.isEmpty() ? 0 : (blocks.size() - 1) * BLOCK + used;
    }

    /** The trace; the builder holds nothing afterwards. */
    public SpeedTrace build(double startSeconds, double rateHertz) {
      int length = length();
      float[][] handedOver = blocks.toArray(new float[0][]);
      blocks.clear();
      open = new float[0];
      used = 0;
      return new SpeedTrace(startSeconds, rateHertz, handedOver, length);
    }
  }
}
