package turnsheet.pair;

import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
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

/** Orders comparisons of two sensors and shares what came of them. */
@Service
public class Pairs {

  /** Name of the job that works out the comparison which is its subject. */
  public static final String JOB = "pair";

  public static final int MOST_TEETH = 100_000;
  public static final int LONGEST_TEXT = 400;
  public static final int LONGEST_DAYS = 1000;

  private final Captures captures;
  private final CaptureStore store;
  private final PairStore pairs;
  private final Jobs jobs;
  private final CurrentUser user;
  private final AuditTrail audit;

  Pairs(
      Captures captures,
      CaptureStore store,
      PairStore pairs,
      Jobs jobs,
      CurrentUser user,
      AuditTrail audit) {
    this.captures = captures;
    this.store = store;
    this.pairs = pairs;
    this.jobs = jobs;
    this.user = user;
    this.audit = audit;
  }

  /** The recordings that can stand beside one: pulses of the same visit and speed, measured. */
  public List<Capture> beside(Capture capture) {
    return captures.ofVisit(capture.key().visit()).stream()
        .filter(c -> c.key().setting().equals(capture.key().setting()) && hasPulses(c))
        .toList();
  }

  /** Whether it was measured and is no tone. */
  public static boolean hasPulses(Capture capture) {
    CaptureChoices choices = capture.choices();
    return capture.state() == CaptureState.MEASURED
        && choices != null
        && choices.settings().kind() != CaptureKind.TONE;
  }

  /**
   * Orders a comparison.
   *
   * @throws RefusedRequestException with a sentence where it cannot be done
   */
  @Transactional
  public UUID order(PairOrder order) {
    Capture one = pulses(order.original());
    Capture other = pulses(order.replacement());
    if (order.together() && order.original().channel() == order.replacement().channel()) {
      throw new RefusedRequestException(
          "pairSame",
          "Both sensors are the same channel of the same recording: choose another one for the"
              + " replacement.");
    }
    if (!one.key().visit().equals(other.key().visit())
        || !one.key().setting().equals(other.key().setting())) {
      throw new RefusedRequestException(
          "pairElsewhere",
          "Both recordings must be of one visit and one speed setting: choose two of them.");
    }
    UUID id = pairs.add(order, user.signInName());
    jobs.enqueue(JOB, id);
    return id;
  }

  private Capture pulses(PairOrder.Side side) {
    if (side.teeth() < 1 || side.teeth() > MOST_TEETH) {
      throw new RefusedRequestException(
          "pairTeeth", "The pulses per turn are a whole number of 1 or more: read them off.");
    }
    Capture capture =
        captures
            .find(new CaptureId(side.capture()))
            .orElseThrow(() -> new NotFoundException("capture"));
    if (!hasPulses(capture)) {
      throw new RefusedRequestException(
          "pairNoPulses",
          "Sensors are compared from measured recordings of pulses: measure the recording as a"
              + " tachometer or as edges first.");
    }
    if (!store.holds(capture.bytes())) {
      throw MissingFile.refused();
    }
    return capture;
  }

  public Optional<StoredPair> find(UUID id) {
    return pairs.find(id);
  }

  public List<StoredPair> ofCapture(CaptureId capture) {
    return pairs.ofCapture(capture);
  }

  /** The job that works on a comparison. */
  public Optional<Job> job(UUID id) {
    return jobs.ofSubject(id).stream().findFirst();
  }

  /**
   * Makes a link that opens a finished comparison without an account.
   *
   * @return the token, told once
   */
  @Transactional
  public String share(UUID id, int days) {
    if (days < 1 || days > LONGEST_DAYS) {
      throw new RefusedRequestException(
          "linkDays", "A link can last from 1 to 1000 days: choose a number between them.");
    }
    StoredPair pair = pairs.find(id).orElseThrow(() -> new NotFoundException("comparison"));
    if (pair.sheet() == null) {
      throw new RefusedRequestException(
          "pairUnfinished", "The comparison is not finished yet: wait for it and share it then.");
    }
    audit.record("share.audit.made", pair.sheet().machine());
    return pairs.share(id, user.signInName(), days);
  }

  public int openLinks(UUID id) {
    return pairs.openLinks(id);
  }

  /** Ends all links to a comparison. */
  @Transactional
  public void withdraw(UUID id) {
    StoredPair pair = pairs.find(id).orElseThrow(() -> new NotFoundException("comparison"));
    pairs.withdraw(id);
    audit.record("share.audit.withdrawn", pair.sheet() == null ? "" : pair.sheet().machine());
  }

  /** What a token opens; empty for whatever it does not open now. */
  public Optional<StoredPair> shared(String token) {
    return pairs.shared(token);
  }
}
