package turnsheet.bench.web;

import java.util.Comparator;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.bench.ClockCheck;
import turnsheet.shop.BenchInstrument;
import turnsheet.web.Numbers;
import turnsheet.web.Shown;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/**
 * The page of a bench instrument.
 *
 * @param clock error with its uncertainty
 * @param reckoned what is reckoned with where the uncertainty is unknown; null where it is not
 * @param checkedOn empty where never
 * @param checks the newest first
 * @param clockSvg finished drawing of them; null where there is none
 * @param floors by month, the newest first
 * @param floorSvg finished drawing of them; null where there is none
 */
record InstrumentPage(
    String id,
    String name,
    String clock,
    @Nullable String reckoned,
    String checkedOn,
    String note,
    List<Row> checks,
    @Nullable String clockSvg,
    List<FloorRow> floors,
    @Nullable String floorSvg) {

  /** Finer than any floor differs from another. */
  private static final int FLOOR_PLACES = 5;

  private static final String NO_VALUE = "\u2013";

  /**
   * A line of the history.
   *
   * @param standing a message key
   */
  record Row(
      String id,
      String at,
      Shown error,
      String uncertainty,
      String source,
      String reference,
      String by,
      String standing) {}

  /**
   * The floors of one month.
   *
   * @param lower quartile; a dash for few recordings, as the upper one
   */
  record FloorRow(String month, int recordings, String lower, String median, String upper) {}

  static InstrumentPage of(
      BenchInstrument instrument,
      List<ClockCheck> checks,
      List<FloorMonth> months,
      Wording words,
      Times times) {
    HealthCharts charts = new HealthCharts(words);
    Double uncertainty = instrument.clockExpandedUncertaintyPpm();
    return new InstrumentPage(
        instrument.id().toString(),
        instrument.name(),
        words
            .numbers()
            .show(instrument.clockErrorPpm(), uncertainty, ClockPage.PPM, Numbers.Sign.SHOWN)
            .text(),
        uncertainty == null
            ? words.text(
                "bench.instrument.reckoned",
                ClockPage.reckoned(ClockCheck.Before.of(instrument), words))
            : null,
        times.day(instrument.checkedOn()),
        instrument.note(),
        checks.stream().map(check -> row(check, instrument, words, times)).toList(),
        checks.isEmpty() ? null : charts.clock(checks),
        months.stream()
            .sorted(Comparator.comparing(FloorMonth::month).reversed())
            .map(month -> floor(month, words))
            .toList(),
        months.isEmpty() ? null : charts.floor(months));
  }

  private static FloorRow floor(FloorMonth month, Wording words) {
    return new FloorRow(
        month.month().toString(),
        month.recordings(),
        month.hasQuartiles() ? percent(month.quantiles().at(0.25), words) : NO_VALUE,
        percent(month.quantiles().median(), words),
        month.hasQuartiles() ? percent(month.quantiles().at(0.75), words) : NO_VALUE);
  }

  private static String percent(double value, Wording words) {
    return words.numbers().fixed(value, FLOOR_PLACES);
  }

  private static Row row(ClockCheck check, BenchInstrument instrument, Wording words, Times times) {
    Shown error = ClockPage.error(check, words);
    return new Row(
        check.id().toString(),
        times.minute(check.madeAt()),
        error,
        error.uncertainty(),
        check.against().source(),
        ClockPage.reference(check, words),
        check.madeBy(),
        check.standsIn(instrument)
            ? "bench.standing.stands"
            : check.taken() == null ? "bench.standing.open" : "bench.standing.taken");
  }
}
