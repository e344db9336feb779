package turnsheet.web;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.web.context.request.RequestAttributes;
import org.springframework.web.context.request.RequestContextHolder;

/**
 * The languages that pages are written in, and the language of the page at hand where it is not the
 * shop's: a report opened by a link is read by somebody else.
 */
public final class PageLanguage {

  public static final Locale ENGLISH = Locale.UK;
  public static final Locale GERMAN = Locale.GERMANY;

  private static final String CHOSEN = PageLanguage.class.getName() + ".chosen";

  private PageLanguage() {}

  /** The language with this code; English where we do not write it. */
  public static Locale of(@Nullable String code) {
    return GERMAN.getLanguage().equals(code) ? GERMAN : ENGLISH;
  }

  public static boolean isGerman(Locale locale) {
    return locale.getLanguage().equals(GERMAN.getLanguage());
  }

  /** The page that answers the request at hand is in this language, whatever the shop's is. */
  public static void use(Locale locale) {
    RequestContextHolder.currentRequestAttributes()
        .setAttribute(CHOSEN, locale, RequestAttributes.SCOPE_REQUEST);
  }

  /**
   * For pages that strangers open: German where the browser asks for it first, else the shop's
   * language.
   */
  public static void useBrowsers(Locale first) {
    if (isGerman(first)) {
      use(GERMAN);
    }
  }

  /** The attribute of the request under which {@link #use} leaves it. */
  public static String attribute() {
    return CHOSEN;
  }
}
