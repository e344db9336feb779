package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Positive;
import jakarta.validation.constraints.PositiveOrZero;
import jakarta.validation.constraints.Size;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.MediumId;
import turnsheet.shop.ReferenceMedium;

/**
 * A reference medium in JSON.
 *
 * @param id given by the service
 * @param toneHz null where it carries several
 * @param ownFlutterPercent null where not stated
 */
record MediumDocument(
    @Nullable UUID id,
    @NotBlank @Size(max = ReferenceMedium.NAME_LENGTH) String name,
    @Nullable @Positive Double toneHz,
    @NotNull @PositiveOrZero Double speedTolerancePercent,
    @Nullable @PositiveOrZero Double ownFlutterPercent,
    @Size(max = ReferenceMedium.NOTE_LENGTH) String note) {

  MediumDocument {
    name = Typed.text(name);
    note = Typed.text(note);
  }

  static MediumDocument of(ReferenceMedium medium) {
    return new MediumDocument(
        medium.id().value(),
        medium.name(),
        medium.toneHz(),
        medium.speedTolerancePercent(),
        medium.ownFlutterPercent(),
        medium.note());
  }

  ReferenceMedium medium(MediumId as) {
    return new ReferenceMedium(as, name, toneHz, speedTolerancePercent, ownFlutterPercent, note);
  }
}
