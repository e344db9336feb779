package turnsheet.bench.web;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.bench.ClockCheck;
import turnsheet.core.signal.Warning;
import turnsheet.shop.BenchInstrument;
import turnsheet.web.Numbers;
import turnsheet.web.Shown;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/**
 * The page of one check of a clock.
 *
 * @param lead what was found, in a sentence
 * @param record what stood in the record, or stands there as long as the check is not taken
 * @param found the new values in the same columns
 * @param remarks what to think of before it is taken, and what the core says about the recording
 * @param taken when and by whom; null as long as it was not taken
 * @param facts how it came about
 */
record ClockPage(
    String instrumentId,
    String instrumentName,
    String id,
    String at,
    String lead,
    Values record,
    Values found,
    List<String> remarks,
    @Nullable String taken,
    List<Fact> facts,
    String digest) {

  static final String PPM = "ppm";

  /**
   * What is said of a clock.
   *
   * @param uncertainty empty where unknown
   * @param checkedOn empty where never
   */
  record Values(Shown error, String uncertainty, String checkedOn) {}

  /**
   * One thing known.
   *
   * @param name a message key
   */
  record Fact(String name, String text) {}

  static ClockPage of(BenchInstrument instrument, ClockCheck check, Wording words, Times times) {
    ClockCheck.Taken taken = check.taken();
    ClockCheck.Before before = taken == null ? ClockCheck.Before.of(instrument) : taken.before();
    Shown error = error(check, words);
    return new ClockPage(
        instrument.id().toString(),
        instrument.name(),
        check.id().toString(),
        times.minute(check.madeAt()),
        lead(instrument, check, words),
        values(before, words, times),
        new Values(error, error.uncertainty(), times.day(check.madeAt())),
        remarks(check, before, words),
        taken == null
            ? null
            : words.text("bench.check.taken", times.minute(taken.at()), taken.by()),
        facts(check, words),
        check.recording().file().bytes().sha256());
  }

  static Shown error(ClockCheck check, Wording words) {
    return words
        .numbers()
        .show(
            check.found().errorPpm(),
            check.found().expandedUncertaintyPpm(),
            PPM,
            Numbers.Sign.SHOWN);
  }

  /** Value of the reference and how far it is trusted. */
  static String reference(ClockCheck check, Wording words) {
    var reference = check.against().reference();
    return words.text(
        "bench.check.reference",
        words.numbers().plain(reference.hertz()),
        words.numbers().plain(reference.expandedUncertaintyPpm()));
  }

  /** The expanded uncertainty that measurements reckon with. */
  static String reckoned(ClockCheck.Before before, Wording words) {
    return plusMinus(before.reckonedExpandedPpm(), words);
  }

  private static String lead(BenchInstrument instrument, ClockCheck check, Wording words) {
    double error = check.found().errorPpm();
    boolean told = Math.abs(error) > check.found().expandedUncertaintyPpm();
    return words.text(
        told ? error > 0 ? "bench.check.fast" : "bench.check.slow" : "bench.check.true",
        instrument.name(),
        error(check, words).text());
  }

  private static Values values(ClockCheck.Before before, Wording words, Times times) {
    Shown error =
        words
            .numbers()
            .show(before.errorPpm(), before.expandedUncertaintyPpm(), PPM, Numbers.Sign.SHOWN);
    return new Values(error, error.uncertainty(), times.day(before.checkedOn()));
  }

  private static List<String> remarks(ClockCheck check, ClockCheck.Before before, Wording words) {
    List<String> remarks = new ArrayList<>();
    String own = plusMinus(check.found().expandedUncertaintyPpm(), words);
    boolean open = check.taken() == null;
    if (open && check.isWorseThan(before)) {
      remarks.add(words.text("bench.check.worse", own, reckoned(before, words)));
    }
    if (check.contradicts(before)) {
      remarks.add(
          words.text("bench.check.contradicts")
              + (open ? " " + words.text("bench.check.again") : ""));
    }
    if (check.isShort()) {
      remarks.add(
          words.text(
              "bench.check.short", words.numbers().fixed(check.recording().durationSeconds(), 1)));
    }
    check.found().warnings().stream().map(Warning::message).forEach(remarks::add);
    return List.copyOf(remarks);
  }

  private static List<Fact> facts(ClockCheck check, Wording words) {
    ClockCheck.Found found = check.found();
    ClockCheck.Recording recording = check.recording();
    Double rate = recording.sampleRateHz();
    List<Fact> facts = new ArrayList<>();
    facts.add(new Fact("bench.check.source", check.against().source()));
    facts.add(new Fact("bench.check.frequency", reference(check, words)));
    facts.add(
        new Fact(
            "bench.check.measured",
            words
                .numbers()
                .show(
                    found.measuredHz(),
                    found.measuredExpandedUncertaintyHz(),
                    "Hz",
                    Numbers.Sign.PLAIN)
                .text()));
    facts.add(new Fact("bench.check.recording", plusMinus(2 * found.recordingPpm(), words)));
    facts.add(
        new Fact(
            "bench.check.keeping",
            found.keepingPpm() == 0
                ? words.text("bench.check.nothing")
                : "\u00b1\u202f" + words.numbers().plain(found.keepingPpm()) + "\u202f" + PPM));
    facts.add(new Fact("bench.check.file", recording.file().name()));
    facts.add(
        new Fact(
            "bench.check.format",
            words.text(
                "bench.check.formatText",
                recording.format(),
                Integer.toString(recording.channel()),
                words.numbers().fixed(recording.durationSeconds(), 1))));
    if (rate != null) {
      facts.add(new Fact("bench.check.sampleRate", words.numbers().plain(rate)));
    }
    facts.add(new Fact("bench.check.by", check.madeBy()));
    facts.add(new Fact("bench.check.method", found.methodVersion()));
    return List.copyOf(facts);
  }

  /** Two digits, as uncertainties are written. */
  private static String plusMinus(double ppm, Wording words) {
    return "\u00b1\u202f"
        + words.numbers().show(0, ppm, "", Numbers.Sign.PLAIN).uncertainty()
        + "\u202f"
        + PPM;
  }
}
