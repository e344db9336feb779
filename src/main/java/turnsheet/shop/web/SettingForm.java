package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Optional;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.springframework.validation.Errors;
import turnsheet.access.ShopPreferences.SpeedLiking;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;

/** A speed setting as typed. */
record SettingForm(
    @NotBlank(message = "{shop.form.required}")
        @Size(max = SpeedSetting.LABEL_LENGTH, message = "{shop.form.tooLong}")
        String label,
    String nominalSpeed,
    String speedUnit,
    String toneHz,
    String pulsesPerSecond) {

  /** Offered beside the stored units: converted when it is read. */
  static final String IN_PER_S = "IN_PER_S";

  private static final int DIGITS_OF_A_DOUBLE = 17;

  /** Begins with the unit that the shop likes. */
  static SettingForm empty(SpeedLiking liking) {
    String unit = liking == SpeedLiking.IN_PER_S ? IN_PER_S : SpeedUnit.CM_PER_S.name();
    return new SettingForm("", "", unit, "", "");
  }

  SettingForm {
    label = Typed.text(label);
    nominalSpeed = Typed.text(nominalSpeed);
    speedUnit = Typed.text(speedUnit);
    toneHz = Typed.text(toneHz);
    pulsesPerSecond = Typed.text(pulsesPerSecond);
  }

  /** The setting as it is typed in the unit that the shop likes. */
  static SettingForm of(SpeedSetting setting, SpeedLiking liking) {
    boolean inches = setting.unit() == SpeedUnit.CM_PER_S && liking == SpeedLiking.IN_PER_S;
    return new SettingForm(
        setting.label(),
        inches ? inInches(setting.nominalSpeed()) : Typed.number(setting.nominalSpeed()),
        inches ? IN_PER_S : setting.unit().name(),
        Typed.number(setting.toneHz()),
        Typed.number(setting.pulsesPerSecond()));
  }

  /** The setting meant; nothing where the errors say why. */
  Optional<SpeedSetting> setting(SpeedSettingId id, Errors errors) {
    Double speed = Typed.positive(errors, "nominalSpeed", nominalSpeed);
    boolean disc = speedUnit.equals(SpeedUnit.REV_PER_MIN.name());
    return speed == null || disc
        ? setting(id, SpeedUnit.REV_PER_MIN, speed, errors)
        : setting(id, SpeedUnit.CM_PER_S, inCm(speed), errors);
  }

  /**
   * The setting meant in place of another. A speed left as the form showed it stays as it is kept
   * to the last bit: not every number of cm/s has one of in/s that gives it back.
   */
  Optional<SpeedSetting> setting(SpeedSetting old, Errors errors) {
    boolean untouched =
        Stream.of(SpeedLiking.values())
            .map(liking -> of(old, liking))
            .anyMatch(
                shown ->
                    shown.nominalSpeed.equals(nominalSpeed) && shown.speedUnit.equals(speedUnit));
    return untouched
        ? setting(old.id(), old.unit(), old.nominalSpeed(), errors)
        : setting(old.id(), errors);
  }

  private Optional<SpeedSetting> setting(
      SpeedSettingId id, SpeedUnit unit, @Nullable Double speed, Errors errors) {
    Double tone = Typed.positiveOrNone(errors, "toneHz", toneHz);
    Double pulses = Typed.positiveOrNone(errors, "pulsesPerSecond", pulsesPerSecond);
    return errors.hasErrors() || speed == null
        ? Optional.empty()
        : Optional.of(new SpeedSetting(id, label, unit, speed, tone, pulses));
  }

  private double inCm(double speed) {
    return speedUnit.equals(IN_PER_S) ? ofInches(speed) : speed;
  }

  /** As decimals: 3.75 in/s are 9.525 cm/s, without the rounding of a product of two doubles. */
  private static double ofInches(double inches) {
    return BigDecimal.valueOf(inches)
        .multiply(BigDecimal.valueOf(SpeedUnit.CM_PER_INCH))
        .doubleValue();
  }

  /** The fewest digits that give the speed back; all of a double where none do. */
  private static String inInches(double cm) {
    BigDecimal inch = BigDecimal.valueOf(SpeedUnit.CM_PER_INCH);
    BigDecimal inches = BigDecimal.ZERO;
    for (int digits = 1; digits <= DIGITS_OF_A_DOUBLE; digits++) {
      inches = BigDecimal.valueOf(cm).divide(inch, new MathContext(digits, RoundingMode.HALF_UP));
      if (ofInches(inches.doubleValue()) == cm) {
        break;
      }
    }
    return Typed.number(inches.doubleValue());
  }
}
