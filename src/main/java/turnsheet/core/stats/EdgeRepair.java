package turnsheet.core.stats;

import java.util.Arrays;

/**
 * Makes a pulse train whole again: drops edges that ought not to be there and puts edges, evenly
 * spaced, where some are missing, so that the number of an edge is an angle.
 *
 * <p>An edge is extra where it comes within 0.6 periods of the one before and the next one is still
 * no more than a fifth of a period late, or where the next one follows within 0.6 periods and lies
 * nearer to the expected place, within a fifth of a period of it. Edges are missing where the
 * distance is at least one and a half periods: the nearest whole number less one. The period
 * expected is the median of the last seven that needed no repair, so that ramps are followed. One
 * use; feed edges in order of time, then {@link #finish}.
 */
public final class EdgeRepair {

  private static final int RECENT = 7;
  private static final double NEAR = 0.2;
  private static final double CLOSE = 0.6;
  private static final double GAP = 1.5;

  private final EdgeSink sink;
  private final GapListener gaps;
  private final double[] recent = new double[RECENT];
  private final double[] sorted = new double[RECENT];
  private int next;
  private double expected;
  private double last = Double.NaN;
  private double candidate = Double.NaN;
  private long missing;
  private long extra;

  /** Told of every stretch without edges. */
  @FunctionalInterface
  public interface GapListener {
    void gap(double fromSeconds, double toSeconds, long missing);
  }

  /**
   * @param periodSeconds expected at the beginning
   */
  public EdgeRepair(double periodSeconds, EdgeSink sink, GapListener gaps) {
    if (!(periodSeconds > 0 && Double.isFinite(periodSeconds))) {
      throw new IllegalArgumentException("period " + periodSeconds + " s");
    }
    Arrays.fill(recent, periodSeconds);
    Arrays.fill(sorted, periodSeconds);
    this.expected = periodSeconds;
    this.sink = sink;
    this.gaps = gaps;
  }

  /** Takes the next rising edge. */
  public void edge(double seconds) {
    if (Double.isNaN(last)) {
      last = seconds;
      sink.edge(seconds, true);
      return;
    }
    if (!Double.isNaN(candidate)) {
      if (isExtra(seconds)) {
        extra++;
        candidate = seconds;
        return;
      }
      accept();
    }
    candidate = seconds;
  }

  /** Hands out what was held back. */
  public void finish() {
    if (!Double.isNaN(candidate)) {
      accept();
    }
  }

  public long missing() {
    return missing;
  }

  public long extra() {
    return extra;
  }

  private boolean isExtra(double following) {
    double place = last + expected;
    // far too early, and the next one is not late without it
    if (candidate - last < CLOSE * expected && following <= place + NEAR * expected) {
      return true;
    }
    double off = Math.abs(following - place);
    return off <= NEAR * expected
        && off < Math.abs(candidate - place)
        && following - candidate < CLOSE * expected;
  }

  private void accept() {
    double distance = candidate - last;
    if (distance >= GAP * expected) {
      long lost = Math.max(1, Math.round(distance / expected) - 1);
      missing += lost;
      gaps.gap(last, candidate, lost);
      for (long i = 1; i <= lost; i++) {
        sink.edge(last + distance * i / (lost + 1), false);
      }
    } else {
      replace(recent[next], distance);
      recent[next] = distance;
      next = next + 1 == RECENT ? 0 : next + 1;
      expected = sorted[RECENT / 2];
    }
    sink.edge(candidate, true);
    last = candidate;
    candidate = Double.NaN;
  }

  /** Keeps the recent distances in order: sorting them anew would cost more than all the rest. */
  private void replace(double oldest, double newest) {
    int at = 0;
    while (sorted[at] != oldest) {
      at++;
    }
    for (; at > 0 && sorted[at - 1] > newest; at--) {
      sorted[at] = sorted[at - 1];
    }
    for (; at < RECENT - 1 && sorted[at + 1] < newest; at++) {
      sorted[at] = sorted[at + 1];
    }
    sorted[at] = newest;
  }
}
