package turnsheet.reading.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.access.ShopPreferences;
import turnsheet.capture.ToneMethod;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Warning;
import turnsheet.reading.CapturePlace;
import turnsheet.reading.CapturePlaces;
import turnsheet.reading.Judged;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.SeriesName;
import turnsheet.reading.StoredReading;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.ShopRules;
import turnsheet.web.Crumb;
import turnsheet.web.Numbers;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Gathers what the page of a reading shows: a dozen statements, whatever the reading. */
@Component
class ReadingView {

  private static final Numbers.Sign PLAIN = Numbers.Sign.PLAIN;

  private final Readings readings;
  private final CapturePlaces places;
  private final MachineModels models;
  private final ShopRules rules;
  private final ChannelTables channels;
  private final ShopPreferences preferences;
  private final MessageSource messages;
  private final Times times;

  ReadingView(
      Readings readings,
      CapturePlaces places,
      MachineModels models,
      ShopRules rules,
      ChannelTables channels,
      ShopPreferences preferences,
      MessageSource messages,
      Times times) {
    this.readings = readings;
    this.places = places;
    this.models = models;
    this.rules = rules;
    this.channels = channels;
    this.preferences = preferences;
    this.messages = messages;
    this.times = times;
  }

  Optional<ReadingPage> find(ReadingId id, Locale locale) {
    return readings.find(id).map(stored -> page(stored, new Wording(messages, locale)));
  }

  private ReadingPage page(StoredReading stored, Wording words) {
    Reading reading = stored.reading();
    CapturePlace place = places.find(stored.captureId()).orElseThrow();
    List<Judged> judged = Judged.all(limits(place), name -> name.of(reading), rules.get().rule());
    FigureTables tables = new FigureTables(words, reading, judged);
    Drawings drawings = new Drawings(words, stored.id());
    return new ReadingPage(
        stored.id().toString(),
        place.captureId().toString(),
        trail(place, words),
        words.text("reading.page.title", place.settingLabel(), words.said(place.condition())),
        new Sentence(words).of(name -> name.of(reading), judged),
        toneSentence(place, words),
        words.text(
            "reading.page.running",
            place.modelName() + " " + place.serialNumber(),
            place.fileName(),
            times.minute(stored.madeAt()),
            stored.id().toString()),
        tables.main(),
        tables.periods(),
        tables.recording(),
        words.rule(rules.get().rule()),
        readings
            .curve(stored.id(), SeriesName.TRACE)
            .map(curve -> drawings.trace(curve, deviationLimit(judged)))
            .orElse(null),
        readings
            .curve(stored.id(), SeriesName.SPECTRUM)
            .map(curve -> drawings.spectrum(curve, reading.lines()))
            .orElse(null),
        readings.histogram(stored.id()).map(drawings::histogram).orElse(null),
        lines(reading, words),
        stability(reading, words),
        BudgetTable.of(words, reading),
        edgeFacts(reading, words),
        signalFacts(reading, words),
        reading.warnings().stream().map(Warning::message).toList(),
        source(reading, place, words),
        method(reading, stored, words),
        channels.of(stored, words),
        others(stored));
  }

  private List<ServiceLimit> limits(CapturePlace place) {
    return models
        .find(place.modelId())
        .map((MachineModel model) -> model.limitsAt(place.settingId()))
        .orElse(List.of());
  }

  private static OptionalDouble deviationLimit(List<Judged> judged) {
    return judged.stream()
        .filter(j -> j.limit().figure() == FigureName.DEVIATION)
        .mapToDouble(j -> j.limit().upperBound())
        .findFirst();
  }

  private List<Crumb> trail(CapturePlace place, Wording words) {
    return List.of(
        new Crumb(place.modelName() + " " + place.serialNumber(), "/units/" + place.unitId()),
        new Crumb(
            words.text("reading.trail.visit", times.day(place.visitOpenedAt())),
            "/visits/" + place.visitId()),
        new Crumb(place.fileName(), "/captures/" + place.captureId()));
  }

  private List<ReadingPage.Other> others(StoredReading shown) {
    return readings.versionsOf(shown.captureId()).stream()
        .filter(v -> v.channel() == shown.reading().source().channel())
        .filter(v -> !v.id().equals(shown.id()))
        .map(v -> new ReadingPage.Other(v.id().toString(), times.minute(v.madeAt()), v.version()))
        .toList();
  }

  private static List<ReadingPage.LineRow> lines(Reading reading, Wording words) {
    return reading.lines().stream()
        .map(
            line ->
                new ReadingPage.LineRow(
                    words.numbers().show(line.rateHz(), "Hz", PLAIN),
                    words.numbers().show(line.peakPercent(), "%", PLAIN),
                    line.suspects().stream().map(s -> suspect(s, words)).toList()))
        .toList();
  }

  private static String suspect(Reading.Suspect suspect, Wording words) {
    String rate = words.numbers().fixed(suspect.rateHz(), 2);
    return suspect.harmonic() == 1
        ? words.text("reading.suspect.own", suspect.part(), rate)
        : words.text(
            "reading.suspect.harmonic", suspect.part(), Integer.toString(suspect.harmonic()), rate);
  }

  private static List<ReadingPage.StabilityRow> stability(Reading reading, Wording words) {
    Reading.Edges edges = reading.edges();
    return edges == null
        ? List.of()
        : edges.stability().stream()
            .map(
                s ->
                    new ReadingPage.StabilityRow(
                        words.numbers().show(s.tauSeconds(), null, "", PLAIN).value(),
                        words.numbers().show(s.allanDeviation(), "", PLAIN)))
            .toList();
  }

