package turnsheet.bench.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.validation.Errors;
import turnsheet.bench.ClockQuestion;
import turnsheet.bench.KeptFile;
import turnsheet.capture.StoredBytes;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;
import turnsheet.shop.web.Typed;

/**
 * A check of a clock as typed.
 *
 * @param kind a word of {@link CaptureKind}
 * @param heldName name of the file that came with the form before, so that a correction need not
 *     send it again; empty where none did
 * @param heldSha256 its digest
 * @param heldLength its length in bytes
 */
record ClockForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = ClockQuestion.SOURCE_LENGTH, message = "{shop.form.tooLong}")
        String source,
    String referenceHz,
    String referenceExpandedUncertaintyPpm,
    String keepingPpm,
    String kind,
    String channel,
    String heldName,
    String heldSha256,
    String heldLength) {

  static final ClockForm EMPTY =
      new ClockForm("", "1000", "", "", CaptureKind.TONE.name(), "", "", "", "");

  ClockForm {
    source = Typed.text(source);
    referenceHz = Typed.text(referenceHz);
    referenceExpandedUncertaintyPpm = Typed.text(referenceExpandedUncertaintyPpm);
    keepingPpm = Typed.text(keepingPpm);
    kind = Typed.text(kind);
    channel = Typed.text(channel);
    heldName = Typed.text(heldName);
    heldSha256 = Typed.text(heldSha256);
    heldLength = Typed.text(heldLength);
  }

  /** What is meant; nothing where the errors say why. */
  Optional<ClockQuestion> question(Errors errors) {
    Double hertz = Typed.positive(errors, "referenceHz", referenceHz);
    Double uncertainty =
        Typed.positive(errors, "referenceExpandedUncertaintyPpm", referenceExpandedUncertaintyPpm);
    Double keeping = Typed.notNegativeOrNone(errors, "keepingPpm", keepingPpm);
    Integer number = Typed.countOrNone(errors, "channel", channel);
    if (errors.hasErrors() || hertz == null || uncertainty == null) {
      return Optional.empty();
    }
    return Optional.of(
        new ClockQuestion(
            source,
            new ClockError.Reference(hertz, uncertainty),
            keeping == null ? 0 : keeping,
            pulses() ? CaptureKind.TACHOMETER : CaptureKind.TONE,
            number));
  }

  private boolean pulses() {
    return kind.equals(CaptureKind.TACHOMETER.name());
  }

  /** The file that came before; null where none did. */
  @Nullable KeptFile held() {
    try {
      return heldName.isEmpty()
          ? null
          : new KeptFile(heldName, new StoredBytes(heldSha256, Long.parseLong(heldLength)));
    } catch (IllegalArgumentException e) {
      return null;
    }
  }
}
