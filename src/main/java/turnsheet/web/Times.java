package turnsheet.web;

import java.time.Instant;
import java.time.LocalDate;
import java.time.YearMonth;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.stereotype.Component;

/**
 * Times in the zone of the shop, the machine's own: as the log writes them on English pages, as
 * usual on German ones.
 */
@Component("times")
public class Times {

  private static final DateTimeFormatter MINUTE =
      DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm", Locale.ROOT);

  private static final DateTimeFormatter MINUTE_GERMAN = german("dd.MM.yyyy, HH:mm");
  private static final DateTimeFormatter DAY_GERMAN = german("dd.MM.yyyy");
  private static final DateTimeFormatter MONTH =
      DateTimeFormatter.ofPattern("yyyy-MM", Locale.ROOT);
  private static final DateTimeFormatter MONTH_GERMAN = german("LLLL yyyy");
  private static final DateTimeFormatter SHORT_MONTH_GERMAN = german("MMM yyyy");

  private final ZoneId zone = ZoneId.systemDefault();

  /** {@code 2026-12-01 14:05}, or {@code 01.12.2026, 14:05}. */
  public String minute(Instant at) {
    return (isGerman() ? MINUTE_GERMAN : MINUTE).format(at.atZone(zone));
  }

  /** {@code 2026-12-01}, or {@code 01.12.2026}. */
  public String day(Instant at) {
    return day(at, LocaleContextHolder.getLocale());
  }

  /** A day in a language that is not that of the page around it. */
  public String day(Instant at, Locale locale) {
    return day(date(at), locale);
  }

  /** A day that was entered as one; empty for none. */
  public String day(@Nullable LocalDate day) {
    if (day == null) {
      return "";
    }
    return day(day, LocaleContextHolder.getLocale());
  }

  /** A day in a language. */
  public static String day(LocalDate day, Locale locale) {
    return PageLanguage.isGerman(locale) ? DAY_GERMAN.format(day) : day.toString();
  }

  /** A month where there is little room: {@code 2026-12}, or {@code Dez. 2026}. */
  public static String shortMonth(YearMonth month, Locale locale) {
    return (PageLanguage.isGerman(locale) ? SHORT_MONTH_GERMAN : MONTH).format(month);
  }

  /** {@code 2026-12}, or {@code Dezember 2026}. */
  public String month(Instant at) {
    return (isGerman() ? MONTH_GERMAN : MONTH).format(at.atZone(zone));
  }

  private static boolean isGerman() {
    return PageLanguage.isGerman(LocaleContextHolder.getLocale());
  }

  private static DateTimeFormatter german(String pattern) {
    return DateTimeFormatter.ofPattern(pattern, PageLanguage.GERMAN);
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
