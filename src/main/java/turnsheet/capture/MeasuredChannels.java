package turnsheet.capture;

import turnsheet.core.measure.MeasureSettings;

/** Knows which channels of a capture need no measuring; whoever keeps the readings tells. */
@FunctionalInterface
public interface MeasuredChannels {

  /**
   * Whether the latest measurement of the channel that the settings name was made with these
   * settings by the present method, and gave a reading.
   */
  boolean has(CaptureId capture, MeasureSettings settings);
}
