package turnsheet.reading.web;

import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.Verdict;
import turnsheet.reading.CaptureResult;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitSummary;

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
  /** measured after the work, nothing is outside, and no report tells of it */
  REPORT("/report"),
  /** something was measured after the report was issued */
  REVISE("/revise"),
  /** reported: the customer's link, then the unit itself */
  READY("/links"),
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
  static NextStep of(VisitSummary summary, List<CaptureResult> captures, Standing standing) {
    Visit visit = summary.visit();
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
    if (latest.stream().anyMatch(c -> standing.worst(c) == Verdict.OUTSIDE)) {
      return OUTSIDE;
    }
    return told(summary.reportedAt(), latest);
  }

  private static NextStep told(@Nullable Instant reportedAt, Collection<CaptureResult> latest) {
    if (reportedAt == null) {
      return REPORT;
    }
    boolean since =
        latest.stream()
            .map(CaptureResult::measuredAt)
            .anyMatch(at -> at != null && at.isAfter(reportedAt));
    return since ? REVISE : READY;
  }

  String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** Where it is done: an address of the visit or of its report; empty where nothing is. */
  String hrefOn(VisitSummary visit) {
    return switch (this) {
      case CLOSED -> "";
      case REVISE, READY -> "/reports/" + visit.report() + place;
      default -> "/visits/" + visit.visit().id() + place;
    };
  }
}
