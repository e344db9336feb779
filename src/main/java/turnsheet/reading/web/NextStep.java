package turnsheet.reading.web;

import java.util.Collection;
import java.util.List;
import java.util.Locale;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.Verdict;
import turnsheet.reading.CaptureResult;
import turnsheet.shop.Visit;

/** What a visit waits for; its texts stand under {@code reading.next.<word>}. */
enum NextStep {
  /** nothing is measured yet */
  RECORD("#bring"),
  /** recordings have come in */
  CONFIRM("#incoming"),
  /** recordings are being measured */
  WAIT("#grid"),
  /** it is measured as received, and no work is noted */
  WORK("/edit"),
  /** work is noted, and some speed setting was last measured before it */
  AGAIN("#bring"),
  /** after the work something is still outside a limit */
  OUTSIDE("/edit"),
  /** measured after the work, and nothing is outside */
  READY("#standing"),
  /** it was handed back */
  CLOSED("");

  private final String place;

  NextStep(String place) {
    this.place = place;
  }

  /**
   * Looks at a visit.
   *
   * @param captures of the visit, in the order of their arrival
   */
  static NextStep of(Visit visit, List<CaptureResult> captures, Standing standing) {
    if (!visit.isOpen()) {
      return CLOSED;
    }
    if (captures.stream().anyMatch(c -> c.state() == CaptureState.RECOGNISED)) {
      return CONFIRM;
    }
    if (captures.stream().anyMatch(c -> c.state() == CaptureState.QUEUED)) {
      return WAIT;
    }
    Collection<CaptureResult> latest = Standing.latest(captures);
    if (latest.isEmpty()) {
      return RECORD;
    }
    boolean before = latest.stream().anyMatch(c -> c.condition().equals(CaptureKey.AS_RECEIVED));
    if (before) {
      return visit.notes().isWorkNoted() ? AGAIN : WORK;
    }
    return latest.stream().anyMatch(c -> standing.worst(c) == Verdict.OUTSIDE) ? OUTSIDE : READY;
  }

  String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** Where it is done, as an address that begins with the visit's own; empty where nothing is. */
  String hrefOn(String visitId) {
    return place.isEmpty() ? "" : "/visits/" + visitId + place;
  }
}
