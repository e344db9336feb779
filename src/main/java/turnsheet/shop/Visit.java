package turnsheet.shop;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * One stay of a unit on the bench.
 *
 * @param closedAt when it was handed back; null while it stays
 */
public record Visit(
    VisitId id, UnitId unitId, Instant openedAt, @Nullable Instant closedAt, VisitNotes notes) {

  public Visit {
    if (closedAt != null && closedAt.isBefore(openedAt)) {
      throw new IllegalArgumentException("opened " + openedAt + ", closed " + closedAt);
    }
  }

  /** A visit without parts and with its sensor as it was. */
  public Visit(
      VisitId id,
      UnitId unitId,
      Instant openedAt,
      @Nullable Instant closedAt,
      String complaint,
      String workDone) {
    this(id, unitId, openedAt, closedAt, new VisitNotes(complaint, workDone, List.of(), false, ""));
  }

  public String complaint() {
    return notes.complaint();
  }

  public String workDone() {
    return notes.workDone();
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
  public Visit record(VisitNotes now) {
    if (!isOpen()) {
      throw new RefusedChangeException("visitClosed");
    }
    return new Visit(id, unitId, openedAt, null, now);
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
    return new Visit(id, unitId, openedAt, at, notes);
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
    return new Visit(id, unitId, openedAt, null, notes);
  }

  Visit withParts(List<FittedPart> fitted) {
    return new Visit(id, unitId, openedAt, closedAt, notes.withParts(fitted));
  }
}
