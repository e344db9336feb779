package turnsheet.core.diagnose.sensor;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.signal.Rejection;

/**
 * How healthy the waveform of a tachometer is. Levels are in the unit of the recording, where full
 * scale is 1 for audio files.
 *
 * @param lookedSeconds length of the beginning that the shape was read from
 * @param pulsesPerSecond there
 * @param low, high its two levels
 * @param noiseRms noise over the whole band of the recording; NaN is never stored, null where the
 *     recording is too short to tell
 * @param snrDb power of the mean pulse over that of the noise
 * @param distortionPercent harmonics of the pulse rate against its fundamental
 * @param harmonicsDb from the second on, against the fundamental
 * @param riseSlopePerSecond, fallSlopePerSecond of the waveform at its crossings
 * @param hysteresis room for a comparator
 * @param riseMicroseconds from 10 to 90 %
 * @param predictedEdgeNoiseMicroseconds noise over slope
 * @param edgeNoiseMicroseconds as measured
 * @param riding lines beside the pulses
 * @param pulse the mean pulse at even places from one rising crossing to the next
 * @param readings null where the waveform could not be read in both ways
 * @param refusal why not; null otherwise
 */
public record SensorHealth(
    double lookedSeconds,
    double pulsesPerSecond,
    double low,
    double high,
    @Nullable Double noiseRms,
    Figure snrDb,
    double distortionPercent,
    List<Double> harmonicsDb,
    Figure riseSlopePerSecond,
    Figure fallSlopePerSecond,
    Hysteresis hysteresis,
    Figure dutyPercent,
    Figure riseMicroseconds,
    Figure predictedEdgeNoiseMicroseconds,
    Figure edgeNoiseMicroseconds,
    List<RidingLine> riding,
    List<Double> pulse,
    @Nullable TwoReadings readings,
    @Nullable Rejection refusal) {

  public SensorHealth {
    harmonicsDb = List.copyOf(harmonicsDb);
    riding = List.copyOf(riding);
    pulse = List.copyOf(pulse);
  }

  /**
   * Room for a comparator, whole widths in percent of the swing.
   *
   * @param widestPercent with more, the weakest pulse would be lost
   * @param neededPercent eight times the noise: with less, noise makes edges of its own (common
   *     practice); null where the noise is not known
   */
  public record Hysteresis(double widestPercent, @Nullable Double neededPercent) {}
}
