package turnsheet.core.measure;

import java.util.Arrays;
import java.util.Random;

/** Edges of which some are lost and between which some are put, at random places. */
final class Faults {

  final double[] times;
  int lost;
  int added;

  /**
   * @param oneLostIn on average
   * @param oneAddedIn on average
   */
  Faults(double[] clean, int oneLostIn, int oneAddedIn, long seed) {
    Random random = new Random(seed);
    double[] out = new double[2 * clean.length];
    int n = 0;
    for (int i = 0; i < clean.length; i++) {
      boolean inside = i > 0 && i < clean.length - 1;
      if (inside && random.nextInt(oneLostIn) == 0) {
        lost++;
        continue;
      }
      out[n++] = clean[i];
      if (inside && random.nextInt(oneAddedIn) == 0) {
        out[n++] = clean[i] + (0.05 + 0.9 * random.nextDouble()) * (clean[i + 1] - clean[i]);
        added++;
      }
    }
    times = Arrays.copyOf(out, n);
  }
}
