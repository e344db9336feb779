package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.util.Arrays;
import java.util.Objects;
import java.util.Optional;
import org.springframework.validation.Errors;
import turnsheet.shop.PartBasis;
import turnsheet.shop.RotatingPart;

/**
 * A rotating part as typed.
 *
 * @param turnsOf name of the part whose turns are counted; empty for the nominal rotation
 */
record PartForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = RotatingPart.NAME_LENGTH, message = "{shop.form.tooLong}")
        String part,
    String basis,
    String amount,
    String turnsOf) {

  static final PartForm EMPTY = new PartForm("", PartBasis.DIAMETER_MM.name(), "", "");

  PartForm {
    part = Typed.text(part);
    basis = Typed.text(basis);
    amount = Typed.text(amount);
    turnsOf = Typed.text(turnsOf);
  }

  static PartForm of(RotatingPart part) {
    return new PartForm(
        part.name(),
        part.basis().name(),
        Typed.number(part.amount()),
        Objects.toString(part.referencePart(), ""));
  }

  /** The part meant; nothing where the errors say why. */
  Optional<RotatingPart> part(Errors errors) {
    Double number = Typed.positive(errors, "amount", amount);
    Optional<PartBasis> chosen =
        Arrays.stream(PartBasis.values()).filter(b -> b.name().equals(basis)).findFirst();
    if (chosen.isEmpty()) {
      errors.rejectValue("basis", "shop.form.choose");
    }
    boolean geared = chosen.filter(PartBasis.TURNS_PER_TURN::equals).isPresent();
    return errors.hasErrors() || number == null
        ? Optional.empty()
        : chosen.map(
            b -> new RotatingPart(part, b, number, geared && !turnsOf.isEmpty() ? turnsOf : null));
  }
}
