package turnsheet.web;

import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.ResourceBundle;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.stereotype.Component;

/**
 * Sentences of the measuring core, which speaks English and is stored so, on German pages: each is
 * found again by its fixed words in {@code messages/core.properties} and said with the German ones.
 * A sentence that is not found stays as it is and is marked as English. Templates know it as {@code
 * @core}.
 */
@Component("core")
public class CoreWords {

  private static final String PREFIX = "core.";
  private static final Pattern PLACE = Pattern.compile("\\{(\\d)}");
  private static final Pattern DECIMAL = Pattern.compile("(?<=\\d)\\.(?=\\d)");
  private static final List<Saying> SAYINGS = sayings();

  /**
   * One sentence in both languages.
   *
   * @param fixed count of its fixed characters: the more there are, the surer the match
   */
  private record Saying(Pattern english, int fixed, String german) {}

  /** In the language of the page at hand. */
  public @Nullable String text(@Nullable String english) {
    return english == null ? null : in(LocaleContextHolder.getLocale(), english);
  }

  /** For the attribute {@code lang}: "en" where a German page has to say it in English. */
  public @Nullable String lang(@Nullable String english) {
    boolean foreign =
        english != null
            && !english.isBlank()
            && PageLanguage.isGerman(LocaleContextHolder.getLocale())
            && german(english).isEmpty();
    return foreign ? PageLanguage.ENGLISH.getLanguage() : null;
  }

  /** In a language; English where there is no German for it. */
  public static String in(Locale locale, String english) {
    return PageLanguage.isGerman(locale) ? german(english).orElse(english) : english;
  }

  static Optional<String> german(String english) {
    return SAYINGS.stream().flatMap(saying -> said(saying, english).stream()).findFirst();
  }

  private static Optional<String> said(Saying saying, String english) {
    Matcher found = saying.english.matcher(english);
    if (!found.matches()) {
      return Optional.empty();
    }
    return Optional.of(
        PLACE
            .matcher(saying.german)
            .replaceAll(
                place -> Matcher.quoteReplacement(piece(found.group("p" + place.group(1))))));
  }

  /** What was filled in: a number takes the comma, words their German. */
  private static String piece(String english) {
    return english.matches("[-+\u2212]?[\\d.]+")
        ? DECIMAL.matcher(english).replaceAll(",")
        : german(english).orElse(english);
  }

  private static List<Saying> sayings() {
    var exactly =
        ResourceBundle.Control.getNoFallbackControl(ResourceBundle.Control.FORMAT_PROPERTIES);
    ResourceBundle english = ResourceBundle.getBundle("messages.core", Locale.ROOT, exactly);
    ResourceBundle german = ResourceBundle.getBundle("messages.core", Locale.GERMAN, exactly);
    return english.keySet().stream()
        .filter(key -> key.startsWith(PREFIX))
        .map(key -> saying(plain(english.getString(key)), plain(german.getString(key))))
        .sorted(Comparator.comparingInt(Saying::fixed).reversed())
        .toList();
  }

  /** As all messages, a text with places has its apostrophes twice. */
  private static String plain(String text) {
    return text.replace("''", "'");
  }

  private static Saying saying(String english, String german) {
    StringBuilder pattern = new StringBuilder();
    Matcher place = PLACE.matcher(english);
    int from = 0;
    int fixed = english.length();
    while (place.find()) {
      pattern.append(Pattern.quote(english.substring(from, place.start())));
      pattern.append("(?<p").append(place.group(1)).append(">.*?)");
      fixed -= place.end() - place.start();
      from = place.end();
    }
    pattern.append(Pattern.quote(english.substring(from)));
    return new Saying(Pattern.compile(pattern.toString(), Pattern.DOTALL), fixed, german);
  }
}
