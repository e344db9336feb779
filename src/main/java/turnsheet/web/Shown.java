package turnsheet.web;

import org.jspecify.annotations.Nullable;

/**
 * A figure ready to be shown, cut at the decimal point so that a column can line up there.
 *
 * @param whole sign and digits before the point; a dash where there is no value
 * @param fraction the point and what follows; empty where nothing does
 * @param uncertainty expanded uncertainty without sign and unit; empty where there is none
 * @param unit empty for a mere number
 * @param why the reason for whatever is missing; null where nothing is
 */
public record Shown(
    String whole, String fraction, String uncertainty, String unit, @Nullable String why) {

  private static final String NARROW_SPACE = "\u202f";
  private static final String PLUS_MINUS = NARROW_SPACE + "±" + NARROW_SPACE;

  /** The value alone, without unit. */
  public String value() {
    return whole + fraction;
  }

  /** The unit with the space before it; empty for a mere number. */
  public String spacedUnit() {
    return unit.isEmpty() ? "" : NARROW_SPACE + unit;
  }

  /** Value and unit for running text: {@code 0.067 %}. */
  public String valueAndUnit() {
    return value() + spacedUnit();
  }

  /** Everything for running text: {@code (0.067 ± 0.002) %}. */
  public String text() {
    if (uncertainty.isEmpty()) {
      return valueAndUnit();
    }
    String both = value() + PLUS_MINUS + uncertainty;
    return unit.isEmpty() ? both : "(" + both + ")" + spacedUnit();
  }
}
