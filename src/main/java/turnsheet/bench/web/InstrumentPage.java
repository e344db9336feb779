package turnsheet.bench.web;

import java.util.List;
import java.util.Objects;
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
 */
record InstrumentPage(
    String id,
    String name,
    String clock,
    @Nullable String reckoned,
    String checkedOn,
    String note,
    List<Row> checks) {

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

  static InstrumentPage of(
      BenchInstrument instrument, List<ClockCheck> checks, Wording words, Times times) {
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
        Objects.toString(instrument.checkedOn(), ""),
        instrument.note(),
        checks.stream().map(check -> row(check, instrument, words, times)).toList());
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
