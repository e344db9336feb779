package turnsheet.reading.web;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.ToneMethod;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Reading;
import turnsheet.reading.CapturePlace;
import turnsheet.web.Numbers;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** What a reading says beside its figures: names with one text each. */
final class ReadingFacts {

  private final Wording words;
  private final Times times;
  private final int mainsHz;

  /**
   * @param mainsHz of the shop's mains: its multiples count as hum
   */
  ReadingFacts(Wording words, Times times, int mainsHz) {
    this.words = words;
    this.times = times;
    this.mainsHz = mainsHz;
  }

  /** Counts of edges; empty for a tone. */
  List<ReadingPage.Fact> edges(Reading reading) {
    Reading.Edges edges = reading.edges();
    if (edges == null) {
      return List.of();
    }
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact("reading.edges.count", Long.toString(edges.count())));
    facts.add(fact("reading.edges.missing", Long.toString(edges.missing())));
    facts.add(fact("reading.edges.extra", Long.toString(edges.extra())));
    Reading.Wheel wheel = edges.wheel();
    if (wheel != null) {
      facts.add(fact("reading.edges.teeth", Integer.toString(wheel.teeth())));
    }
    return facts;
  }

  /** What could spoil a measurement, found or not. */
  List<ReadingPage.Fact> signal(Reading reading) {
    Reading.Signal signal = reading.signal();
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact("reading.signal.clipped", Long.toString(signal.clippedSamples())));
    facts.add(fact("reading.signal.dropouts", listed(signal.dropouts(), this::dropout)));
    facts.add(fact("reading.signal.mains", listed(signal.mains(), this::mainsLine)));
    return facts;
  }

  /** What was measured. */
  List<ReadingPage.Fact> source(Reading reading, CapturePlace place) {
    Reading.Source source = reading.source();
    Double rate = source.sampleRateHz();
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact("reading.source.file", place.fileName()));
    facts.add(fact("reading.source.received", times.minute(place.receivedAt())));
    facts.add(fact("reading.source.sha256", source.sha256()));
    facts.add(fact("reading.source.format", words.said(source.format())));
    facts.add(fact("reading.source.kind", kind(source.kind())));
    facts.add(fact("reading.source.channel", Integer.toString(source.channel())));
    if (rate != null) {
      facts.add(fact("reading.source.rate", words.numbers().plain(rate) + "\u202fHz"));
    }
    facts.add(
        fact(
            "reading.source.duration",
            words.numbers().fixed(source.durationSeconds(), 2) + "\u202fs"));
    addIfKnown(facts, "reading.source.instrument", place.instrumentName());
    addIfKnown(facts, "reading.source.medium", place.mediumName());
    addIfKnown(facts, "capture.tone.method", methodOf(place));
    return facts;
  }

  private @Nullable String methodOf(CapturePlace place) {
    ToneMethod method = place.toneMethod();
    return method == null ? null : words.text("capture.tone." + method.word());
  }

  /** By what it was measured. */
  List<ReadingPage.Fact> method(Reading reading, Instant madeAt) {
    MeasureSettings settings = reading.method().settings();
    Numbers numbers = words.numbers();
    Integer teeth = settings.teeth();
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact("reading.method.version", reading.method().version()));
    facts.add(fact("reading.method.madeAt", times.minute(madeAt)));
    facts.add(fact("reading.method.nominal", numbers.plain(settings.nominalHz()) + "\u202fHz"));
    facts.add(
        fact(
            "reading.method.search",
            "±\u202f" + numbers.plain(settings.searchPercent()) + "\u202f%"));
    addIfKnown(facts, "reading.method.teeth", teeth == null ? null : teeth.toString());
    facts.add(
        fact("reading.method.clockError", numbers.plain(settings.clockErrorPpm()) + "\u202fppm"));
    facts.add(
        fact(
            "reading.method.clockUncertainty",
            numbers.fixed(settings.clockStandardUncertaintyPpm(), 1) + "\u202fppm"));
    facts.add(
        fact(
            "reading.method.mediumUncertainty",
            numbers.fixed(settings.mediumStandardUncertaintyPercent(), 3) + "\u202f%"));
    return facts;
  }

  private void addIfKnown(List<ReadingPage.Fact> facts, String key, @Nullable String text) {
    if (text != null) {
      facts.add(fact(key, text));
    }
  }

  private String kind(CaptureKind kind) {
    return words.text("reading.kind." + kind.name().toLowerCase(Locale.ROOT));
  }

  private ReadingPage.Fact fact(String key, String text) {
    return new ReadingPage.Fact(words.text(key), text);
  }

  private <T> String listed(List<T> found, Function<T, String> text) {
    return found.isEmpty()
        ? words.text("reading.signal.none")
        : found.stream().map(text).collect(Collectors.joining("; "));
  }

  private String dropout(Reading.Dropout dropout) {
    return words.text(
        "reading.signal.dropout",
        words.numbers().fixed(dropout.startSeconds(), 3),
        words.numbers().fixed(1000 * dropout.durationSeconds(), 1));
  }

  private String mainsLine(Reading.MainsLine line) {
    return words.text(
        line.rateHz() % mainsHz == 0 ? "reading.signal.mainsLine" : "reading.signal.mainsOther",
        words.numbers().plain(line.rateHz()),
        words.numbers().fixed(line.relativeDb(), 1));
  }
}
