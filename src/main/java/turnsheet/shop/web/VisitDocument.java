package turnsheet.shop.web;

import jakarta.validation.Valid;
import jakarta.validation.constraints.Max;
import jakarta.validation.constraints.Min;
import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Size;
import java.time.Instant;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.FittedPart;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitNotes;

/**
 * A visit in JSON.
 *
 * @param id given by the service
 * @param unitId stays what it was when the visit was opened
 * @param openedAt given by the service
 * @param closedAt given by the service; null while the visit is open
 * @param open false closes the visit, true reopens it; absent leaves it as it is
 * @param parts fitted; absent leaves them as they are, as do the two about the sensor
 */
record VisitDocument(
    @Nullable UUID id,
    @NotNull UUID unitId,
    @Nullable Instant openedAt,
    @Nullable Instant closedAt,
    @Nullable Boolean open,
    @Size(max = VisitNotes.TEXT_LENGTH) String complaint,
    @Size(max = VisitNotes.TEXT_LENGTH) String workDone,
    @Nullable @Size(max = FittedPart.MOST_PARTS) List<@Valid PartDocument> parts,
    @Nullable Boolean sensorReplaced,
    @Nullable @Size(max = VisitNotes.SENSOR_NOTE_LENGTH) String sensorNote) {

  /** A fitted part; quantity null where nobody counted. */
  record PartDocument(
      @NotBlank @Size(max = FittedPart.NAME_LENGTH) String name,
      @Nullable @Min(1) @Max(FittedPart.MOST_OF_ONE) Integer quantity) {}

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
        visit.workDone(),
        visit.notes().parts().stream().map(p -> new PartDocument(p.name(), p.quantity())).toList(),
        visit.notes().sensorReplaced(),
        visit.notes().sensorNote());
  }

  /** What is sent, and of the rest what is known. */
  VisitNotes notes(VisitNotes known) {
    return new VisitNotes(
        complaint,
        workDone,
        parts == null
            ? known.parts()
            : parts.stream().map(p -> new FittedPart(p.name(), p.quantity())).toList(),
        sensorReplaced == null ? known.sensorReplaced() : sensorReplaced,
        sensorNote == null ? known.sensorNote() : sensorNote);
  }
}
