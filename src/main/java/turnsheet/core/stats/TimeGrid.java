package turnsheet.core.stats;

import java.util.Arrays;
import java.util.OptionalDouble;

/**
 * Finds the step of the clock that stamped a set of durations, where they sit on a grid.
 *
 * <p>The candidate is the smallest distance between two different durations; it stands where every
 * duration is a whole number of steps to within a twentieth of a step (root mean square; durations
 * that know no grid have 0.29).
 */
public final class TimeGrid {

  private static final double FIT = 0.05;
  private static final double SMALLEST_SHARE = 1e-8;

  private TimeGrid() {}

  /**
   * The step, or empty where there is none coarse enough to be told.
   *
   * @param durationsSeconds positive, at least three
   */
  public static OptionalDouble stepSeconds(double[] durationsSeconds) {
    double[] sorted = durationsSeconds.clone();
    Arrays.sort(sorted);
    double typical = sorted[sorted.length / 2];
    // durations are differences of times: rounding of those must not look like a step
    double rounding = SMALLEST_SHARE * typical;
    double step = Double.POSITIVE_INFINITY;
    for (int i = 1; i < sorted.length; i++) {
      double d = sorted[i] - sorted[i - 1];
      if (d > rounding) {
        step = Math.min(step, d);
      }
    }
    if (Double.isInfinite(step)) {
      return OptionalDouble.empty();
    }
    step = refined(sorted, typical, step);
    double squares = 0;
    for (double duration : sorted) {
      double rest = duration / step - Math.rint(duration / step);
      squares += rest * rest;
    }
    return Math.sqrt(squares / sorted.length) < FIT
        ? OptionalDouble.of(step)
        : OptionalDouble.empty();
  }

  /** Steps away from a typical duration are few at first: each one found sharpens the next. */
  private static double refined(double[] sorted, double typical, double coarse) {
    double step = coarse;
    for (int pass = 0; pass < 3; pass++) {
      double products = 0;
      double counts = 0;
      for (double duration : sorted) {
        double n = Math.rint((duration - typical) / step);
        products += n * (duration - typical);
        counts += n * n;
      }
      step = counts > 0 ? products / counts : step;
      double whole = Math.rint(typical / step);
      step =
          whole > 0 && whole < 1e5 && Math.abs(typical / step - whole) < 0.1
              ? typical / whole
              : step;
    }
    return step;
  }
}
