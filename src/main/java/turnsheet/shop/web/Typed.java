package turnsheet.shop.web;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.springframework.validation.Errors;
import turnsheet.web.Numbers;
import turnsheet.web.PlainText;
import turnsheet.web.Shown;

/**
 * What people type into fields. Numbers have a decimal point, or are vulgar fractions as the trade
 * writes speeds ({@code 33 1/3}). A comma is not taken: it may mean either of two numbers.
 */
public final class Typed {

  private static final Pattern DECIMAL = Pattern.compile("[-+\u2212]?\\d{1,12}(\\.\\d{1,15})?");
  private static final Pattern FRACTION =
      Pattern.compile("(?:(\\d{1,6})\\s+)?(\\d{1,4})/(\\d{1,4})");

  private Typed() {}

  /** The text without spaces around it; see {@link PlainText#typed}. */
  public static String text(@Nullable String sent) {
    return PlainText.typed(sent);
  }

  /** As a number to edit again: every digit that matters, none besides. */
  public static String number(@Nullable Double value) {
    if (value == null) {
      return "";
    }
    BigDecimal digits = BigDecimal.valueOf(value).stripTrailingZeros();
    return (digits.scale() < 0 ? digits.setScale(0, RoundingMode.UNNECESSARY) : digits)
        .toPlainString();
  }

  /**
   * As a cell of a table, every digit that matters, with the decimal sign of the page at hand and
   * cut there for the column.
   */
  public static Shown cell(double value) {
    String digits = number(value).replace('-', '\u2212');
    int at = digits.indexOf('.');
    return new Shown(
        at < 0 ? digits : digits.substring(0, at),
        at < 0 ? "" : Numbers.onPage(digits.substring(at)),
        "",
        "",
        null);
  }

  static @Nullable Shown cellOrNone(@Nullable Double value) {
    return value == null ? null : cell(value);
  }

  static String number(@Nullable Integer value) {
    return value == null ? "" : value.toString();
  }

  /** Reads a number above zero; a sentence goes to the field where there is none. */
  public static @Nullable Double positive(Errors errors, String field, String typed) {
    Double value = number(errors, field, typed);
    if (value != null && !(value > 0)) {
      errors.rejectValue(field, "shop.form.positive");
      return null;
    }
    return value;
  }

  static @Nullable Double positiveOrNone(Errors errors, String field, String typed) {
    return typed.isEmpty() ? null : positive(errors, field, typed);
  }

  /** Reads a number that may be left out, and is zero or more. */
  public static @Nullable Double notNegativeOrNone(Errors errors, String field, String typed) {
    Double value = typed.isEmpty() ? null : number(errors, field, typed);
    if (value != null && value < 0) {
      errors.rejectValue(field, "shop.form.notNegative");
      return null;
    }
    return value;
  }

  /** Reads a whole number above zero that may be left out. */
  public static @Nullable Integer countOrNone(Errors errors, String field, String typed) {
    if (typed.isEmpty()) {
      return null;
    }
    if (!typed.matches("[1-9]\\d{0,5}")) {
      errors.rejectValue(field, "shop.form.count");
      return null;
    }
    return Integer.valueOf(typed);
  }

  static @Nullable Double number(Errors errors, String field, String typed) {
    Matcher fraction = FRACTION.matcher(typed);
    if (fraction.matches() && Integer.parseInt(fraction.group(3)) > 0) {
      String whole = fraction.group(1);
      return (whole == null ? 0 : Integer.parseInt(whole))
          + Integer.parseInt(fraction.group(2)) / (double) Integer.parseInt(fraction.group(3));
    }
    if (DECIMAL.matcher(typed).matches()) {
      return Double.valueOf(typed.replace('\u2212', '-'));
    }
    errors.rejectValue(
        field,
        typed.isEmpty()
            ? "shop.form.numberMissing"
            : typed.contains(",") ? "shop.form.comma" : "shop.form.number");
    return null;
  }
}
