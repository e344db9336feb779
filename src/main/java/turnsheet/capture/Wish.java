package turnsheet.capture;

import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.CaptureKind;

/**
 * What the bench says about a capture before it is measured; null leaves it to the proposal.
 *
 * @param nominalHz tone or pulse rate at nominal speed
 * @param searchPercent how far from nominal the rate is looked for
 * @param teeth pulses per turn of the sensor wheel
 */
public record Wish(
    @Nullable CaptureKind kind,
    @Nullable Double nominalHz,
    @Nullable Double searchPercent,
    @Nullable Integer teeth,
    ReadOptions options) {

  /** Takes every proposal. */
  public static Wish none() {
    return new Wish(null, null, null, null, ReadOptions.none());
  }
}
