package turnsheet.core.diagnose;

import java.util.stream.DoubleStream;
import java.util.stream.Stream;
import turnsheet.core.measure.Figure;

/**
 * The same figure before and after a repair.
 *
 * @param difference mean of the runs after minus mean of the runs before, in the unit of the figure
 * @param change whether the magnitude got smaller by more than the interval allows for chance
 * @param resampled whether the chance part of every run comes from block resampling
 * @param betweenRuns whether the interval holds how the machine differs from run to run
 */
public record Difference(Figure difference, Change change, boolean resampled, boolean betweenRuns) {

  /** What the difference shows. */
  public enum Change {
    IMPROVED,
    WORSE,
    /** shown, and smaller than what matters to the shop */
    TOO_SMALL_TO_MATTER,
    NO_CHANGE_SHOWN
  }

  /**
   * Compares two conditions at 95 %.
   *
   * <p>The variance between runs is what their scatter exceeds the runs' own uncertainty by; it
   * enters where both sides have two runs or more, with Student's factor for the effective degrees
   * of freedom. A single pair knows nothing of it.
   *
   * @param leastThatMatters smallest difference of magnitudes that counts, not negative, in the
   *     unit of the figure
   */
  public static Difference of(Runs before, Runs after, double leastThatMatters) {
    if (!(leastThatMatters >= 0)) {
      throw new IllegalArgumentException("least that matters " + leastThatMatters);
    }
    Figure one = before.figure();
    Figure other = after.figure();
    Double from = one.value();
    Double to = other.value();
    if (from == null || to == null) {
      return undecided(
          Figure.absent(from == null ? "before: " + one.why() : "after: " + other.why()));
    }
    if (!before.areComplete() || !after.areComplete()) {
      String why = before.areComplete() ? "after: " + other.why() : "before: " + one.why();
      return undecided(Figure.withoutUncertainty(to - from, why));
    }
    boolean betweenRuns = before.count() > 1 && after.count() > 1;
    Figure difference = difference(before, after, to - from, betweenRuns);
    boolean resampled =
        Stream.concat(before.runs().stream(), after.runs().stream()).allMatch(Run::resampled);
    return new Difference(
        difference,
        change(Math.abs(to) - Math.abs(from), difference, leastThatMatters),
        resampled,
        betweenRuns);
  }

  private static Difference undecided(Figure difference) {
    return new Difference(difference, Change.NO_CHANGE_SHOWN, false, false);
  }

  private static Figure difference(Runs before, Runs after, double value, boolean betweenRuns) {
    double from = ofMean(before);
    double to = ofMean(after);
    double own = Math.hypot(from, to);
    double ownFreedom = Coverage.freedom(from, freedom(before), to, freedom(after));
    if (!betweenRuns) {
      return Coverage.figure(value, own, ownFreedom);
    }
    double runFreedom = before.count() + after.count() - 2.0;
    double scatter =
        ((before.count() - 1) * square(before.spread())
                + (after.count() - 1) * square(after.spread()))
            / runFreedom;
    double explained =
        Stream.concat(before.runs().stream(), after.runs().stream())
            .mapToDouble(run -> square(run.standardUncertainty()))
            .average()
            .orElseThrow();
    double share = 1.0 / before.count() + 1.0 / after.count();
    if (scatter <= explained) {
      return Coverage.figure(value, own, ownFreedom);
    }
    // only the excess is added, but it is known no better than the scatter that it comes from
    double excess = Math.sqrt((scatter - explained) * share);
    double u4 = Math.pow(square(own) + square(excess), 2);
    double effective = u4 / (square(scatter * share) / runFreedom + Math.pow(own, 4) / ownFreedom);
    return Coverage.figure(value, Math.hypot(own, excess), effective);
  }

  private static Change change(double growth, Figure difference, double leastThatMatters) {
    Double expanded = difference.expandedUncertainty();
    if (expanded == null || Math.abs(growth) <= expanded) {
      return Change.NO_CHANGE_SHOWN;
    }
    if (Math.abs(growth) < leastThatMatters) {
      return Change.TOO_SMALL_TO_MATTER;
    }
    return growth < 0 ? Change.IMPROVED : Change.WORSE;
  }

  /** Standard uncertainty of the mean of a side, from its runs' own. */
  private static double ofMean(Runs runs) {
    return Math.sqrt(squares(runs).sum()) / runs.count();
  }

  private static double freedom(Runs runs) {
    double sum =
        runs.runs().stream()
            .mapToDouble(r -> Math.pow(r.standardUncertainty(), 4) / r.degreesOfFreedom())
            .sum();
    return sum > 0 ? square(squares(runs).sum()) / sum : Double.POSITIVE_INFINITY;
  }

  private static DoubleStream squares(Runs runs) {
    return runs.runs().stream().mapToDouble(r -> square(r.standardUncertainty()));
  }

  private static double square(double x) {
    return x * x;
  }
}
