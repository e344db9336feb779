package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.util.Optional;
import org.springframework.validation.Errors;
import turnsheet.shop.MediumId;
import turnsheet.shop.ReferenceMedium;

/** A reference medium as typed. */
record MediumForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = ReferenceMedium.NAME_LENGTH, message = "{shop.form.tooLong}")
        String name,
    String toneHz,
    String speedTolerancePercent,
    String ownFlutterPercent,
    @Size(max = ReferenceMedium.NOTE_LENGTH, message = "{shop.form.tooLong}") String note) {

  static final MediumForm EMPTY = new MediumForm("", "", "", "", "");

  MediumForm {
    name = Typed.text(name);
    toneHz = Typed.text(toneHz);
    speedTolerancePercent = Typed.text(speedTolerancePercent);
    ownFlutterPercent = Typed.text(ownFlutterPercent);
    note = Typed.text(note);
  }

  static MediumForm of(ReferenceMedium medium) {
    return new MediumForm(
        medium.name(),
        Typed.number(medium.toneHz()),
        Typed.number(medium.speedTolerancePercent()),
        Typed.number(medium.ownFlutterPercent()),
        medium.note());
  }

  /** The medium meant; nothing where the errors say why. */
  Optional<ReferenceMedium> medium(MediumId id, Errors errors) {
    Double tone = Typed.positiveOrNone(errors, "toneHz", toneHz);
    Double tolerance = Typed.number(errors, "speedTolerancePercent", speedTolerancePercent);
    if (tolerance != null && tolerance < 0) {
      errors.rejectValue("speedTolerancePercent", "shop.form.notNegative");
    }
    Double flutter = Typed.notNegativeOrNone(errors, "ownFlutterPercent", ownFlutterPercent);
    return errors.hasErrors() || tolerance == null
        ? Optional.empty()
        : Optional.of(new ReferenceMedium(id, name, tone, tolerance, flutter, note));
  }
}
