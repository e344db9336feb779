package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.util.Optional;
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

  static SettingForm of(SpeedSetting setting) {
    return new SettingForm(
        setting.label(),
        Typed.number(setting.nominalSpeed()),
        setting.unit().name(),
        Typed.number(setting.toneHz()),
        Typed.number(setting.pulsesPerSecond()));
  }

  /** The setting meant; nothing where the errors say why. */
  Optional<SpeedSetting> setting(SpeedSettingId id, Errors errors) {
    Double speed = Typed.positive(errors, "nominalSpeed", nominalSpeed);
    Double tone = Typed.positiveOrNone(errors, "toneHz", toneHz);
    Double pulses = Typed.positiveOrNone(errors, "pulsesPerSecond", pulsesPerSecond);
    if (errors.hasErrors() || speed == null) {
      return Optional.empty();
    }
    return Optional.of(
        speedUnit.equals(SpeedUnit.REV_PER_MIN.name())
            ? new SpeedSetting(id, label, SpeedUnit.REV_PER_MIN, speed, tone, pulses)
            : new SpeedSetting(id, label, SpeedUnit.CM_PER_S, inCm(speed), tone, pulses));
  }

  private double inCm(double speed) {
    return speedUnit.equals(IN_PER_S) ? speed * SpeedUnit.CM_PER_INCH : speed;
  }
}
