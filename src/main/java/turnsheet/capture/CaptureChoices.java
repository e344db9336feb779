package turnsheet.capture;

import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;

/**
 * What the bench has confirmed: together with the bytes it decides every figure.
 *
 * @param options how the file is read
 * @param settings how it is measured, the clock of the instrument and the tolerance of the medium
 *     as they were known at the time folded in
 */
public record CaptureChoices(ReadOptions options, MeasureSettings settings) {}
