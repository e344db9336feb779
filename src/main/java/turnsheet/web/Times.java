package turnsheet.web;

import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.time.format.FormatStyle;
import java.util.Locale;
import org.springframework.stereotype.Component;

/** Times as the log writes them, in the zone of the shop: the machine's own. */
@Component("times")
public class Times {

  private static final DateTimeFormatter MINUTE =
      DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm", Locale.ROOT);

  private final ZoneId zone = ZoneId.systemDefault();

  /** {@code 2026-12-01 14:05}. */
  public String minute(Instant at) {
    return MINUTE.format(at.atZone(zone));
  }

  /** {@code 2026-12-01}. */
  public String day(Instant at) {
    return date(at).toString();
  }

  /** A day as a language writes it on paper; in English as the log does. */
  public String day(Instant at, Locale locale) {
    return locale.getLanguage().equals(Locale.ENGLISH.getLanguage())
        ? day(at)
        : DateTimeFormatter.ofLocalizedDate(FormatStyle.MEDIUM).withLocale(locale).format(date(at));
  }

  /** When the shop's day began. */
  public Instant startOfDay(Instant at) {
    return date(at).atStartOfDay(zone).toInstant();
  }

  /** The shop's date at an instant. */
  public LocalDate date(Instant at) {
    return at.atZone(zone).toLocalDate();
  }
}