  private static List<ReadingPage.Fact> edgeFacts(Reading reading, Wording words) {
    Reading.Edges edges = reading.edges();
    if (edges == null) {
      return List.of();
    }
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact(words, "reading.edges.count", Long.toString(edges.count())));
    facts.add(fact(words, "reading.edges.missing", Long.toString(edges.missing())));
    facts.add(fact(words, "reading.edges.extra", Long.toString(edges.extra())));
    Reading.Wheel wheel = edges.wheel();
    if (wheel != null) {
      facts.add(fact(words, "reading.edges.teeth", Integer.toString(wheel.teeth())));
    }
    return facts;
  }

  private List<ReadingPage.Fact> signalFacts(Reading reading, Wording words) {
    Reading.Signal signal = reading.signal();
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact(words, "reading.signal.clipped", Long.toString(signal.clippedSamples())));
    String dropouts =
        signal.dropouts().isEmpty()
            ? words.text("reading.signal.none")
            : String.join(
                "; ",
                signal.dropouts().stream()
                    .map(
                        d ->
                            words.text(
                                "reading.signal.dropout",
                                words.numbers().fixed(d.startSeconds(), 3),
                                words.numbers().fixed(1000 * d.durationSeconds(), 1)))
                    .toList());
    facts.add(fact(words, "reading.signal.dropouts", dropouts));
    String mains =
        signal.mains().isEmpty()
            ? words.text("reading.signal.none")
            : String.join(
                "; ",
                signal.mains().stream()
                    .map(
                        m ->
                            words.text(
                                m.rateHz() % preferences.get().mainsHz() == 0
                                    ? "reading.signal.mainsLine"
                                    : "reading.signal.mainsOther",
                                words.numbers().plain(m.rateHz()),
                                words.numbers().fixed(m.relativeDb(), 1)))
                    .toList());
    facts.add(fact(words, "reading.signal.mains", mains));
    return facts;
  }

  private List<ReadingPage.Fact> source(Reading reading, CapturePlace place, Wording words) {
    Reading.Source source = reading.source();
    Double rate = source.sampleRateHz();
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact(words, "reading.source.file", place.fileName()));
    facts.add(fact(words, "reading.source.received", times.minute(place.receivedAt())));
    facts.add(fact(words, "reading.source.sha256", source.sha256()));
    facts.add(fact(words, "reading.source.format", words.said(source.format())));
    facts.add(fact(words, "reading.source.kind", kind(reading.source().kind().name(), words)));
    facts.add(fact(words, "reading.source.channel", Integer.toString(source.channel())));
    if (rate != null) {
      facts.add(fact(words, "reading.source.rate", words.numbers().plain(rate) + "\u202fHz"));
    }
    facts.add(
        fact(
            words,
            "reading.source.duration",
            words.numbers().fixed(source.durationSeconds(), 2) + "\u202fs"));
    addIfKnown(facts, words, "reading.source.instrument", place.instrumentName());
    addIfKnown(facts, words, "reading.source.medium", place.mediumName());
    addIfKnown(facts, words, "capture.tone.method", methodOf(place, words));
    return facts;
  }

  /** Practice names the method beside the figure. */
  private static String toneSentence(CapturePlace place, Wording words) {
    ToneMethod method = place.toneMethod();
    return method == null ? "" : words.text("reading.page.tone." + method.word());
  }

  private static @Nullable String methodOf(CapturePlace place, Wording words) {
    ToneMethod method = place.toneMethod();
    return method == null ? null : words.text("capture.tone." + method.word());
  }

  private List<ReadingPage.Fact> method(Reading reading, StoredReading stored, Wording words) {
    MeasureSettings settings = reading.method().settings();
    Numbers numbers = words.numbers();
    Integer teeth = settings.teeth();
    List<ReadingPage.Fact> facts = new ArrayList<>();
    facts.add(fact(words, "reading.method.version", reading.method().version()));
    facts.add(fact(words, "reading.method.madeAt", times.minute(stored.madeAt())));
    facts.add(
        fact(words, "reading.method.nominal", numbers.plain(settings.nominalHz()) + "\u202fHz"));
    facts.add(
        fact(
            words,
            "reading.method.search",
            "±\u202f" + numbers.plain(settings.searchPercent()) + "\u202f%"));
    addIfKnown(facts, words, "reading.method.teeth", teeth == null ? null : teeth.toString());
    facts.add(
        fact(
            words,
            "reading.method.clockError",
            numbers.plain(settings.clockErrorPpm()) + "\u202fppm"));
    facts.add(
        fact(
            words,
            "reading.method.clockUncertainty",
            numbers.fixed(settings.clockStandardUncertaintyPpm(), 1) + "\u202fppm"));
    facts.add(
        fact(
            words,
            "reading.method.mediumUncertainty",
            numbers.fixed(settings.mediumStandardUncertaintyPercent(), 3) + "\u202f%"));
    return facts;
  }

  private static void addIfKnown(
      List<ReadingPage.Fact> facts, Wording words, String key, @Nullable String text) {
    if (text != null) {
      facts.add(fact(words, key, text));
    }
  }

  private static String kind(String name, Wording words) {
    return words.text("reading.kind." + name.toLowerCase(Locale.ROOT));
  }

  private static ReadingPage.Fact fact(Wording words, String key, String text) {
    return new ReadingPage.Fact(words.text(key), text);
  }
}
