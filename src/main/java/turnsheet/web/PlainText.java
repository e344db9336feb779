package turnsheet.web;

import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * Text without what no page and no paper can show: control characters other than tab and line feed,
 * and what is no character at all. PostgreSQL keeps no zero in a text, and the PDF is made from XML
 * (Source: Extensible Markup Language 1.0, 2.2 Characters), so that one stray byte of a pasted
 * label would keep a report from being issued.
 */
public final class PlainText {

  private static final Pattern LINE_END = Pattern.compile("\r\n?");

  private static final Pattern UNSHOWABLE =
      Pattern.compile("[\\p{Cc}&&[^\t\n]]|\\p{Cs}|[\uFFFE\uFFFF]");

  private PlainText() {}

  /** As it was typed, without spaces around it; empty where nothing was sent. */
  public static String typed(@Nullable String sent) {
    return sent == null ? "" : showable(sent).strip();
  }

  /** The same text with what can be shown, and with plain line ends. */
  public static String showable(String text) {
    return UNSHOWABLE.matcher(LINE_END.matcher(text).replaceAll("\n")).replaceAll("");
  }
}
