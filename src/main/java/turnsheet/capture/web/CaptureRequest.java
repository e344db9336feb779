package turnsheet.capture.web;

import jakarta.validation.constraints.Pattern;
import jakarta.validation.constraints.Size;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.Arrival;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.ToneMethod;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.MediumId;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;
import turnsheet.web.PlainText;

/**
 * What is said about a file as it is uploaded, in a form or in the query of a raw upload.
 *
 * @param speedSettingId left out to find it by the rate of the recording
 * @param condition left out to go by what is noted on the visit
 * @param ownLabel takes the place of the condition where it is filled in
 * @param toneMethod word of {@link ToneMethod}; empty where not said
 */
record CaptureRequest(
    @Nullable UUID speedSettingId,
    @Nullable @Size(max = CaptureKey.CONDITION_LENGTH) String condition,
    @Nullable @Size(max = CaptureKey.CONDITION_LENGTH) String ownLabel,
    @Nullable UUID instrumentId,
    @Nullable UUID mediumId,
    @Nullable @Pattern(regexp = "|replay|recordAndReplay") String toneMethod) {

  CaptureRequest {
    condition = condition == null ? null : PlainText.typed(condition);
    ownLabel = ownLabel == null ? null : PlainText.typed(ownLabel);
  }

  Arrival arrival(UUID visit) {
    return new Arrival(
        new VisitId(visit),
        speedSettingId == null ? null : new SpeedSettingId(speedSettingId),
        ownLabel == null || ownLabel.isBlank() ? condition : ownLabel,
        instrumentId == null ? null : new InstrumentId(instrumentId),
        mediumId == null ? null : new MediumId(mediumId),
        toneMethod == null ? null : ToneMethod.ofWord(toneMethod).orElse(null));
  }
}
