package turnsheet.reading;

import java.time.Instant;
import turnsheet.capture.CaptureId;
import turnsheet.core.measure.Reading;

/** A reading as it was stored, never to be changed. */
public record StoredReading(ReadingId id, CaptureId captureId, Instant madeAt, Reading reading) {}
