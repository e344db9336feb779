package turnsheet.core.diagnose.pair;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Lines that one sensor shows and the other does not, or that both show differently: the pattern of
 * a wheel, hum in one of them.
 */
final class OwnLines {

  /** About one bin in a million that is only noise passes. */
  private static final double NORMAL_QUANTILE = 4.75;

  /**
   * Of the power at a rate. Where the machine moves much more than that, what is left of its motion
   * between two traces would pass for a line.
   */
  private static final double LEAST_SHARE = 0.01;

  /** Below, next to no noise of edges is left and anything would stand out of it. */
  private static final double LOWEST_HERTZ = 1;

  private static final int NEIGHBOURS = 20;

  /** A Hann line reaches two bins to either side. */
  private static final int LOBE = 2;

  private final boolean[] taken;
  private final List<int[]> spans = new ArrayList<>();

  private OwnLines(int size) {
    taken = new boolean[size];
  }

  /** Looks for them in the difference of both. */
  static OwnLines find(PairSpectra spectra) {
    CrossSpectra all = spectra.all();
    int last = spectra.lastBin();
    OwnLines lines = new OwnLines(last + 1);
    double[] level = new double[last + 1];
    for (int k = 1; k <= last; k++) {
      // noise of edges grows with the square of the rate
      level[k] = all.difference(k) / ((double) k * k);
    }
    double limit = limit(spectra.averages());
    int from = -1;
    int to = -1;
    for (int k = lowest(spectra); k <= last; k++) {
      if (level[k] <= limit * median(level, Math.max(1, k - NEIGHBOURS), k + NEIGHBOURS)
          || all.difference(k) < LEAST_SHARE * (all.first(k) + all.second(k))) {
        continue;
      }
      if (from >= 0 && k > to + 2 * LOBE) {
        lines.take(from, to);
        from = -1;
      }
      from = from < 0 ? k : from;
      to = k;
    }
    if (from >= 0) {
      lines.take(from, to);
    }
    return lines;
  }

  private static int lowest(PairSpectra spectra) {
    return Math.max(spectra.lowestBin(), (int) Math.ceil(LOWEST_HERTZ / spectra.stepHertz()));
  }

  private void take(int from, int to) {
    int low = Math.max(1, from - LOBE);
    int high = Math.min(taken.length - 1, to + LOBE);
    spans.add(new int[] {low, high});
    Arrays.fill(taken, low, high + 1, true);
  }

  /**
   * What the mean of n squared magnitudes stays below by chance, in units of its median: E. B.
   * Wilson and M. M. Hilferty, Proc. Natl. Acad. Sci. 17 (1931), 684-688 (from memory).
   */
  static double limit(double averages) {
    double ninth = 1 / (9 * averages);
    double high = Math.pow(1 - ninth + NORMAL_QUANTILE * Math.sqrt(ninth), 3);
    return high / Math.pow(1 - ninth, 3);
  }

  private static double median(double[] values, int from, int to) {
    double[] near = Arrays.copyOfRange(values, from, Math.min(values.length, to + 1));
    Arrays.sort(near);
    return near[near.length / 2];
  }

  boolean holds(int bin) {
    return taken[bin];
  }

  /** First and last bin of each line. */
  List<int[]> spans() {
    return List.copyOf(spans);
  }
}
