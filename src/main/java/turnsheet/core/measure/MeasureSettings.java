package turnsheet.core.measure;

import org.jspecify.annotations.Nullable;

/**
 * Everything besides the bytes that decides the figures.
 *
 * @param kind what the capture is a recording of
 * @param channel counted from 1
 * @param nominalHz tone or pulse rate at nominal speed
 * @param searchPercent how far from nominal the tone or pulse rate is looked for
 * @param teeth pulses per turn of the sensor wheel; null where unknown
 * @param clockStandardUncertaintyPpm standard uncertainty of the recording's clock, in parts per
 *     million
 * @param clockErrorPpm known error of that clock, positive where it runs fast; figures are
 *     corrected for it
 * @param mediumStandardUncertaintyPercent standard uncertainty of the reference medium's speed; 0
 *     where no medium takes part
 */
public record MeasureSettings(
    CaptureKind kind,
    int channel,
    double nominalHz,
    double searchPercent,
    @Nullable Integer teeth,
    double clockStandardUncertaintyPpm,
    double clockErrorPpm,
    double mediumStandardUncertaintyPercent) {

  /**
   * Half width 100 ppm, rectangular, for a recording clock that nobody has checked: the spread
   * found among sound cards and controllers (common practice, no source).
   */
  public static final double UNCHECKED_CLOCK_PPM = 100 / Math.sqrt(3);

  public MeasureSettings {
    requirePositive("nominal rate", nominalHz);
    requirePositive("search range", searchPercent);
    if (channel < 1) {
      throw new IllegalArgumentException("channel " + channel);
    }
    if (teeth != null && teeth < 1) {
      throw new IllegalArgumentException("teeth " + teeth);
    }
    if (!(clockStandardUncertaintyPpm >= 0) || !(mediumStandardUncertaintyPercent >= 0)) {
      throw new IllegalArgumentException(
          "uncertainties "
              + clockStandardUncertaintyPpm
              + " ppm, "
              + mediumStandardUncertaintyPercent
              + " %");
    }
    if (!Double.isFinite(clockErrorPpm)) {
      throw new IllegalArgumentException("clock error " + clockErrorPpm);
    }
  }

  /** A tone of a nominal rate, recorded with an unchecked clock. */
  public static MeasureSettings tone(double nominalHz) {
    return new MeasureSettings(CaptureKind.TONE, 1, nominalHz, 12, null, UNCHECKED_CLOCK_PPM, 0, 0);
  }

  /** Pulses of a nominal rate as a waveform, recorded with an unchecked clock. */
  public static MeasureSettings tachometer(double pulsesPerSecond, @Nullable Integer teeth) {
    return new MeasureSettings(
        CaptureKind.TACHOMETER, 1, pulsesPerSecond, 12, teeth, UNCHECKED_CLOCK_PPM, 0, 0);
  }

  /** Pulses of a nominal rate as edge times, stamped by an unchecked clock. */
  public static MeasureSettings edges(double pulsesPerSecond, @Nullable Integer teeth) {
    return new MeasureSettings(
        CaptureKind.EDGES, 1, pulsesPerSecond, 12, teeth, UNCHECKED_CLOCK_PPM, 0, 0);
  }

  /** The same on another channel. */
  public MeasureSettings onChannel(int chosen) {
    return new MeasureSettings(
        kind,
        chosen,
        nominalHz,
        searchPercent,
        teeth,
        clockStandardUncertaintyPpm,
        clockErrorPpm,
        mediumStandardUncertaintyPercent);
  }

  private static void requirePositive(String name, double value) {
    if (!(value > 0 && Double.isFinite(value))) {
      throw new IllegalArgumentException(name + " " + value);
    }
  }
}
