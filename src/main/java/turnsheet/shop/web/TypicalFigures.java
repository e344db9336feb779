package turnsheet.shop.web;

import java.util.List;
import java.util.Locale;
import turnsheet.shop.MachineModel;
import turnsheet.web.Shown;

/** What is typical for the units of a model; told by whoever keeps their readings. */
public interface TypicalFigures {

  /** Speed settings in the order of the selector, figures in their own; empty without readings. */
  List<Row> of(MachineModel model, Locale locale);

  /**
   * One figure at one speed setting.
   *
   * @param units how many have it
   * @param lower quartile of the newest value of each; a dash for few units
   */
  record Row(String setting, String figure, int units, Shown lower, Shown median, Shown upper) {}
}
