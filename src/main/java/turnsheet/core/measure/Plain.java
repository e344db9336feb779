package turnsheet.core.measure;

import java.math.BigDecimal;
import java.math.MathContext;

/** Numbers in sentences: a few digits, no trailing zeros, no powers of ten. */
final class Plain {

  private Plain() {}

  static String number(double value, int digits) {
    String text = new BigDecimal(value).round(new MathContext(digits)).toPlainString();
    return text.contains(".") ? text.replaceFirst("\\.?0+$", "") : text;
  }
}
