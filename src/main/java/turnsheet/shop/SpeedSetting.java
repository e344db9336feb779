package turnsheet.shop;

import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;

/**
 * A nominal speed of a machine model.
 *
 * @param label as the selector of the machine says it; no other setting of the model has it
 * @param nominalSpeed in the unit beside it
 * @param toneHz test tone commonly played at this setting; null where unknown
 * @param pulsesPerSecond of the tachometer at nominal speed, where it does not follow from the
 *     model's pulses per turn; null where it does or is unknown
 */
public record SpeedSetting(
    SpeedSettingId id,
    String label,
    SpeedUnit unit,
    double nominalSpeed,
    @Nullable Double toneHz,
    @Nullable Double pulsesPerSecond) {

  public static final int LABEL_LENGTH = 80;

  public SpeedSetting {
    Require.text("label", label, LABEL_LENGTH);
    Require.positive("nominal speed", nominalSpeed);
    Require.positive("tone", toneHz);
    Require.positive("pulses per second", pulsesPerSecond);
  }

  /** Speed of the tape in cm/s; empty where the setting is a turning rate. */
  public OptionalDouble tapeSpeedCmPerS() {
    return unit == SpeedUnit.CM_PER_S ? OptionalDouble.of(nominalSpeed) : OptionalDouble.empty();
  }

  /** Nominal turns per second; empty where the setting is a tape speed. */
  public OptionalDouble turnsPerSecond() {
    return unit == SpeedUnit.REV_PER_MIN
        ? OptionalDouble.of(nominalSpeed / 60)
        : OptionalDouble.empty();
  }
}
