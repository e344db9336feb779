package turnsheet.shop.web;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;
import org.springframework.context.i18n.LocaleContextHolder;
import turnsheet.access.ShopPreferences.SpeedLiking;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedUnit;
import turnsheet.web.CoreWords;
import turnsheet.web.Numbers;

/** Nominal speeds as people read them on the page at hand. */
public final class SpeedText {

  /** Six digits tell 33.3333 from 33.33 and 9.525 from 9.53; more say nothing on a bench. */
  private static final MathContext SIX_DIGITS = new MathContext(6, RoundingMode.HALF_UP);

  private static final String SPACE = "\u202f";

  private SpeedText() {}

  /** {@code 9.525 cm/s (3.75 in/s)}, the other way round where liked, or {@code 45 rev/min}. */
  public static String of(SpeedSetting setting, SpeedLiking liking) {
    double speed = setting.nominalSpeed();
    Locale locale = LocaleContextHolder.getLocale();
    String cm = digits(speed) + SPACE + "cm/s";
    String inches = digits(speed / SpeedUnit.CM_PER_INCH) + SPACE + CoreWords.in(locale, "in/s");
    if (setting.unit() == SpeedUnit.REV_PER_MIN) {
      return digits(speed) + SPACE + CoreWords.in(locale, "rev/min");
    }
    return liking == SpeedLiking.IN_PER_S ? inches + " (" + cm + ")" : cm + " (" + inches + ")";
  }

  /** A number with at most six significant digits and no idle zeros. */
  public static String digits(double value) {
    BigDecimal rounded = BigDecimal.valueOf(value).round(SIX_DIGITS).stripTrailingZeros();
    return Numbers.onPage(
        (rounded.scale() < 0 ? rounded.setScale(0, RoundingMode.UNNECESSARY) : rounded)
            .toPlainString());
  }

  /** A rate in Hz, three decimals. */
  static String hertz(double rate) {
    return Numbers.onPage(
        BigDecimal.valueOf(rate).setScale(3, RoundingMode.HALF_UP).toPlainString());
  }
}
