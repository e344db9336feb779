package turnsheet.evidence.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureStore;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.evidence.Evidence;
import turnsheet.evidence.EvidenceDocument;
import turnsheet.evidence.Section;
import turnsheet.evidence.StoredEvidence;
import turnsheet.job.Job;
import turnsheet.job.JobState;
import turnsheet.reading.CapturePlace;
import turnsheet.reading.CapturePlaces;
import turnsheet.reading.Readings;
import turnsheet.reading.StoredReading;
import turnsheet.shop.MachineModels;
import turnsheet.shop.PartBasis;
import turnsheet.web.Crumb;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Gathers what the page of a capture's evidence shows. */
@Component
class EvidenceView {

  private final Evidence evidence;
  private final Readings readings;
  private final CapturePlaces places;
  private final CaptureStore store;
  private final MachineModels models;
  private final Map<String, SectionView> views;
  private final MessageSource messages;
  private final Times times;

  EvidenceView(
      Evidence evidence,
      Readings readings,
      CapturePlaces places,
      CaptureStore store,
      MachineModels models,
      ObjectProvider<SectionView> views,
      MessageSource messages,
      Times times) {
    this.evidence = evidence;
    this.readings = readings;
    this.places = places;
    this.store = store;
    this.models = models;
    this.views = views.stream().collect(Collectors.toMap(SectionView::name, Function.identity()));
    this.messages = messages;
    this.times = times;
  }

  /**
   * The page.
   *
   * @param synchronous what the visitor says of the motor; null for what the model's parts say
   * @param wanted channel; where it was not measured, or null, the one that stands for the capture
   * @return empty where the capture has no reading
   */
  Optional<EvidencePage> find(
      Capture capture, @Nullable Integer wanted, @Nullable Boolean synchronous, Locale locale) {
    List<StoredReading> channels = readings.ofChannels(capture.id());
    return channels.stream()
        .filter(r -> wanted != null && r.reading().source().channel() == wanted)
        .findFirst()
        .or(() -> readings.newestOf(capture.id()))
        .map(shown -> page(capture, channels, shown, synchronous, new Wording(messages, locale)));
  }

  private EvidencePage page(
      Capture capture,
      List<StoredReading> channels,
      StoredReading shown,
      @Nullable Boolean said,
      Wording words) {
    CapturePlace place = places.find(capture.id()).orElseThrow();
    boolean synchronous = said == null ? isSynchronous(place) : said;
    Reading reading = shown.reading();
    int channel = reading.source().channel();
    StoredEvidence stored =
        evidence.of(capture.id()).stream()
            .filter(e -> e.document().channel() == channel)
            .findFirst()
            .orElse(null);
    Job job = evidence.job(capture.id()).orElse(null);
    SectionView.Beside beside =
        new SectionView.Beside(capture.id().toString(), reading, synchronous);
    CaptureKind kind = reading.source().kind();
    return new EvidencePage(
        capture.id().toString(),
        List.of(
            new Crumb(place.modelName() + " " + place.serialNumber(), "/units/" + place.unitId()),
            new Crumb(place.fileName(), "/captures/" + place.captureId()),
            new Crumb(words.text("evidence.page.reading"), "/readings/" + shown.id())),
        words.text("evidence.page.title", place.fileName()),
        stored == null
            ? words.text("evidence.page.lead")
            : words.text("evidence.page.made", times.minute(stored.madeAt())),
        channel,
        channels.stream().map(r -> r.reading().source().channel()).toList(),
        synchronous,
        job == null || job.state().isOver()
            ? null
            : new EvidencePage.Underway(job.state() == JobState.RUNNING, job.progress()),
        job != null && job.state() == JobState.FAILED ? job.message() : null,
        notes(stored, capture.choices(), channel, words),
        stored != null,
        !store.holds(capture.bytes()),
        evidence.holdings().stream()
            .filter(h -> h.kinds().contains(kind))
            .flatMap(h -> Optional.ofNullable(views.get(h.name())).stream())
            .map(view -> part(view, stored, beside, words))
            .toList(),
        List.of(CaptureKind.values()).stream()
            .map(k -> words.text("capture.kind." + k.name()))
            .toList(),
        holdings(words));
  }

  /** Whether the model has a motor on the mains that does not fall behind them. */
  private boolean isSynchronous(CapturePlace place) {
    return models.find(place.modelId()).stream()
        .flatMap(model -> model.parts().stream())
        .anyMatch(
            part ->
                part.kind() == PartKind.MOTOR
                    && part.basis() == PartBasis.MAINS_POLE_PAIRS
                    && part.details().slipHighPercent() == null);
  }

  private static List<String> notes(
      @Nullable StoredEvidence stored,
      @Nullable CaptureChoices choices,
      int channel,
      Wording words) {
    List<String> notes = new ArrayList<>();
    if (stored != null) {
      EvidenceDocument document = stored.document();
      if (choices != null && !document.settings().equals(choices.onChannel(channel).settings())) {
        notes.add(words.text("evidence.page.otherSettings"));
      } else if (!document.version().equals(EvidenceDocument.VERSION)) {
        notes.add(words.text("evidence.page.older"));
      }
    }
    return notes;
  }

  private static EvidencePage.Part part(
      SectionView view, @Nullable StoredEvidence stored, SectionView.Beside beside, Wording words) {
    Optional<Section> section =
        Optional.ofNullable(stored).flatMap(s -> s.document().section(view.name()));
    Rejection refusal = section.map(Section::refusal).orElse(null);
    return new EvidencePage.Part(
        view.name(),
        view.title(words),
        view.what(words),
        view.template(),
        section.filter(s -> s.found() != null).map(s -> view.page(s, beside, words)).orElse(null),
        refusal == null ? null : refusal.message());
  }

  private List<EvidencePage.Row> holdings(Wording words) {
    List<EvidencePage.Row> rows = new ArrayList<>();
    for (Evidence.Holding holding : evidence.holdings()) {
      SectionView view = views.get(holding.name());
      if (view != null) {
        rows.add(
            new EvidencePage.Row(
                view.title(words),
                view.what(words),
                List.of(CaptureKind.values()).stream().map(holding.kinds()::contains).toList()));
      }
    }
    return List.copyOf(rows);
  }
}
