package turnsheet.web;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.text.DecimalFormatSymbols;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import turnsheet.core.measure.Figure;

/**
 * Numbers as people read them. The expanded uncertainty keeps two significant digits and the value
 * ends at the same decimal place; without uncertainty a value keeps three significant digits.
 *
 * <p>Source: JCGM 100:2008 (GUM), 7.2.6, which allows at most two digits and leaves the direction
 * of rounding open; we round to the nearest, halves away from zero.
 */
public final class Numbers {

  /** Whether a positive value carries its sign. */
  public enum Sign {
    /** Deviations and drifts: {@code +0.37}. */
    SHOWN,
    /** Amounts that cannot be negative. */
    PLAIN
  }

  private static final MathContext TWO_DIGITS = new MathContext(2, RoundingMode.HALF_UP);
  private static final MathContext THREE_DIGITS = new MathContext(3, RoundingMode.HALF_UP);
  private static final String MINUS = "\u2212";
  private static final String NO_VALUE = "\u2013";

  private final char point;

  private Numbers(char point) {
    this.point = point;
  }

  /** Numbers with the decimal sign of a language. */
  public static Numbers in(Locale locale) {
    return new Numbers(DecimalFormatSymbols.getInstance(locale).getDecimalSeparator());
  }

  /** A decimal number already written with a point, with the sign of the page at hand. */
  public static String onPage(String digits) {
    return digits.replace('.', in(LocaleContextHolder.getLocale()).point);
  }

  /** The decimal sign. */
  public char decimalSign() {
    return point;
  }

  /** A figure of a reading. */
  public Shown show(Figure figure, String unit, Sign sign) {
    Double value = figure.value();
    return value == null
        ? new Shown(NO_VALUE, "", "", "", figure.why())
        : shown(value, figure.expandedUncertainty(), unit, sign, figure.why());
  }

  /**
   * A number with or without uncertainty.
   *
   * @throws IllegalArgumentException where one is not finite or the uncertainty negative
   */
  public Shown show(double value, @Nullable Double expandedUncertainty, String unit, Sign sign) {
    return shown(value, expandedUncertainty, unit, sign, null);
  }

  /** A number at a given count of decimal places: {@code 3150.00}. */
  public String fixed(double value, int places) {
    return written(exact(value).setScale(places, RoundingMode.HALF_UP), Sign.PLAIN);
  }

  /** A number with as many digits as it was entered with, as a limit or a setting. */
  public String plain(double value) {
    BigDecimal stripped = exact(value).stripTrailingZeros();
    return written(stripped.scale() < 0 ? stripped.setScale(0) : stripped, Sign.PLAIN);
  }

  private Shown shown(
      double value, @Nullable Double uncertainty, String unit, Sign sign, @Nullable String why) {
    BigDecimal half = uncertainty == null ? null : twoDigits(exact(uncertainty));
    if (half != null && half.signum() < 0) {
      throw new IllegalArgumentException("uncertainty " + uncertainty);
    }
    BigDecimal rounded =
        half == null || half.signum() == 0
            ? exact(value).round(THREE_DIGITS)
            : exact(value).setScale(half.scale(), RoundingMode.HALF_UP);
    String text = written(rounded, sign);
    int at = text.indexOf(point);
    return new Shown(
        at < 0 ? text : text.substring(0, at),
        at < 0 ? "" : text.substring(at),
        half == null ? "" : written(half, Sign.PLAIN),
        unit,
        why);
  }

  /** Two significant digits, a trailing zero included: 0.0020. */
  private static BigDecimal twoDigits(BigDecimal number) {
    BigDecimal rounded = number.round(TWO_DIGITS);
    return rounded.signum() == 0
        ? rounded
        : rounded.setScale(rounded.scale() + 2 - rounded.precision());
  }

  private String written(BigDecimal number, Sign sign) {
    String digits = number.abs().toPlainString().replace('.', point);
    if (number.signum() < 0) {
      return MINUS + digits;
    }
    return number.signum() > 0 && sign == Sign.SHOWN ? "+" + digits : digits;
  }

  /** The shortest decimal that means this double: 0.067, not 0.067000000000000004. */
  private static BigDecimal exact(double number) {
    if (!Double.isFinite(number)) {
      throw new IllegalArgumentException("number " + number);
    }
    return number == 0 ? BigDecimal.ZERO : BigDecimal.valueOf(number);
  }
}
