package turnsheet.trial.web;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.core.diagnose.filter.FilterDesign;
import turnsheet.core.diagnose.filter.FilterKind;
import turnsheet.core.diagnose.filter.TrialResult;
import turnsheet.job.Job;
import turnsheet.job.JobState;
import turnsheet.reading.CapturePlace;
import turnsheet.reading.CapturePlaces;
import turnsheet.trial.KeptTrial;
import turnsheet.trial.TrialDesk;
import turnsheet.web.Crumb;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Gathers what the pages of trials show. */
@Component
class TrialView {

  private static final String NONE = "\u2013";

  private final TrialDesk desk;
  private final CapturePlaces places;
  private final MessageSource messages;
  private final Times times;

  TrialView(TrialDesk desk, CapturePlaces places, MessageSource messages, Times times) {
    this.desk = desk;
    this.places = places;
    this.messages = messages;
    this.times = times;
  }

  TrialPage.Overview overview(Capture capture, Locale locale) {
    Wording words = new Wording(messages, locale);
    CapturePlace place = places.find(capture.id()).orElseThrow();
    return new TrialPage.Overview(
        capture.id().toString(),
        trail(place, words),
        words.text("trial.list.title", place.fileName()),
        !desk.holds(capture),
        desk.ofCapture(capture.id()).stream().map(trial -> kept(trial, words)).toList());
  }

  private TrialPage.Kept kept(KeptTrial trial, Wording words) {
    Job job = desk.job(trial);
    TrialResult result = trial.result();
    TrialResult.Choice choice = result == null ? null : result.choice();
    String standing =
        result != null
            ? choice == null
                ? words.text("trial.list.none")
                : name(result.rows().get(choice.row()).design(), words)
            : trial.refusal() != null
                ? words.text("trial.list.refused")
                : words.text("trial.list." + job.state().name().toLowerCase(Locale.ROOT));
    return new TrialPage.Kept(
        trial.id().toString(),
        times.minute(trial.orderedAt()),
        words.text("trial.list.count", Integer.toString(trial.order().count())),
        standing);
  }

  /**
   * The page of a trial.
   *
   * @param wanted row whose circuit is to be open; null for the chosen one
   */
  TrialPage page(KeptTrial trial, @Nullable Integer wanted, Locale locale) {
    Wording words = new Wording(messages, locale);
    CapturePlace place = places.find(trial.capture()).orElseThrow();
    Job job = desk.job(trial);
    List<Crumb> trail = new ArrayList<>(trail(place, words));
    trail.add(
        new Crumb(words.text("trial.list.crumb"), "/captures/" + trial.capture() + "/trials"));
    TrialResult result = trial.result();
    String refusal =
        trial.refusal() != null
            ? trial.refusal().message()
            : job.state() == JobState.FAILED ? job.message() : null;
    return new TrialPage(
        trial.id().toString(),
        trial.capture().toString(),
        trail,
        words.text("trial.page.title", place.fileName()),
        words.text(
            "trial.page.running",
            place.modelName() + " " + place.serialNumber(),
            place.fileName(),
            times.minute(trial.orderedAt()),
            trial.id().toString()),
        job.state().isOver()
            ? null
            : new TrialPage.Underway(job.state() == JobState.RUNNING, job.progress()),
        result == null && job.state() == JobState.CANCELLED,
        refusal,
        result == null ? null : found(trial, result, wanted, words));
  }

  private static List<Crumb> trail(CapturePlace place, Wording words) {
    return List.of(
        new Crumb(place.modelName() + " " + place.serialNumber(), "/units/" + place.unitId()),
        new Crumb(place.fileName(), "/captures/" + place.captureId()),
        new Crumb(words.text("trial.list.reading"), "/captures/" + place.captureId() + "/reading"));
  }

  private TrialPage.Found found(
      KeptTrial trial, TrialResult result, @Nullable Integer wanted, Wording words) {
    TrialResult.Choice choice = result.choice();
    int chosen = choice == null ? -1 : choice.row();
    int open = wanted != null && wanted < result.rows().size() ? wanted : chosen;
    boolean drawn = open > 0;
    List<TrialPage.Row> rows = new ArrayList<>();
    for (int i = 0; i < result.rows().size(); i++) {
      rows.add(row(result.rows().get(i), i, chosen, open, words));
    }
    return new TrialPage.Found(
        sentence(result, words),
        facts(result, words),
        maps(result, words),
        rows,
        chosen,
        drawn
            ? new CircuitView(desk.circuit(trial, open), words)
                .part(name(result.rows().get(open).design(), words))
            : null);
  }

