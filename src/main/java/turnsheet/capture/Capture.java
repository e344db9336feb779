package turnsheet.capture;

import java.time.Instant;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.signal.Rejection;
import turnsheet.job.JobId;

/**
 * One uploaded recording.
 *
 * @param fit how the service came by the key's speed setting; null where the bench said it
 * @param fileName as the bench calls it, without folders
 * @param receivedBy name of the account that brought it
 * @param looked what was recognised; null where that failed
 * @param choices what was confirmed last; null before
 * @param refusal why it was refused or what failed; null in every other state
 * @param job the latest that measured it; null before
 */
public record Capture(
    CaptureId id,
    CaptureKey key,
    @Nullable SettingFit fit,
    String fileName,
    StoredBytes bytes,
    Instant receivedAt,
    String receivedBy,
    CaptureState state,
    @Nullable Looked looked,
    @Nullable CaptureChoices choices,
    @Nullable Rejection refusal,
    @Nullable JobId job) {

  public static final int FILE_NAME_LENGTH = 300;

  /** Whether it is a played tone: as confirmed, else as far as the look tells. */
  public boolean mayBeTone() {
    return choices != null
        ? choices.settings().kind() == CaptureKind.TONE
        : looked != null && looked.mayBeTone();
  }
}
