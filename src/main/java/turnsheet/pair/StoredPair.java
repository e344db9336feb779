package turnsheet.pair;

import java.time.Instant;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.CaptureId;

/**
 * A comparison as it is kept.
 *
 * @param capture of the original sensor
 * @param sheet null until the job has come to its end
 */
public record StoredPair(
    UUID id,
    CaptureId capture,
    Instant madeAt,
    String madeBy,
    PairOrder order,
    @Nullable PairSheet sheet) {}
