package turnsheet.capture.web;

import java.time.Instant;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.Looked;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.KindGuess;
import turnsheet.core.signal.Rejection;

/**
 * A capture as the REST API shows it; absent things are null.
 *
 * @param settingProposal how the speed setting was found: {@code only}, {@code rate}, {@code name},
 *     or {@code several} and {@code none} where it must be said; null once it is said or confirmed
 * @param toneMethod {@code replay} or {@code recordAndReplay}; null for whatever is not a tone
 */
record CaptureDocument(
    UUID id,
    UUID visitId,
    UUID speedSettingId,
    @Nullable String settingProposal,
    String condition,
    @Nullable UUID instrumentId,
    @Nullable UUID mediumId,
    @Nullable String toneMethod,
    String fileName,
    String sha256,
    long byteLength,
    Instant receivedAt,
    String receivedBy,
    String state,
    @Nullable Recognised recognised,
    @Nullable KindGuess kindGuess,
    @Nullable CaptureChoices choices,
    @Nullable Rejection refusal) {

  static CaptureDocument of(Capture capture) {
    var key = capture.key();
    Looked looked = capture.looked();
    return new CaptureDocument(
        capture.id().value(),
        key.visit().value(),
        key.setting().value(),
        capture.fit() == null ? null : capture.fit().word(),
        key.condition(),
        key.instrument() == null ? null : key.instrument().value(),
        key.medium() == null ? null : key.medium().value(),
        key.toneMethod() == null ? null : key.toneMethod().word(),
        capture.fileName(),
        capture.bytes().sha256(),
        capture.bytes().length(),
        capture.receivedAt(),
        capture.receivedBy(),
        capture.state().word(),
        looked == null ? null : looked.recognised(),
        looked == null ? null : looked.guess(),
        capture.choices(),
        capture.refusal());
  }
}
