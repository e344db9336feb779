package turnsheet.core.format.text;

import java.nio.charset.StandardCharsets;

/**
 * Reads decimal numbers from bytes, correctly rounded.
 *
 * <p>Grammar: sign, digits with at most one decimal mark, exponent with sign; blanks and one pair
 * of double quotes around. Up to 2<sup>53</sup> with a power of ten up to 22 both are exact in
 * binary, so that one multiplication or division rounds correctly (Clinger 1990); everything else
 * goes to {@link Double#parseDouble}.
 */
final class Decimals {

  private static final double[] POWERS = new double[23];
  private static final long MAX_EXACT = 1L << 53;

  static {
    for (int i = 0; i < POWERS.length; i++) {
      POWERS[i] = Double.parseDouble("1e" + i);
    }
  }

  /** Any whole number with so many digits is exact in binary. */
  static final int EXACT_DIGITS = 15;

  private Decimals() {}

  /**
   * A number of at most {@link #EXACT_DIGITS} digits, so many of them decimals, by the rule above.
   */
  static double exact(long mantissa, int decimals) {
    return mantissa / POWERS[decimals];
  }

  /** NaN where the bytes are no finite number. */
  static double parse(byte[] bytes, int from, int to, byte mark) {
    int start = from;
    int end = to;
    while (start < end && isBlank(bytes[start])) {
      start++;
    }
    while (end > start && isBlank(bytes[end - 1])) {
      end--;
    }
    if (end - start >= 2 && bytes[start] == '"' && bytes[end - 1] == '"') {
      return parse(bytes, start + 1, end - 1, mark);
    }
    return parseBare(bytes, start, end, mark);
  }

  static double parse(String text, byte mark) {
    byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
    return parse(bytes, 0, bytes.length, mark);
  }

  private static double parseBare(byte[] bytes, int start, int end, byte mark) {
    int i = start;
    boolean negative = false;
    if (i < end && (bytes[i] == '-' || bytes[i] == '+')) {
      negative = bytes[i++] == '-';
    }
    long mantissa = 0;
    int digits = 0;
    int decimals = 0;
    boolean marked = false;
    boolean exact = true;
    for (; i < end; i++) {
      int digit = bytes[i] - '0';
      if (digit >= 0 && digit <= 9) {
        digits++;
        if (mantissa < MAX_EXACT / 10) {
          mantissa = mantissa * 10 + digit;
          decimals += marked ? 1 : 0;
        } else {
          exact = false;
        }
      } else if (bytes[i] == mark && !marked) {
        marked = true;
      } else {
        break;
      }
    }
    if (digits == 0) {
      return Double.NaN;
    }
    int exponent = 0;
    if (i < end && (bytes[i] == 'e' || bytes[i] == 'E')) {
      int sign = i + 1 < end && bytes[i + 1] == '-' ? -1 : 1;
      i += i + 1 < end && (bytes[i + 1] == '-' || bytes[i + 1] == '+') ? 2 : 1;
      if (i == end || end - i > 9) {
        return Double.NaN;
      }
      for (; i < end && bytes[i] >= '0' && bytes[i] <= '9'; i++) {
        exponent = exponent * 10 + (bytes[i] - '0');
      }
      exponent *= sign;
    }
    if (i != end) {
      return Double.NaN;
    }
    int power = exponent - decimals;
    if (exact && power >= -22 && power <= 22) {
      double value = power < 0 ? mantissa / POWERS[-power] : mantissa * POWERS[power];
      return negative ? -value : value;
    }
    return parseLong(bytes, start, end, mark);
  }

  private static double parseLong(byte[] bytes, int start, int end, byte mark) {
    String text = new String(bytes, start, end - start, StandardCharsets.ISO_8859_1);
    double value = Double.parseDouble(mark == '.' ? text : text.replace((char) mark, '.'));
    return Double.isFinite(value) ? value : Double.NaN;
  }

  /**
   * How many decimal places the last printed digit stands behind the point; negative before it.
   *
   * @return {@link Integer#MIN_VALUE} for what is no number
   */
  static int places(String number, byte mark) {
    if (Double.isNaN(parse(number, mark))) {
      return Integer.MIN_VALUE;
    }
    String text = number.replace("\"", "").strip().toLowerCase(java.util.Locale.ROOT);
    int e = text.indexOf('e');
    String mantissa = e < 0 ? text : text.substring(0, e);
    int exponent = e < 0 ? 0 : Integer.parseInt(text.substring(e + 1).replace("+", ""));
    int at = mantissa.indexOf((char) mark);
    return (at < 0 ? 0 : mantissa.length() - at - 1) - exponent;
  }

  private static boolean isBlank(byte b) {
    return b == ' ' || b == '\t';
  }
}
