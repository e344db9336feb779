package turnsheet.core.measure;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.stats.Budget;

/**
 * One measured number; its unit stands in the name of the component that holds it.
 *
 * @param value the number; null where the capture cannot give it
 * @param expandedUncertainty half width of the interval that holds the truth in about 95 of 100
 *     cases, in the unit of the value; null where it cannot be stated
 * @param k coverage factor of that interval; null with it
 * @param why the reason for whatever is null; null otherwise
 * @param budget what the uncertainty is made of; empty where that was not told apart, as in
 *     documents of the time before budgets were kept
 */
public record Figure(
    @Nullable Double value,
    @Nullable Double expandedUncertainty,
    @Nullable Double k,
    @Nullable String why,
    List<Budget.Contribution> budget) {

  public Figure {
    budget = budget == null ? List.of() : List.copyOf(budget); // documents of before have none
    requireFinite("value", value);
    requireFinite("uncertainty", expandedUncertainty);
    if (expandedUncertainty != null && expandedUncertainty < 0) {
      throw new IllegalArgumentException("uncertainty " + expandedUncertainty);
    }
    if ((expandedUncertainty == null) != (k == null)) {
      throw new IllegalArgumentException("uncertainty " + expandedUncertainty + " with k " + k);
    }
    if ((value == null || expandedUncertainty == null) != (why != null)) {
      throw new IllegalArgumentException(
          "value " + value + ", U " + expandedUncertainty + ", why " + why);
    }
  }

  /** A value with its uncertainty at k = 2. */
  public static Figure of(double value, double expandedUncertainty) {
    return new Figure(value, expandedUncertainty, Budget.K, null, List.of());
  }

  /** A value with what its uncertainty is made of, in the unit of the value. */
  public static Figure of(double value, Budget budget) {
    return new Figure(value, budget.expanded(), Budget.K, null, budget.contributions());
  }

  /** A value whose uncertainty cannot be stated. */
  public static Figure withoutUncertainty(double value, String why) {
    return new Figure(value, null, null, why, List.of());
  }

  /** No value at all. */
  public static Figure absent(String why) {
    return new Figure(null, null, null, why, List.of());
  }

  private static void requireFinite(String name, @Nullable Double number) {
    if (number != null && !Double.isFinite(number)) {
      throw new IllegalArgumentException(name + " " + number);
    }
  }
}
