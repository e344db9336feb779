package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.Objects;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.validation.Errors;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;

/** A bench instrument as typed. */
record InstrumentForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = BenchInstrument.NAME_LENGTH, message = "{shop.form.tooLong}")
        String name,
    String clockErrorPpm,
    String clockExpandedUncertaintyPpm,
    String checkedOn,
    @Size(max = BenchInstrument.NOTE_LENGTH, message = "{shop.form.tooLong}") String note) {

  static final InstrumentForm EMPTY = new InstrumentForm("", "0", "", "", "");

  InstrumentForm {
    name = Typed.text(name);
    clockErrorPpm = Typed.text(clockErrorPpm);
    clockExpandedUncertaintyPpm = Typed.text(clockExpandedUncertaintyPpm);
    checkedOn = Typed.text(checkedOn);
    note = Typed.text(note);
  }

  static InstrumentForm of(BenchInstrument instrument) {
    return new InstrumentForm(
        instrument.name(),
        Typed.number(instrument.clockErrorPpm()),
        Typed.number(instrument.clockExpandedUncertaintyPpm()),
        Objects.toString(instrument.checkedOn(), ""),
        instrument.note());
  }

  /** The instrument meant; nothing where the errors say why. */
  Optional<BenchInstrument> instrument(InstrumentId id, Errors errors) {
    Double error = Typed.number(errors, "clockErrorPpm", clockErrorPpm);
    if (error != null && Math.abs(error) > BenchInstrument.LARGEST_PPM) {
      errors.rejectValue("clockErrorPpm", "shop.instrument.errorTooLarge");
    }
    Double uncertainty =
        Typed.notNegativeOrNone(errors, "clockExpandedUncertaintyPpm", clockExpandedUncertaintyPpm);
    LocalDate day = day(errors);
    return errors.hasErrors() || error == null
        ? Optional.empty()
        : Optional.of(new BenchInstrument(id, name, error, uncertainty, day, note));
  }

  private @Nullable LocalDate day(Errors errors) {
    try {
      return checkedOn.isEmpty() ? null : LocalDate.parse(checkedOn);
    } catch (DateTimeParseException e) {
      errors.rejectValue("checkedOn", "shop.form.date");
      return null;
    }
  }
}
