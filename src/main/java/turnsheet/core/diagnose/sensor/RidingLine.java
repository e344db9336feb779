package turnsheet.core.diagnose.sensor;

/**
 * A line that rides on the waveform of a tachometer beside its pulses.
 *
 * @param cause what lies at that rate
 * @param peak in the unit of the waveform
 * @param relativeDb against the fundamental of the pulses
 * @param falseRateHz the rate of the line that it puts into the speed read by edges: they sample it
 *     once a pulse, so it folds at half the pulse rate
 * @param falsePeakPercent the peak of that line: 2 pi times its rate times peak over slope, as the
 *     edge comes early by peak over slope
 */
public record RidingLine(
    Cause cause,
    double rateHz,
    double peak,
    double relativeDb,
    double falseRateHz,
    double falsePeakPercent) {

  /** What a line may be told by its rate. */
  public enum Cause {
    /** near a multiple of 50 or 60 Hz */
    MAINS,
    /** at a multiple of the wheel's turning rate */
    WHEEL,
    /** neither, or both */
    UNTOLD
  }
}
