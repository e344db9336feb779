package turnsheet.shop;

import turnsheet.core.measure.FigureName;

/**
 * A bound on the size of one figure at one speed setting.
 *
 * @param upperBound on the figure without its sign, in the figure's unit
 * @param origin where the bound comes from: a service manual, a standard, a rule of the shop
 */
public record ServiceLimit(
    SpeedSettingId settingId, FigureName figure, double upperBound, String origin) {

  public static final int ORIGIN_LENGTH = 300;

  public ServiceLimit {
    Require.positive("bound", upperBound);
    Require.text("origin", origin, ORIGIN_LENGTH);
  }
}
