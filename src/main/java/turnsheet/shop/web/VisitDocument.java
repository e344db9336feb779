package turnsheet.shop.web;

import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Size;
import java.time.Instant;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.Visit;

/**
 * A visit in JSON.
 *
 * @param id given by the service
 * @param unitId stays what it was when the visit was opened
 * @param openedAt given by the service
 * @param closedAt given by the service; null while the visit is open
 * @param open false closes the visit, true reopens it; absent leaves it as it is
 */
record VisitDocument(
    @Nullable UUID id,
    @NotNull UUID unitId,
    @Nullable Instant openedAt,
    @Nullable Instant closedAt,
    @Nullable Boolean open,
    @Size(max = Visit.TEXT_LENGTH) String complaint,
    @Size(max = Visit.TEXT_LENGTH) String workDone) {

  VisitDocument {
    complaint = Typed.text(complaint);
    workDone = Typed.text(workDone);
  }

  static VisitDocument of(Visit visit) {
    return new VisitDocument(
        visit.id().value(),
        visit.unitId().value(),
        visit.openedAt(),
        visit.closedAt(),
        visit.isOpen(),
        visit.complaint(),
        visit.workDone());
  }
}
