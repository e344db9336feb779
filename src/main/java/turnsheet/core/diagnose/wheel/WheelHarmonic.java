package turnsheet.core.diagnose.wheel;

/**
 * One harmonic of the pattern.
 *
 * @param order times a turn
 * @param rateHertz at the mean speed
 * @param peakPercent amplitude in percent of a period, of the wheel's own part where that could be
 *     told
 * @param expandedUncertaintyPercent of that, k = 2
 * @param sameSpeedPeakPercent the speed variation that would look the same, from the middle to the
 *     crest
 * @param motionPeakPercent true speed variation told apart from the wheel; 0 where none was
 */
public record WheelHarmonic(
    int order,
    double rateHertz,
    double peakPercent,
    double expandedUncertaintyPercent,
    double sameSpeedPeakPercent,
    double motionPeakPercent,
    Standing standing) {}
