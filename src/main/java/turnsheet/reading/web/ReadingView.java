package turnsheet.reading.web;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.access.ShopPreferences;
import turnsheet.capture.ToneMethod;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Warning;
import turnsheet.reading.CapturePlace;
import turnsheet.reading.CapturePlaces;
import turnsheet.reading.Judged;
import turnsheet.reading.MachineInCapture;
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
    CapturePlace place = places.find(stored.captureId()).orElseThrow();
    Reading reading = withSuspectsOfNow(stored.reading(), place);
    List<Judged> judged = Judged.all(limits(place), name -> name.of(reading), rules.get().rule());
    FigureTables tables = new FigureTables(words, reading, judged);
    Drawings drawings = new Drawings(words, stored.id());
    ReadingFacts facts = new ReadingFacts(words, times, preferences.get().mainsHz());
    return new ReadingPage(
        stored.id().toString(),
        place.captureId().toString(),
        place.visitId().toString(),
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
        facts.edges(reading),
        facts.signal(reading),
        reading.warnings().stream().map(Warning::message).toList(),
        facts.source(reading, place),
        facts.method(reading, stored.madeAt()),
        channels.of(stored, words),
        others(stored),
        reading.source().kind() == CaptureKind.TACHOMETER);
  }

  /** The parts of the model may have been put right since. */
  private Reading withSuspectsOfNow(Reading reading, CapturePlace place) {
    return models
        .find(place.modelId())
        .flatMap(
            m -> MachineInCapture.of(m, place.settingId(), reading, preferences.get().mainsHz()))
        .map(machine -> machine.suspectsIn(reading))
        .orElse(reading);
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
                    line.suspects().stream().map(new CauseWords(words)::shortly).toList()))
        .toList();
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

  /** Practice names the method beside the figure. */
  private static String toneSentence(CapturePlace place, Wording words) {
    ToneMethod method = place.toneMethod();
    return method == null ? "" : words.text("reading.page.tone." + method.word());
  }
}
