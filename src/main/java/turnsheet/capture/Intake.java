package turnsheet.capture;

import java.io.InputStream;
import java.time.Clock;
import java.time.temporal.ChronoUnit;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.signal.Rejection;
import turnsheet.job.Jobs;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitSummary;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Takes captures in, from the first byte to the order to measure. */
@Service
public class Intake {

  /** Name of the job that measures the capture which is its subject. */
  public static final String MEASURE = "measure";

  private final CaptureStore store;
  private final Captures captures;
  private final Looker looker;
  private final SettingFinder finder;
  private final Shelf shelf;
  private final MeasuredChannels channels;
  private final Jobs jobs;
  private final TransactionTemplate transaction;
  private final Clock clock;

  Intake(
      CaptureStore store,
      Captures captures,
      Looker looker,
      SettingFinder finder,
      Shelf shelf,
      MeasuredChannels channels,
      Jobs jobs,
      TransactionTemplate transaction,
      Clock clock) {
    this.store = store;
    this.captures = captures;
    this.looker = looker;
    this.finder = finder;
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
    around.requireOpen();
    String name = FileName.checked(fileName);
    StoredBytes bytes = store.receive(in);
    return add(key, null, name, receivedBy, bytes, looker.look(bytes, ReadOptions.none(), around));
  }

  /**
   * Stores a file whose speed setting or condition may be left open. The setting is then found by
   * the rate of the recording, the condition by whether work is noted on the visit; both are
   * proposals until the capture is placed or confirmed.
   *
   * @throws RefusedRequestException also if the unit's model has no speed setting
   */
  public Capture receive(Arrival arrival, String fileName, String receivedBy, InputStream in)
      throws BrokenUploadException, StoreException {
    VisitSummary visit = shelf.visit(arrival.visit());
    CaptureKey any = arrival.key(shelf.settings(visit).get(0).id(), usualCondition(visit.visit()));
    if (arrival.setting() != null) {
      return receive(any, fileName, receivedBy, in);
    }
    Surroundings around = shelf.of(any);
    around.requireOpen();
    String name = FileName.checked(fileName);
    StoredBytes bytes = store.receive(in);
    // told by its shape alone: the rates of no setting come before those of another
    Looker.Result first = looker.look(bytes, ReadOptions.none(), null, null);
    SettingFinder.Found found =
        finder.find(
            bytes,
            first instanceof Looker.Seen seen ? seen.looked() : null,
            name,
            around.model(),
            around.medium());
    CaptureKey key = any.at(found.setting().id(), any.condition());
    Looker.Result result = looker.look(bytes, ReadOptions.none(), shelf.of(key));
    return add(key, found.fit(), name, receivedBy, bytes, result);
  }

  /** As received until work is noted on the visit, after repair from then on. */
  public static String usualCondition(Visit visit) {
    return visit.notes().isWorkNoted() ? CaptureKey.AFTER_REPAIR : CaptureKey.AS_RECEIVED;
  }

  /**
   * Looks again with what the bench has decided; the capture is then recognised or refused.
   *
   * @throws RefusedRequestException if the capture is being measured or has been
   */
  public Capture lookAgain(CaptureId id, ReadOptions options) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    Looker.Result result = looker.look(capture.bytes(), options, shelf.of(capture.key()));
    if (!captures.noted(id, result)) {
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
    SettingFit fit = capture.fit();
    if (fit != null && !fit.isProposal()) {
      throw new RefusedRequestException(
          "settingUnsaid",
          "The rate of this recording does not tell its speed setting: say at which it was made.");
    }
    Surroundings around = shelf.of(capture.key());
    Looked looked = capture.looked();
    if (looked == null || !looked.options().equals(wish.options())) {
      Looker.Result result = looker.look(capture.bytes(), wish.options(), around);
      if (result instanceof Looker.Unusable unusable) {
        if (!captures.noted(id, result)) {
          throw new RefusedRequestException(unusable.why().code(), unusable.why().message());
        }
        return captures.find(id).orElseThrow();
      }
      looked = ((Looker.Seen) result).looked();
    }
    CaptureChoices choices = Choosing.choices(wish, looked, around);
    if (!chosen(capture, looked, choices)) {
      if (!store.holds(capture.bytes())) {
        throw MissingFile.refused();
      }
      order(id, looked, choices);
    }
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

  private Capture add(
      CaptureKey key,
      @Nullable SettingFit fit,
      String name,
      String receivedBy,
      StoredBytes bytes,
      Looker.Result result) {
    @Nullable Looked looked = result instanceof Looker.Seen seen ? seen.looked() : null;
    ToneMethod method = key.toneMethod();
    if (looked == null || !looked.mayBeTone()) {
      method = null;
    } else if (method == null && key.medium() != null) {
      method = ToneMethod.REPLAY; // a test tape or record was made elsewhere
    }
    @Nullable Rejection why = result instanceof Looker.Unusable unusable ? unusable.why() : null;
    Capture received =
        new Capture(
            CaptureId.next(),
            key.by(method),
            fit,
            name,
            bytes,
            clock.instant().truncatedTo(ChronoUnit.MICROS),
            receivedBy,
            looked == null ? CaptureState.REFUSED : CaptureState.RECOGNISED,
            looked,
            null,
            why,
            null);
    transaction.executeWithoutResult(
        status -> {
          // the file took its time: somebody may have closed the visit or named another model
          shelf.hold(key).requireOpen();
          captures.add(received);
        });
    return received;
  }

  static RefusedRequestException busy() {
    return new RefusedRequestException(
        "busy", "This capture is being measured or has been: wait for it, then look at it again.");
  }
}
