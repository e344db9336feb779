package turnsheet.reading;

import java.time.Instant;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.CaptureId;
import turnsheet.capture.ToneMethod;
import turnsheet.shop.ModelId;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.UnitId;
import turnsheet.shop.VisitId;

/**
 * Where a capture belongs.
 *
 * @param instrumentName null where not said
 * @param mediumName null where none was or not said
 * @param toneMethod how a tone came onto what was played; null for others and where not said
 */
public record CapturePlace(
    CaptureId captureId,
    String fileName,
    long byteLength,
    Instant receivedAt,
    String condition,
    SpeedSettingId settingId,
    String settingLabel,
    VisitId visitId,
    Instant visitOpenedAt,
    UnitId unitId,
    String serialNumber,
    ModelId modelId,
    String modelName,
    String customerName,
    @Nullable String instrumentName,
    @Nullable String mediumName,
    @Nullable ToneMethod toneMethod) {}
