package turnsheet.evidence;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.RejectedException;
import turnsheet.job.JobHandler;
import turnsheet.job.JobRun;
import turnsheet.reading.Readings;
import turnsheet.reading.StoredReading;

/**
 * Looks closer at the measured channels of a capture. Run twice, it leaves one document of each:
 * the same bytes and choices give the same evidence, and the second takes the place of the first.
 */
@Component
class EvidenceJob implements JobHandler {

  private static final Logger log = LoggerFactory.getLogger(EvidenceJob.class);

  private final Captures captures;
  private final CaptureStore store;
  private final Readings readings;
  private final Measurement measurement;
  private final List<Gatherer> gatherers;
  private final EvidenceStore evidence;

  EvidenceJob(
      Captures captures,
      CaptureStore store,
      Readings readings,
      Measurement measurement,
      ObjectProvider<Gatherer> gatherers,
      EvidenceStore evidence) {
    this.captures = captures;
    this.store = store;
    this.readings = readings;
    this.measurement = measurement;
    this.gatherers = gatherers.orderedStream().toList();
    this.evidence = evidence;
  }

  @Override
  public String name() {
    return Evidence.JOB;
  }

  @Override
  public void run(JobRun run) throws IOException {
    CaptureId id = new CaptureId(run.subject());
    Capture capture = captures.find(id).orElse(null);
    CaptureChoices choices = capture == null ? null : capture.choices();
    if (capture == null || choices == null || !store.holds(capture.bytes())) {
      log.info("capture {} cannot be looked at", id.value());
      return;
    }
    List<StoredReading> channels = readings.ofChannels(id);
    for (int i = 0; i < channels.size(); i++) {
      double done = (double) i / channels.size();
      double share = 1.0 / channels.size();
      Reading reading = channels.get(i).reading();
      CaptureChoices chosen = choices.onChannel(reading.source().channel());
      Material material =
          new Material(
              store.open(capture.bytes()),
              capture.bytes().sha256(),
              measurement,
              chosen.options(),
              chosen.settings(),
              reading);
      evidence.keep(
          id,
          new EvidenceDocument(
              EvidenceDocument.VERSION,
              material.sha256(),
              material.settings().channel(),
              material.settings(),
              sections(material, fraction -> run.progress(done + share * fraction))));
    }
  }

  private List<Section> sections(Material material, Progress progress) throws IOException {
    CaptureKind kind = material.settings().kind();
    List<Gatherer> asked = gatherers.stream().filter(g -> g.appliesTo(kind)).toList();
    List<Section> sections = new ArrayList<>();
    for (Gatherer gatherer : asked) {
      double done = (double) sections.size() / asked.size();
      progress.reached(done);
      sections.add(section(gatherer, material, f -> progress.reached(done + f / asked.size())));
    }
    return sections;
  }

  private static Section section(Gatherer gatherer, Material material, Progress progress)
      throws IOException {
    try {
      return Section.found(gatherer.name(), gatherer.gather(material, progress));
    } catch (RejectedException e) {
      return Section.refused(gatherer.name(), e.rejection());
    }
  }
}
