package turnsheet.capture;

import org.jspecify.annotations.Nullable;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.MediumId;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

/**
 * What is said about a recording as it comes in; a {@link CaptureKey} whose gaps the service fills.
 *
 * @param setting null to find it by the rate of the recording
 * @param condition null or blank to go by what the visit's notes say
 */
public record Arrival(
    VisitId visit,
    @Nullable SpeedSettingId setting,
    @Nullable String condition,
    @Nullable InstrumentId instrument,
    @Nullable MediumId medium,
    @Nullable ToneMethod toneMethod) {

  /** The key with what was said, and with the rest as given. */
  CaptureKey key(SpeedSettingId otherwise, String usualCondition) {
    return new CaptureKey(
        visit,
        setting == null ? otherwise : setting,
        condition == null || condition.isBlank() ? usualCondition : condition,
        instrument,
        medium,
        toneMethod);
  }
}
