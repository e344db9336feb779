package turnsheet.core.measure;

/**
 * Counts samples that stuck at full scale: runs of three or more equal ones at the largest value
 * seen. Where a sample exceeds 1, full scale is unknown and nothing counts as clipped.
 */
final class ClipCounter {

  private static final double NEAR_FULL_SCALE = 0.99;
  private static final int SHORTEST_RUN = 3;

  private double largest = NEAR_FULL_SCALE;
  private double last;
  private int run;
  private long clipped;

  void add(double[] samples, int count) {
    for (int i = 0; i < count; i++) {
      double x = samples[i];
      double magnitude = Math.abs(x);
      if (magnitude < largest - 1e-4) {
        run = 0;
      } else {
        largest = Math.max(largest, magnitude);
        run = x == last && run > 0 ? run + 1 : 1;
        if (run == SHORTEST_RUN) {
          clipped += SHORTEST_RUN;
        } else if (run > SHORTEST_RUN) {
          clipped++;
        }
      }
      last = x;
    }
  }

  long clipped() {
    return largest > 1 ? 0 : clipped;
  }
}
