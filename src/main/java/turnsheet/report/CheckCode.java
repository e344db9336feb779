package turnsheet.report;

import java.util.Locale;
import turnsheet.access.Secrets;

/**
 * A code by which whoever holds a report can ask whether it is what was issued.
 *
 * <p>The first 80 bits of the content's SHA-256, in twenty hexadecimal digits by fives: a second
 * content of the same code takes 2^80 trials to find.
 */
public final class CheckCode {

  private static final int DIGITS = 20;
  private static final int GROUP = 5;

  private CheckCode() {}

  /** The code of a content, as it is printed: {@code 0a1b2-c3d4e-5f607-18293}. */
  public static String of(String content) {
    return grouped(Secrets.sha256(content).substring(0, DIGITS));
  }

  /** A code as typed, in any case and with or without its dashes; nonsense stays nonsense. */
  static String typed(String text) {
    String digits = text.toLowerCase(Locale.ROOT).replaceAll("[^0-9a-f]", "");
    return digits.length() == DIGITS ? grouped(digits) : text;
  }

  private static String grouped(String digits) {
    StringBuilder code = new StringBuilder();
    for (int i = 0; i < DIGITS; i += GROUP) {
      code.append(i == 0 ? "" : "-").append(digits, i, i + GROUP);
    }
    return code.toString();
  }
}
