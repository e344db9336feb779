package turnsheet.reading.chart;

import java.time.LocalDate;
import java.time.YearMonth;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import turnsheet.web.Times;

/** Round dates for an axis whose values are days since 1970-01-01. */
public final class DateTicks {

  private static final int MOST = 7;
  private static final int[] DAYS = {1, 2, 5, 10, 20};
  private static final int[] MONTHS = {1, 2, 3, 6, 12, 24, 60, 120, 240};

  private DateTicks() {}

  /** Marks between two days, seven at most, in rising order, written as a language does. */
  public static List<Axis.Tick> between(double fromDay, double toDay, Locale locale) {
    double span = toDay - fromDay;
    for (int step : DAYS) {
      if (span / step <= MOST - 1) {
        return days(fromDay, toDay, step, locale);
      }
    }
    for (int step : MONTHS) {
      // a month has at least 28 days
      if (span / (28.0 * step) <= MOST - 1) {
        return months(fromDay, toDay, step, locale);
      }
    }
    return List.of();
  }

  private static List<Axis.Tick> days(double from, double to, int step, Locale locale) {
    List<Axis.Tick> ticks = new ArrayList<>();
    for (long day = -Math.floorDiv(-(long) Math.ceil(from), (long) step) * step;
        day <= to;
        day += step) {
      ticks.add(new Axis.Tick(day, Times.day(LocalDate.ofEpochDay(day), locale)));
    }
    return ticks;
  }

  private static List<Axis.Tick> months(double from, double to, int step, Locale locale) {
    YearMonth first = YearMonth.from(LocalDate.ofEpochDay((long) Math.floor(from)));
    long number = first.getYear() * 12L + first.getMonthValue() - 1;
    List<Axis.Tick> ticks = new ArrayList<>();
    for (long k = Math.floorDiv(number, step) * step; ; k += step) {
      YearMonth month = YearMonth.of((int) Math.floorDiv(k, 12L), (int) Math.floorMod(k, 12L) + 1);
      long day = month.atDay(1).toEpochDay();
      if (day > to) {
        return ticks;
      }
      if (day >= from) {
        ticks.add(
            new Axis.Tick(
                day,
                step >= 12 ? Integer.toString(month.getYear()) : Times.shortMonth(month, locale)));
      }
    }
  }
}
