package turnsheet.core.stats;

import java.util.ArrayList;
import java.util.List;

/**
 * Overlapping Allan deviation at averaging times of 1, 2, 4, ... steps, from one pass over the
 * times of an even train.
 *
 * <p>Up to 16 steps every start counts, as in NIST SP 1065 section 5.2.4; from there on every start
 * that is a multiple of a sixteenth of the averaging time, which leaves the expectation as it is
 * and costs a little certainty, so that memory stays constant.
 */
public final class StabilityLadder implements EdgeSink {

  private static final int STARTS = 16;
  private static final int LEVELS = 40;
  private static final int FEWEST_TERMS = 8;

  /** Levels up to {@link #STARTS} steps, which take every edge. */
  private static final int NEAR = 5;

  /** Times that they look back on, and room to the next power of two. */
  private static final int KEPT = 64;

  private final double[] kept = new double[KEPT];
  private final double[] nearSums = new double[NEAR];
  private final Level[] levels = new Level[LEVELS];
  private long index;
  private double first;
  private double last;

  public StabilityLadder() {
    for (int i = 0; i < LEVELS; i++) {
      levels[i] = new Level(1L << i);
    }
  }

  @Override
  public void edge(double seconds, boolean real) {
    if (index == 0) {
      first = seconds;
    }
    last = seconds;
    double time = seconds - first;
    near(time);
    for (int i = NEAR; i < LEVELS; i++) {
      Level level = levels[i];
      // strides are powers of two: a level that does not take this edge ends the loop
      if ((index & (level.stride - 1)) != 0) {
        break;
      }
      level.add(time);
    }
    index++;
  }

  /** The levels that take every edge share the times kept. */
  private void near(double time) {
    int now = (int) (index & (KEPT - 1));
    kept[now] = time;
    for (int i = 0, steps = 1; i < NEAR && index >= 2L * steps; i++, steps *= 2) {
      double middle = kept[(now - steps) & (KEPT - 1)];
      double d = time - 2 * middle + kept[(now - 2 * steps) & (KEPT - 1)];
      nearSums[i] += d * d;
    }
  }

  private double sum(int level) {
    return level < NEAR ? nearSums[level] : levels[level].sum;
  }

  private long terms(int level) {
    return level < NEAR ? Math.max(0, index - (2L << level)) : levels[level].terms;
  }

  /** The rungs for which at least eight terms came. */
  public List<Rung> rungs() {
    List<Rung> rungs = new ArrayList<>();
    if (index < 2) {
      return rungs;
    }
    double step = (last - first) / (index - 1);
    for (int i = 0; i < LEVELS; i++) {
      long steps = 1L << i;
      if (terms(i) >= FEWEST_TERMS && index > 3 * steps) {
        double tau = steps * step;
        double independent = Math.max(1, (double) (index - 1) / steps - 1);
        rungs.add(new Rung(tau, Math.sqrt(sum(i) / (2.0 * terms(i))) / tau, independent));
      }
    }
    return rungs;
  }

  /**
   * One averaging time.
   *
   * @param deviation relative
   * @param independentTerms how many second differences share no data, at least 1
   */
  public record Rung(double tauSeconds, double deviation, double independentTerms) {}

  /** Second differences over one number of steps. */
  private static final class Level {
    private final long stride;
    private final double[] ring;
    private final int lag;
    private int next;
    private boolean full;
    private double sum;
    private long terms;

    Level(long steps) {
      this.stride = Math.max(1, steps / STARTS);
      this.lag = (int) (steps / stride);
      this.ring = new double[2 * lag + 1];
    }

    void add(double time) {
      ring[next] = time;
      next++;
      if (next == ring.length) {
        next = 0;
        full = true;
      }
      if (full) {
        double oldest = ring[next];
        int half = next + lag;
        double middle = ring[half < ring.length ? half : half - ring.length];
        double d = time - 2 * middle + oldest;
        sum += d * d;
        terms++;
      }
    }
  }
}
