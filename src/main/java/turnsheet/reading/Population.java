package turnsheet.reading;

import java.util.List;
import turnsheet.core.measure.FigureName;
import turnsheet.core.stats.Quantiles;
import turnsheet.shop.SpeedSettingId;

/**
 * One figure in the newest reading of each unit of a model at one speed setting.
 *
 * @param values one a unit, at least one, in rising order
 */
public record Population(SpeedSettingId settingId, FigureName figure, List<Double> values) {

  /** With fewer units quartiles would be read off between two of them. */
  public static final int LEAST_FOR_QUARTILES = 4;

  public Population {
    values = values.stream().sorted().toList();
    if (values.isEmpty()) {
      throw new IllegalArgumentException("a population without units");
    }
  }

  public int units() {
    return values.size();
  }

  public boolean hasQuartiles() {
    return units() >= LEAST_FOR_QUARTILES;
  }

  public double median() {
    return quantile(0.5);
  }

  /** A quarter of the units lie below. */
  public double lowerQuartile() {
    return quantile(0.25);
  }

  /** A quarter of the units lie above. */
  public double upperQuartile() {
    return quantile(0.75);
  }

  private double quantile(double share) {
    return new Quantiles(values.stream().mapToDouble(Double::doubleValue).toArray()).at(share);
  }
}
