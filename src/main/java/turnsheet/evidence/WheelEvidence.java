package turnsheet.evidence;

import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.wheel.WheelFinding;
import turnsheet.core.signal.Rejection;

/**
 * What a capture tells of its sensor wheel.
 *
 * @param finding null where nothing could be told
 * @param why nothing could be told; null where something could
 * @param statedTeeth pulses per turn stated beforehand; null where none were
 */
public record WheelEvidence(
    @Nullable WheelFinding finding, @Nullable Rejection why, @Nullable Integer statedTeeth) {}
