package turnsheet.capture;

import java.io.IOException;
import java.io.InputStream;
import java.time.Clock;
import java.time.temporal.ChronoUnit;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.signal.Rejection;
import turnsheet.job.Jobs;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Takes captures in, from the first byte to the order to measure. */
@Service
public class Intake {

  /** Name of the job that measures the capture which is its subject. */
  public static final String MEASURE = "measure";

  private static final Logger log = LoggerFactory.getLogger(Intake.class);

  private final CaptureStore store;
  private final Captures captures;
  private final Looker looker;
  private final Shelf shelf;
  private final MeasuredChannels channels;
  private final Jobs jobs;
  private final TransactionTemplate transaction;
  private final Clock clock;

  Intake(
      CaptureStore store,
      Captures captures,
      Looker looker,
      Shelf shelf,
      MeasuredChannels channels,
      Jobs jobs,
      TransactionTemplate transaction,
      Clock clock) {
    this.store = store;
    this.captures = captures;
    this.looker = looker;
    this.shelf = shelf;
    this.channels = channels;
    this.jobs = jobs;
    this.transaction = transaction;
    this.clock = clock;
  }

  /**
   * Stores a file and then looks at it. A file that cannot be used becomes a refused capture.
   *
   * @param receivedBy name of the account that brings it
   * @param in read to its end; the caller closes it
   * @throws NotFoundException if something that the key names does not exist
   * @throws RefusedRequestException if the visit is closed, the speed setting foreign, or the name
   *     odd; nothing is read then
   * @throws BrokenUploadException if the stream breaks; nothing is stored then
   * @throws StoreException if the disk does not take the bytes; nothing is stored then
   */
  public Capture receive(CaptureKey key, String fileName, String receivedBy, InputStream in)
      throws BrokenUploadException, StoreException {
    Surroundings around = shelf.of(key);
    refuseClosed(around);
    String name = FileName.checked(fileName);
    StoredBytes bytes = store.receive(in);
    Looker.Result result = look(bytes, ReadOptions.none(), around);
    Capture received = received(key, name, receivedBy, bytes, result);
    captures.add(received);
    return received;
  }

  /**
   * Looks again with what the bench has decided; the capture is then recognised or refused.
   *
   * @throws RefusedRequestException if the capture is being measured or has been
   */
  public Capture lookAgain(CaptureId id, ReadOptions options) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    Looker.Result result = look(capture.bytes(), options, shelf.of(capture.key()));
    if (!note(id, result)) {
      throw busy();
    }
    return captures.find(id).orElseThrow();
  }

  /**
   * Confirms what was recognised and orders the measurement. Where the wish makes the file
   * unusable, the capture is refused and nothing is ordered. Nothing is ordered either where the
   * wish only takes another channel that was measured along with the present one: it then stands
   * for the capture at once.
   *
   * @throws RefusedRequestException if the wish does not fit the file, no nominal rate is known, or
   *     the capture is being measured
   */
  public Capture confirm(CaptureId id, Wish wish) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    if (capture.state() == CaptureState.QUEUED) {
      throw busy();
    }
    Surroundings around = shelf.of(capture.key());
    Looked looked = capture.looked();
    if (looked == null || !looked.options().equals(wish.options())) {
      Looker.Result result = look(capture.bytes(), wish.options(), around);
      if (result instanceof Looker.Unusable unusable) {
        if (!note(id, result)) {
          throw new RefusedRequestException(unusable.why().code(), unusable.why().message());
        }
        return captures.find(id).orElseThrow();
      }
      looked = ((Looker.Seen) result).looked();
    }
    CaptureChoices choices = Choosing.choices(wish, looked, around);
    if (!chosen(capture, looked, choices)) {
      order(id, looked, choices);
    }
    return captures.find(id).orElseThrow();
  }

  /**
   * Corrects how the tone came onto what was played.
   *
   * @param method null where it is not known
   * @throws RefusedRequestException if the visit is closed, or the capture is not of a tone
   */
  public Capture nameMethod(CaptureId id, @Nullable ToneMethod method) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    refuseClosed(shelf.of(capture.key()));
    if (method != null && !capture.mayBeTone()) {
      throw new RefusedRequestException(
          "notATone", "Only a played tone was recorded here or elsewhere: this is none.");
    }
    captures.name(id, method);
    return captures.find(id).orElseThrow();
  }

  /** What is taken for a capture unless the bench says otherwise. */
  public Proposal proposal(Looked looked, Surroundings around) {
    return Proposal.of(looked, around.model(), around.setting(), around.medium());
  }

  /** What the shop knows about the things that the key names. */
  public Surroundings surroundings(CaptureKey key) {
    return shelf.of(key);
  }

  private boolean chosen(Capture capture, Looked looked, CaptureChoices choices) {
    CaptureChoices before = capture.choices();
    return capture.state() == CaptureState.MEASURED
        && before != null
        && before.differOnlyInChannel(choices)
        && channels.has(capture.id(), choices.settings())
        && captures.choose(capture.id(), looked, choices);
  }

  private void order(CaptureId id, Looked looked, CaptureChoices choices) {
    transaction.executeWithoutResult(
        status -> {
          // the exception takes the job back where someone else was faster
          if (!captures.queue(id, looked, choices, jobs.enqueue(MEASURE, id.value()))) {
            throw busy();
          }
        });
  }

  private boolean note(CaptureId id, Looker.Result result) {
    return result instanceof Looker.Seen seen
        ? captures.looked(id, seen.looked())
        : captures.lookRefused(id, ((Looker.Unusable) result).why());
  }

  /** A fault of a reader must not lose the upload: it is noted as a refusal with a reference. */
  private Looker.Result look(StoredBytes bytes, ReadOptions options, Surroundings around) {
    try {
      return looker.look(bytes, options, around.toneHz(), around.pulsesPerSecond());
    } catch (IOException | RuntimeException e) {
      String reference = UUID.randomUUID().toString().substring(0, 8);
      log.error("Reference {}: cannot look at {}", reference, bytes.sha256(), e);
      return new Looker.Unusable(
          new Rejection(
              "readerFailed",
              "The service failed while reading this file: this is a fault of the service, not of"
                  + " the recording. Quote the reference "
                  + reference
                  + "."));
    }
  }

  private static void refuseClosed(Surroundings around) {
    if (!around.visit().visit().isOpen()) {
      throw new RefusedRequestException(
          "visitClosed",
          "This visit is closed: take it up again before adding or changing captures.");
    }
  }

  private Capture received(
      CaptureKey key, String name, String receivedBy, StoredBytes bytes, Looker.Result result) {
    @Nullable Looked looked = result instanceof Looker.Seen seen ? seen.looked() : null;
    ToneMethod method = key.toneMethod();
    if (looked == null || !looked.mayBeTone()) {
      method = null;
    } else if (method == null && key.medium() != null) {
      method = ToneMethod.REPLAY; // a test tape or record was made elsewhere
    }
    @Nullable Rejection why = result instanceof Looker.Unusable unusable ? unusable.why() : null;
    return new Capture(
        CaptureId.next(),
        key.by(method),
        name,
        bytes,
        clock.instant().truncatedTo(ChronoUnit.MICROS),
        receivedBy,
        looked == null ? CaptureState.REFUSED : CaptureState.RECOGNISED,
        looked,
        null,
        why,
        null);
  }

  private static RefusedRequestException busy() {
    return new RefusedRequestException(
        "busy", "This capture is being measured or has been: wait for it, then look at it again.");
  }
}
