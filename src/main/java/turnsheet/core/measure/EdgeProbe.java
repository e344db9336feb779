package turnsheet.core.measure;

import java.io.IOException;
import java.util.Arrays;
import java.util.Locale;
import java.util.OptionalDouble;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.stats.Quantiles;
import turnsheet.core.stats.TimeGrid;

/**
 * What the first edges of a capture tell about all of them.
 *
 * @param medianSeconds period in the middle of those seen
 * @param startSeconds period to expect at the beginning
 * @param spreadSeconds distance of the quartiles of the periods
 * @param gridSeconds step of the clock that stamped the edges; 0 where none can be told
 * @param skipFirst whether the first edge stands alone, far before the others
 */
record EdgeProbe(
    double medianSeconds,
    double startSeconds,
    double spreadSeconds,
    double gridSeconds,
    boolean skipFirst) {

  private static final int EDGES = 1 << 16;
  private static final int GRID_PERIODS = 4096;
  private static final int BEGINNING = 15;
  private static final int FEWEST = 4;

  /** A first period so much longer than the others is an offset, not a row of lost edges. */
  private static final double LONE_FIRST = 8;

  /** Reads the beginning; the opener is used once. */
  static EdgeProbe of(EdgeOpener opener, double clockFactor) throws IOException, RejectedException {
    double[] rises = new double[EDGES];
    int n = 0;
    double declared;
    try (EdgeReader reader = opener.open()) {
      double[] times = new double[4096];
      boolean[] rising = new boolean[4096];
      int count;
      while (n < EDGES && (count = reader.read(times, rising)) > 0) {
        for (int i = 0; i < count && n < EDGES; i++) {
          if (rising[i]) {
            rises[n++] = times[i] * clockFactor;
          }
        }
      }
      declared = reader.timeStepSeconds() * clockFactor;
    }
    if (n < FEWEST) {
      throw new RejectedException(
          "noPulses",
          String.format(
              Locale.ROOT,
              "Only %d rising edges were found, and %d are the least to measure a speed: check the"
                  + " probe, the channel and the level, and record again.",
              n,
              FEWEST));
    }
    double[] periods = new double[n - 1];
    for (int i = 1; i < n; i++) {
      periods[i - 1] = rises[i] - rises[i - 1];
    }
    return of(periods, declared);
  }

  private static EdgeProbe of(double[] periods, double declaredStep) throws RejectedException {
    double median = new Quantiles(periods).median();
    if (!(median > 0)) {
      throw new RejectedException(
          "noPulses",
          "Most edges carry the same time as the edge before: export the times with more digits.");
    }
    boolean skip = periods[0] > LONE_FIRST * median;
    double[] kept = skip ? Arrays.copyOfRange(periods, 1, periods.length) : periods;
    Quantiles quantiles = new Quantiles(kept);
    OptionalDouble grid =
        TimeGrid.stepSeconds(Arrays.copyOf(kept, Math.min(kept.length, GRID_PERIODS)));
    return new EdgeProbe(
        quantiles.median(),
        new Quantiles(kept, Math.min(BEGINNING, kept.length)).median(),
        quantiles.at(0.75) - quantiles.at(0.25),
        Math.max(declaredStep, grid.orElse(0)),
        skip);
  }
}
