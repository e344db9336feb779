package turnsheet.core.measure;

/** Counts samples that stuck at the largest value seen: runs of equal ones. */
final class ClipCounter {

  private static final double NEAR_FULL_SCALE = 0.99;
  private static final double LOWEST_LEVEL = 0.01;
  private static final int SHORTEST_RUN = 3;

  /** A sine stays within half a step of 16 bits for a hundredth of its period at most. */
  private static final double FLAT_SHARE = 0.05;

  private final boolean anyLevel;
  private final int shortestRun;
  private double largest;
  private double last;
  private int run;
  private long clipped;

  private ClipCounter(boolean anyLevel, int shortestRun) {
    this.anyLevel = anyLevel;
    this.shortestRun = shortestRun;
    this.largest = anyLevel ? LOWEST_LEVEL : NEAR_FULL_SCALE;
  }

  /**
   * For waves of any shape, which may be flat by nature: only full scale counts. Where a sample
   * exceeds 1, full scale is unknown and nothing counts as clipped.
   */
  static ClipCounter atFullScale() {
    return new ClipCounter(false, SHORTEST_RUN);
  }

  /**
   * For a sine, which has no flat tops of its own: whatever the level at which they lie.
   *
   * @param periodSamples length of one turn of the sine
   */
  static ClipCounter ofSine(double periodSamples) {
    return new ClipCounter(
        true, Math.max(SHORTEST_RUN, (int) Math.ceil(FLAT_SHARE * periodSamples)));
  }

  void add(double[] samples, int count) {
    double near = largest - 1e-4;
    for (int i = 0; i < count; i++) {
      double x = samples[i];
      double magnitude = Math.abs(x);
      if (magnitude < near) {
        run = 0;
      } else {
        if (magnitude > largest + 1e-4) {
          clipped = 0; // what was flat lower down was not clipped
        }
        largest = Math.max(largest, magnitude);
        near = largest - 1e-4;
        run = x == last && run > 0 ? run + 1 : 1;
        if (run == shortestRun) {
          clipped += shortestRun;
        } else if (run > shortestRun) {
          clipped++;
        }
        last = x; // means nothing after a smaller sample, as the run is over then
      }
    }
  }

  long clipped() {
    return !anyLevel && largest > 1 ? 0 : clipped;
  }
}
