package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.util.Arrays;
import java.util.Objects;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.validation.Errors;
import turnsheet.core.diagnose.parts.Drive;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.shop.PartBasis;
import turnsheet.shop.PartDetails;
import turnsheet.shop.PartRules;
import turnsheet.shop.RefusedChangeException;
import turnsheet.shop.RotatingPart;

/**
 * A rotating part as typed. The fields that its kind does not have are empty.
 *
 * @param turnsOf name of the part whose turns are counted, or on which a belt lies; empty for the
 *     nominal rotation, or tape speed
 */
record PartForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = RotatingPart.NAME_LENGTH, message = "{shop.form.tooLong}")
        String part,
    String kind,
    String basis,
    String amount,
    String turnsOf,
    String tolerance,
    String count,
    String rim,
    String empty,
    String winding,
    String ball,
    String pitch,
    String angle,
    String slipLow,
    String slipHigh) {

  PartForm {
    part = Typed.text(part);
    kind = Typed.text(kind);
    basis = Typed.text(basis);
    amount = Typed.text(amount);
    turnsOf = Typed.text(turnsOf);
    tolerance = Typed.text(tolerance);
    count = Typed.text(count);
    rim = Typed.text(rim);
    empty = Typed.text(empty);
    winding = Typed.text(winding);
    ball = Typed.text(ball);
    pitch = Typed.text(pitch);
    angle = Typed.text(angle);
    slipLow = Typed.text(slipLow);
    slipHigh = Typed.text(slipHigh);
  }

  /** An empty form for a part of a kind, with what its rate usually follows from. */
  static PartForm empty(PartKind kind) {
    PartBasis usual = PartRules.bases(kind).get(0);
    return new PartForm(
        "", kind.name(), usual.name(), "", "", "", "", "", "", "", "", "", "", "", "");
  }

  static PartForm of(RotatingPart part) {
    PartDetails d = part.details();
    Drive.Winding winding = d.winding();
    return new PartForm(
        part.name(),
        part.kind().name(),
        part.basis().name(),
        Typed.number(part.amount()),
        Objects.toString(part.referencePart(), ""),
        Typed.number(d.tolerancePercent()),
        Typed.number(d.count()),
        Typed.number(d.rimMm()),
        Typed.number(d.emptyMm()),
        winding == null ? "" : winding.name(),
        Typed.number(d.ballMm()),
        Typed.number(d.pitchMm()),
        Typed.number(d.contactDegrees()),
        Typed.number(d.slipLowPercent()),
        Typed.number(d.slipHighPercent()));
  }

  /** The same typed for another kind; numbers that it does not have are not kept. */
  PartForm as(PartKind other) {
    PartForm fresh = empty(other);
    boolean fits = PartRules.bases(other).stream().anyMatch(b -> b.name().equals(basis));
    return new PartForm(
        part,
        fresh.kind,
        fits ? basis : fresh.basis,
        fits ? amount : "",
        fits ? turnsOf : "",
        tolerance,
        "",
        "",
        "",
        "",
        "",
        "",
        "",
        "",
        "");
  }

  /** The kind chosen; {@link PartKind#OTHER} where none is. */
  PartKind kindChosen() {
    return kind(kind).orElse(PartKind.OTHER);
  }

  /** A kind by its name; empty for none that a part can have. */
  static Optional<PartKind> kind(String name) {
    return Arrays.stream(PartKind.values())
        .filter(k -> k != PartKind.MAINS && k.name().equals(name))
        .findFirst();
  }

  /** The part meant; nothing where the errors say why. */
  Optional<RotatingPart> part(Errors errors) {
    PartKind chosenKind = kindChosen();
    Double number = Typed.positive(errors, "amount", amount);
    Optional<PartBasis> chosen =
        PartRules.bases(chosenKind).stream().filter(b -> b.name().equals(basis)).findFirst();
    if (chosen.isEmpty()) {
      errors.rejectValue("basis", "shop.form.choose");
    }
    boolean refers =
        chosen.filter(b -> b == PartBasis.TURNS_PER_TURN || b == PartBasis.LENGTH_MM).isPresent();
    PartDetails details = details(errors);
    if (errors.hasErrors() || number == null || chosen.isEmpty()) {
      return Optional.empty();
    }
    try {
      return Optional.of(
          new RotatingPart(
              part,
              chosenKind,
              chosen.get(),
              number,
              refers && !turnsOf.isEmpty() ? turnsOf : null,
              details));
    } catch (RefusedChangeException e) {
      errors.reject("shop.refused." + e.code(), e.arguments().toArray(), e.code());
      return Optional.empty();
    }
  }

  private PartDetails details(Errors errors) {
    return new PartDetails(
        Typed.notNegativeOrNone(errors, "tolerance", tolerance),
        Typed.countOrNone(errors, "count", count),
        Typed.positiveOrNone(errors, "rim", rim),
        Typed.positiveOrNone(errors, "empty", empty),
        windingChosen(),
        Typed.positiveOrNone(errors, "ball", ball),
        Typed.positiveOrNone(errors, "pitch", pitch),
        Typed.notNegativeOrNone(errors, "angle", angle),
        Typed.notNegativeOrNone(errors, "slipLow", slipLow),
        Typed.notNegativeOrNone(errors, "slipHigh", slipHigh));
  }

  private Drive.@Nullable Winding windingChosen() {
    return Arrays.stream(Drive.Winding.values())
        .filter(w -> w.name().equals(winding))
        .findFirst()
        .orElse(null);
  }
}
