package turnsheet.bench.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Positive;
import jakarta.validation.constraints.PositiveOrZero;
import jakarta.validation.constraints.Size;
import org.jspecify.annotations.Nullable;
import turnsheet.bench.ClockQuestion;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;

/**
 * What is said about the recording of a known frequency in the query of its upload.
 *
 * @param source what gave the frequency
 * @param referenceExpandedUncertaintyPpm coverage factor 2
 * @param keepingPpm half width within which the clock stays until the next check
 * @param kind tone or tachometer for a waveform; left out for a tone
 * @param channel counted from 1; left out for the one that the file offers
 */
record ClockRequest(
    @NotBlank @Size(max = ClockQuestion.SOURCE_LENGTH) String source,
    @NotNull @Positive Double referenceHz,
    @NotNull @Positive Double referenceExpandedUncertaintyPpm,
    @Nullable @PositiveOrZero Double keepingPpm,
    @Nullable CaptureKind kind,
    @Nullable @Positive Integer channel) {

  ClockQuestion question() {
    return new ClockQuestion(
        source,
        new ClockError.Reference(referenceHz, referenceExpandedUncertaintyPpm),
        keepingPpm == null ? 0 : keepingPpm,
        kind,
        channel);
  }
}
