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
public record CaptureChoices(ReadOptions options, MeasureSettings settings) {

  /** The same on another channel. */
  public CaptureChoices onChannel(int channel) {
    return new CaptureChoices(options.withChannel(channel), settings.onChannel(channel));
  }

  /** Whether nothing but the channel tells the two apart. */
  boolean differOnlyInChannel(CaptureChoices other) {
    int channel = settings.channel();
    return channel != other.settings.channel() && equals(other.onChannel(channel));
  }
}
