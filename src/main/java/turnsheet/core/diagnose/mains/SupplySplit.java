package turnsheet.core.diagnose.mains;

import turnsheet.core.measure.Causes;
import turnsheet.core.measure.Figure;
import turnsheet.core.stats.Budget;

/**
 * The speed error of a machine whose motor runs in step with the mains, split in two.
 *
 * <p>One clock stamped both the hum and the signal: what it is off shifts both alike, so it is in
 * neither side's share of the rest, which is the ratio of the two.
 *
 * @param supplyPercent how far the mains are off their nominal frequency
 * @param restPercent the speed error that would be left on a supply that is right: belts,
 *     diameters, slip, the medium
 */
public record SupplySplit(Figure supplyPercent, Figure restPercent) {

  /**
   * Splits.
   *
   * @param deviationPercent of the speed from nominal, of the same channel
   */
  public static SupplySplit of(Figure deviationPercent, Mains mains) {
    Figure frequency = mains.frequencyHz();
    Double hertz = frequency.value();
    Double deviation = deviationPercent.value();
    if (hertz == null || deviation == null) {
      Figure none = Figure.absent("the speed or the mains frequency is not known");
      return new SupplySplit(none, none);
    }
    double toPercent = 100 / mains.nominalHz();
    double supply = (hertz - mains.nominalHz()) * toPercent;
    Budget supplyBudget = new Budget(frequency.budget()).times(toPercent);
    double rest = 100 * ((1 + deviation / 100) / (1 + supply / 100) - 1);
    if (deviationPercent.budget().isEmpty()) {
      return new SupplySplit(
          Figure.of(supply, supplyBudget),
          Figure.withoutUncertainty(rest, "the reading does not tell its uncertainty apart"));
    }
    Budget both = Budget.empty();
    for (Budget.Contribution c : deviationPercent.budget()) {
      both = Causes.CLOCK.equals(c.cause()) ? both : both.plus(c.cause(), c.standardUncertainty());
    }
    for (Budget.Contribution c : supplyBudget.contributions()) {
      both = Causes.CLOCK.equals(c.cause()) ? both : both.plus(c.cause(), c.standardUncertainty());
    }
    return new SupplySplit(Figure.of(supply, supplyBudget), Figure.of(rest, both));
  }
}