  private String sentence(TrialResult result, Wording words) {
    TrialResult.Choice choice = result.choice();
    if (choice == null) {
      return words.text("trial.choice.none");
    }
    Values values = new Values(words);
    return words.text(
        switch (choice.reason()) {
          case NO_FILTER -> "trial.choice.noFilter";
          case FEWEST_POLES -> "trial.choice.fewestPoles";
          case SIGNAL_LOST -> "trial.choice.signalLost";
        },
        name(result.rows().get(choice.row()).design(), words),
        Integer.toString(choice.kept()),
        values.three(choice.limitMicroseconds()),
        values.three(choice.errorMicroseconds()),
        values.three(choice.leastMicroseconds()));
  }

  private static List<TrialPage.Fact> facts(TrialResult result, Wording words) {
    Values values = new Values(words);
    return List.of(
        new TrialPage.Fact(
            words.text("trial.fact.used"),
            words.text(
                "trial.fact.usedValue",
                values.three(result.seconds()),
                Long.toString(result.pulses()),
                words.numbers().fixed(result.toothHz(), 2))),
        new TrialPage.Fact(
            words.text("trial.fact.noise"),
            words.text("trial.fact.decibels", values.decibels(result.noiseDb()))),
        new TrialPage.Fact(
            words.text("trial.fact.hum"),
            result.hum().isEmpty()
                ? words.text("trial.fact.noHum")
                : String.join("; ", result.hum().stream().map(hum -> hum(hum, words)).toList())),
        new TrialPage.Fact(
            words.text("trial.fact.comparator"),
            words.text(
                "trial.fact.comparatorValue",
                words.numbers().plain(result.plan().hysteresisPercent()),
                words.numbers().plain(result.plan().offsetPercent()))),
        new TrialPage.Fact(
            words.text("trial.fact.speeds"),
            words.text(
                "trial.fact.speedsValue",
                values.three(result.plan().lowestHz()),
                values.three(result.plan().highestHz()))));
  }

  private static String hum(TrialResult.Hum hum, Wording words) {
    return words.text(
        "trial.fact.line",
        words.numbers().plain(hum.rateHz()),
        new Values(words).decibels(hum.relativeDb()));
  }

  private static List<TrialPage.Map> maps(TrialResult result, Wording words) {
    TrialMap map = new TrialMap(result, words);
    List<TrialPage.Map> maps = new ArrayList<>();
    for (FilterKind kind : FilterKind.values()) {
      String title = words.text("trial.kind." + kind.name());
      String svg = map.of(kind, title, words.text("trial.map.description"));
      if (svg != null) {
        maps.add(new TrialPage.Map(title, svg));
      }
    }
    return maps;
  }

  private static TrialPage.Row row(
      TrialResult.Row row, int number, int chosen, int open, Wording words) {
    Values values = new Values(words);
    return new TrialPage.Row(
        number,
        name(row.design(), words),
        number == chosen,
        number == open,
        row.design() != null,
        values.decibels(row.signalDb()),
        row.hum().stream()
            .max(Comparator.comparingDouble(TrialResult.Hum::relativeDb))
            .map(hum -> hum(hum, words))
            .orElse(NONE),
        values.three(row.delayMicroseconds()),
        edges(row.bare(), words),
        edges(row.compared(), words));
  }

  private static TrialPage.EdgeCells edges(TrialResult.Edges edges, Wording words) {
    Values values = new Values(words);
    return new TrialPage.EdgeCells(
        Long.toString(edges.lost()),
        Long.toString(edges.extra()),
        orNone(edges.noiseMicroseconds(), values),
        orNone(edges.noisePercent(), values),
        orNone(edges.predictedMicroseconds(), values),
        orNone(edges.humMicroseconds(), values),
        speed(edges.lowest(), words),
        speed(edges.highest(), words));
  }

  private static String orNone(@Nullable Double value, Values values) {
    return value == null ? NONE : values.three(value);
  }

  private static String speed(TrialResult.Speed speed, Wording words) {
    return speed.survives()
        ? words.text("trial.speed.kept", new Values(words).decibels(speed.responseDb()))
        : words.text("trial.speed.lost", Long.toString(speed.lost()), Long.toString(speed.extra()));
  }

  private static String name(@Nullable FilterDesign design, Wording words) {
    if (design == null) {
      return words.text("trial.design.none");
    }
    Values values = new Values(words);
    Double low = design.lowHz();
    Double high = design.highHz();
    return words.text(
        "trial.design." + design.kind().name(),
        words.text("trial.family." + design.family().name()),
        Integer.toString(design.poles()),
        values.hertz(low != null ? low : high != null ? high : 0),
        values.hertz(high != null ? high : 0));
  }
}
