package turnsheet.shop.web;

import jakarta.validation.constraints.DecimalMax;
import jakarta.validation.constraints.DecimalMin;
import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.PositiveOrZero;
import jakarta.validation.constraints.Size;
import java.time.LocalDate;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;

/**
 * A bench instrument in JSON.
 *
 * @param id given by the service
 * @param clockErrorPpm positive where the clock runs fast
 * @param clockExpandedUncertaintyPpm at k = 2; null where unknown
 */
record InstrumentDocument(
    @Nullable UUID id,
    @NotBlank @Size(max = BenchInstrument.NAME_LENGTH) String name,
    @NotNull @DecimalMin("-100000") @DecimalMax("100000") Double clockErrorPpm,
    @Nullable @PositiveOrZero Double clockExpandedUncertaintyPpm,
    @Nullable LocalDate checkedOn,
    @Size(max = BenchInstrument.NOTE_LENGTH) String note) {

  InstrumentDocument {
    name = Typed.text(name);
    note = Typed.text(note);
  }

  static InstrumentDocument of(BenchInstrument instrument) {
    return new InstrumentDocument(
        instrument.id().value(),
        instrument.name(),
        instrument.clockErrorPpm(),
        instrument.clockExpandedUncertaintyPpm(),
        instrument.checkedOn(),
        instrument.note());
  }

  BenchInstrument instrument(InstrumentId as) {
    return new BenchInstrument(
        as, name, clockErrorPpm, clockExpandedUncertaintyPpm, checkedOn, note);
  }
}
