package turnsheet.shop.web;

import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Positive;
import jakarta.validation.constraints.Size;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.shop.MachineModel;
import turnsheet.shop.PartDetails;
import turnsheet.shop.RotatingPart;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;

/**
 * A machine model in JSON, with all that belongs to it.
 *
 * @param id given by the service
 * @param pulsesPerTurn null where there is no sensor wheel or nobody has counted
 */
record ModelDocument(
    @Nullable UUID id,
    @NotBlank @Size(max = MachineModel.NAME_LENGTH) String name,
    @Nullable @Positive Integer pulsesPerTurn,
    @Size(max = MachineModel.NOTE_LENGTH) String note,
    List<@Valid @NotNull Setting> speedSettings,
    List<@Valid @NotNull Part> rotatingParts,
    List<@Valid @NotNull Limit> serviceLimits) {

  ModelDocument {
    name = Typed.text(name);
    note = Typed.text(note);
    speedSettings = orEmpty(speedSettings);
    rotatingParts = orEmpty(rotatingParts);
    serviceLimits = orEmpty(serviceLimits);
  }

  /**
   * One of the two speeds is given, the other null.
   *
   * @param id of the setting as it is stored; where it is left out, the label tells which is meant
   * @param pulsesPerSecond null where it follows from the pulses per turn or is unknown
   */
  record Setting(
      @Nullable UUID id,
      @NotBlank @Size(max = SpeedSetting.LABEL_LENGTH) String label,
      @Nullable @Positive Double speedCmPerS,
      @Nullable @Positive Double speedRevPerMin,
      @Nullable @Positive Double toneHz,
      @Nullable @Positive Double pulsesPerSecond) {

    Setting {
      label = Typed.text(label);
    }
  }

  /**
   * One of the five numbers is given, the others null.
   *
   * @param kind capstan, roller, idler, belt, pulley, platter, motor, reel, gear, bearing, sensor
   *     or other; null for other
   * @param lengthMm of a belt
   * @param mainsPolePairs of a motor on the mains
   * @param turnsOf name of the part whose turns are counted, or on which a belt lies; null for the
   *     nominal rotation, or tape speed
   * @param details numbers of the kind; null where there are none
   * @param rates told by the service, not read
   */
  record Part(
      @NotBlank @Size(max = RotatingPart.NAME_LENGTH) String name,
      @Nullable String kind,
      @Nullable @Positive Double diameterMm,
      @Nullable @Positive Double turnsPerTurn,
      @Nullable @Positive Double turnsPerMinute,
      @Nullable @Positive Double lengthMm,
      @Nullable @Positive Integer mainsPolePairs,
      @Nullable @Size(max = RotatingPart.NAME_LENGTH) String turnsOf,
      @Nullable PartDetails details,
      @Nullable List<Rate> rates) {

    Part {
      name = Typed.text(name);
    }
  }

  /**
   * How often a part turns at a speed setting.
   *
   * @param rateHz the middle, where it has a range
   * @param lowHz low end of the range of a reel or an induction motor; null for others
   * @param highHz high end of it
   */
  record Rate(
      String speedSetting, double rateHz, @Nullable Double lowHz, @Nullable Double highHz) {}

  /**
   * @param speedSetting label of the setting
   * @param figure path in a reading, as {@code flutter.weightedTwoSigmaPercent}
   * @param upperBound in the unit that the path ends with, without sign
   * @param origin where the bound comes from
   */
  record Limit(
      @NotBlank String speedSetting,
      @NotBlank String figure,
      @NotNull @Positive Double upperBound,
      @NotBlank @Size(max = ServiceLimit.ORIGIN_LENGTH) String origin) {

    Limit {
      speedSetting = Typed.text(speedSetting);
      figure = Typed.text(figure);
      origin = Typed.text(origin);
    }
  }

  @SuppressWarnings("NullAway") // what a program sends may leave a list out, or hold nulls
  private static <T> List<T> orEmpty(@Nullable List<T> sent) {
    return sent == null ? List.of() : java.util.Collections.unmodifiableList(sent);
  }
}
