package turnsheet.core.diagnose;

import turnsheet.core.measure.Figure;

/**
 * The same figure before and after a repair.
 *
 * <p>The uncertainties are combined as if they had nothing in common (JCGM 100 clause 5.1.2). Where
 * both captures share a clock or a medium the true one is smaller: a change is then shown later
 * than it could be, never sooner.
 *
 * @param difference after minus before, in the unit of the figure
 * @param change whether the magnitude got smaller by more than the interval allows for chance
 */
public record Difference(Figure difference, Change change) {

  /** What the difference shows. */
  public enum Change {
    IMPROVED,
    WORSE,
    NO_CHANGE_SHOWN
  }

  /** Compares two readings of one figure. */
  public static Difference of(Figure before, Figure after) {
    Double from = before.value();
    Double to = after.value();
    if (from == null || to == null) {
      String why = from == null ? "before: " + before.why() : "after: " + after.why();
      return new Difference(Figure.absent(why), Change.NO_CHANGE_SHOWN);
    }
    if (before.why() != null || after.why() != null) {
      String why = before.why() != null ? "before: " + before.why() : "after: " + after.why();
      return new Difference(Figure.withoutUncertainty(to - from, why), Change.NO_CHANGE_SHOWN);
    }
    double expanded = 2 * Math.hypot(standardUncertainty(before), standardUncertainty(after));
    double growth = Math.abs(to) - Math.abs(from);
    Change change =
        growth < -expanded
            ? Change.IMPROVED
            : growth > expanded ? Change.WORSE : Change.NO_CHANGE_SHOWN;
    return new Difference(Figure.of(to - from, expanded), change);
  }

  private static double standardUncertainty(Figure figure) {
    Double expanded = figure.expandedUncertainty();
    Double k = figure.k();
    if (expanded == null || k == null) {
      throw new IllegalArgumentException("no uncertainty: " + figure);
    }
    return expanded / k;
  }
}
