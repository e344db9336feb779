package turnsheet.shop;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * One stay of a unit on the bench.
 *
 * @param closedAt when it was handed back; null while it stays
 * @param complaint what the customer says; may be empty
 * @param workDone what the bench did and which parts it fitted; may be empty
 */
public record Visit(
    VisitId id,
    UnitId unitId,
    Instant openedAt,
    @Nullable Instant closedAt,
    String complaint,
    String workDone) {

  public static final int TEXT_LENGTH = 4000;

  public Visit {
    Require.atMost("complaint", complaint, TEXT_LENGTH);
    Require.atMost("work done", workDone, TEXT_LENGTH);
    if (closedAt != null && closedAt.isBefore(openedAt)) {
      throw new IllegalArgumentException("opened " + openedAt + ", closed " + closedAt);
    }
  }

  public boolean isOpen() {
    return closedAt == null;
  }

  /**
   * The visit with its notes brought up to date.
   *
   * @throws RefusedChangeException {@code visitClosed}: what was handed back is not rewritten
   *     unawares
   */
  public Visit recordWork(String complaintNow, String workDoneNow) {
    if (!isOpen()) {
      throw new RefusedChangeException("visitClosed");
    }
    return new Visit(id, unitId, openedAt, null, complaintNow, workDoneNow);
  }

  /**
   * The unit is handed back.
   *
   * @throws RefusedChangeException {@code visitClosed} where it has been already
   */
  public Visit close(Instant at) {
    if (!isOpen()) {
      throw new RefusedChangeException("visitClosed");
    }
    return new Visit(id, unitId, openedAt, at, complaint, workDone);
  }

  /**
   * The unit is on the bench after all.
   *
   * @throws RefusedChangeException {@code visitOpen} where it never left
   */
  public Visit reopen() {
    if (isOpen()) {
      throw new RefusedChangeException("visitOpen");
    }
    return new Visit(id, unitId, openedAt, null, complaint, workDone);
  }
}
