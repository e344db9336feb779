package turnsheet.core.measure;

import java.util.Objects;
import org.jspecify.annotations.Nullable;
import turnsheet.core.stats.Budget;

/**
 * The error of a recording clock, found from the capture of a frequency that is known better.
 *
 * <p>Definition: a clock that is fast by e counts 1 + e seconds, or stamps 1 + e times its nominal
 * number of samples, in a true second. A reference f then reads f / (1 + e), so that e = f / f_read
 * - 1: a rate that reads too low means a fast clock, which is the sign of {@link
 * MeasureSettings#clockErrorPpm()}.
 *
 * <p>Uncertainty: the reference's, the noise and unsteadiness of the recording as the core states
 * them for the mean speed, and what the clock may move until the next check, taken as independent;
 * JCGM 100:2008, 5.1.2 with the derivatives of the formula above, 4.3.7 for the half width. All in
 * parts per million.
 *
 * @param measuredHz rate as the clock tells it
 * @param recordingPpm standard uncertainty that noise and unsteadiness of the recording leave
 * @param ppm found, positive where the clock runs fast
 * @param budget contributions to its uncertainty
 */
public record ClockError(double measuredHz, double recordingPpm, double ppm, Budget budget) {

  public static final String OF_REFERENCE = "reference";
  public static final String OF_RECORDING = "recording";
  public static final String OF_KEEPING = "keeping";

  /** A clock further off than this is no clock: another frequency was recorded. */
  public static final double LARGEST_PERCENT = 1;

  /**
   * The look at a tone's beginning tells lines 2 Hz apart; it needs some of them on either side.
   */
  private static final double NARROWEST_TONE_HERTZ = 8;

  /**
   * The frequency that was recorded.
   *
   * @param expandedUncertaintyPpm of its value, coverage factor 2
   */
  public record Reference(double hertz, double expandedUncertaintyPpm) {
    public Reference {
      if (!(hertz > 0 && Double.isFinite(hertz))
          || !(expandedUncertaintyPpm > 0 && Double.isFinite(expandedUncertaintyPpm))) {
        throw new IllegalArgumentException(hertz + " Hz, " + expandedUncertaintyPpm + " ppm");
      }
    }
  }

  /** How a capture is to be measured for this: as if its clock were true and certain. */
  public static MeasureSettings settings(CaptureKind kind, int channel, double referenceHz) {
    double search =
        kind == CaptureKind.TONE
            ? Math.max(LARGEST_PERCENT, 100 * NARROWEST_TONE_HERTZ / referenceHz)
            : LARGEST_PERCENT;
    return new MeasureSettings(kind, channel, referenceHz, search, null, 0, 0, 0);
  }

  /**
   * The error that a reading shows.
   *
   * @param reading made with {@link #settings}
   * @param keepingPpm half width within which the clock stays until the next check
   * @throws IllegalArgumentException if the reading was made otherwise
   */
  public static ClockError of(Reading reading, Reference reference, double keepingPpm) {
    MeasureSettings made = reading.method().settings();
    if (made.clockErrorPpm() != 0
        || made.clockStandardUncertaintyPpm() != 0
        || made.mediumStandardUncertaintyPercent() != 0
        || made.nominalHz() != reference.hertz()) {
      throw new IllegalArgumentException("not a reading for a clock check: " + made);
    }
    Figure deviation = reading.speed().deviationPercent();
    double read = 1 + stated(deviation.value()) / 100;
    double ownPpm = 1e4 * stated(deviation.expandedUncertainty()) / Budget.K / read;
    double slope = 1 / read;
    return new ClockError(
        reference.hertz() * read,
        ownPpm,
        1e6 * (slope - 1),
        Budget.empty()
            .plus(OF_REFERENCE, slope * reference.expandedUncertaintyPpm() / Budget.K)
            .plus(OF_RECORDING, slope * ownPpm)
            .plusRectangular(OF_KEEPING, keepingPpm));
  }

  /** Coverage factor 2. */
  public double expandedUncertaintyPpm() {
    return budget.expanded();
  }

  /** The plans always state both for the mean. */
  private static double stated(@Nullable Double number) {
    return Objects.requireNonNull(number);
  }
}
