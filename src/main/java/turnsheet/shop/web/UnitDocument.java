package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Size;
import java.time.Instant;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.Unit;

/**
 * A unit in JSON.
 *
 * @param id given by the service
 * @param code on the unit's label, given by the service
 * @param createdAt given by the service
 */
record UnitDocument(
    @Nullable UUID id,
    @Nullable String code,
    @NotNull UUID modelId,
    @NotNull UUID customerId,
    @NotBlank @Size(max = Unit.SERIAL_LENGTH) String serialNumber,
    @Size(max = Unit.NOTE_LENGTH) String note,
    @Nullable Instant createdAt) {

  UnitDocument {
    serialNumber = Typed.text(serialNumber);
    note = Typed.text(note);
  }

  static UnitDocument of(Unit unit) {
    return new UnitDocument(
        unit.id().value(),
        unit.code().letters(),
        unit.modelId().value(),
        unit.customerId().value(),
        unit.serialNumber(),
        unit.note(),
        unit.createdAt());
  }
}
