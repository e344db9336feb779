package turnsheet.evidence;

import java.util.List;
import java.util.Optional;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.capture.MissingFile;
import turnsheet.core.measure.CaptureKind;
import turnsheet.job.Job;
import turnsheet.job.Jobs;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Orders a closer look at captures and tells what came of it. */
@Service
public class Evidence {

  /** Name of the job that looks closer at the capture which is its subject. */
  public static final String JOB = "evidence";

  private final Captures captures;
  private final CaptureStore store;
  private final EvidenceStore evidence;
  private final List<Gatherer> gatherers;
  private final Jobs jobs;
  private final TransactionOperations transactions;

  Evidence(
      Captures captures,
      CaptureStore store,
      EvidenceStore evidence,
      ObjectProvider<Gatherer> gatherers,
      Jobs jobs,
      TransactionOperations transactions) {
    this.captures = captures;
    this.store = store;
    this.evidence = evidence;
    this.gatherers = gatherers.orderedStream().toList();
    this.jobs = jobs;
    this.transactions = transactions;
  }

  /**
   * Orders a closer look; where one is under way already, nothing more happens.
   *
   * @throws NotFoundException if there is no such capture
   * @throws RefusedRequestException if it has not been measured, or its file is not here
   */
  public void look(CaptureId id) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    if (capture.state() != CaptureState.MEASURED) {
      throw new RefusedRequestException(
          "notMeasured", "The recording has not been measured yet: confirm and measure it first.");
    }
    if (!store.holds(capture.bytes())) {
      throw MissingFile.refused();
    }
    transactions.executeWithoutResult(
        status -> {
          if (job(id).map(job -> job.state().isOver()).orElse(true)) {
            jobs.enqueue(JOB, id.value());
          }
        });
  }

  /** The latest look that was ordered. */
  public Optional<Job> job(CaptureId id) {
    return jobs.ofSubject(id.value()).stream().filter(job -> job.name().equals(JOB)).findFirst();
  }

  /** The latest evidence of each channel, in the order of the channels. */
  public List<StoredEvidence> of(CaptureId id) {
    return evidence.ofCapture(id);
  }

  /** Which kinds of capture can hold what: names in the order of the sections. */
  public List<Holding> holdings() {
    return gatherers.stream()
        .map(
            g ->
                new Holding(
                    g.name(), List.of(CaptureKind.values()).stream().filter(g::appliesTo).toList()))
        .toList();
  }

  /** Which kinds of capture can hold one kind of evidence. */
  public record Holding(String name, List<CaptureKind> kinds) {

    public Holding {
      kinds = List.copyOf(kinds);
    }
  }
}
