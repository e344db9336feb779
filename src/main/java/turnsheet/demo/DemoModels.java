package turnsheet.demo;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ModelId;
import turnsheet.shop.PartBasis;
import turnsheet.shop.RotatingPart;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;

/** Three invented kinds of machine with invented limits. */
final class DemoModels {

  static final String AT_9 = "9.5 cm/s";
  static final String AT_19 = "19 cm/s";
  static final String AT_38 = "38 cm/s";
  static final String AT_33 = "33⅓ rev/min";
  static final String DICTATION = "4.76 cm/s";

  private static final String INVENTED = "service sheet of the invented maker";

  private DemoModels() {}

  static MachineModel reelTransport() {
    SpeedSetting slow = tape(AT_9, 9.525, SampleUploads.PULSES_AT_19 / 2);
    SpeedSetting middle = tape(AT_19, 19.05, SampleUploads.PULSES_AT_19);
    SpeedSetting fast = tape(AT_38, 38.1, SampleUploads.PULSES_AT_19 * 2);
    return new MachineModel(
        ModelId.next(),
        "Quillvar R2 reel transport",
        120,
        "Capstan with a 120-tooth ring; test point beside the servo board.",
        List.of(slow, middle, fast),
        List.of(
            new RotatingPart("capstan", PartBasis.DIAMETER_MM, 9.096, null),
            new RotatingPart("pinch roller", PartBasis.DIAMETER_MM, 38, null),
            new RotatingPart("guide roller", PartBasis.DIAMETER_MM, 22, null),
            new RotatingPart("full reel", PartBasis.DIAMETER_MM, 250, null)),
        List.of(
            limit(slow, FigureName.DEVIATION, 0.3),
            limit(slow, FigureName.WEIGHTED_TWO_SIGMA, 0.12),
            limit(middle, FigureName.DEVIATION, 0.3),
            limit(middle, FigureName.WEIGHTED_TWO_SIGMA, 0.08),
            limit(fast, FigureName.DEVIATION, 0.3),
            limit(fast, FigureName.WEIGHTED_TWO_SIGMA, 0.06)));
  }

  static MachineModel recordPlayer() {
    SpeedSetting long33 = turning(AT_33, 100.0 / 3);
    SpeedSetting single = turning("45 rev/min", 45);
    return new MachineModel(
        ModelId.next(),
        "Brumeck P1 record player",
        null,
        "Belt drive from a synchronous motor.",
        List.of(long33, single),
        List.of(
            new RotatingPart("platter", PartBasis.TURNS_PER_TURN, 1, null),
            new RotatingPart("belt", PartBasis.TURNS_PER_TURN, 1.55, "platter"),
            new RotatingPart("motor pulley", PartBasis.TURNS_PER_TURN, 10, "platter")),
        List.of(
            limit(long33, FigureName.DEVIATION, 0.5),
            limit(long33, FigureName.WEIGHTED_TWO_SIGMA, 0.1),
            limit(single, FigureName.DEVIATION, 0.5),
            limit(single, FigureName.WEIGHTED_TWO_SIGMA, 0.1)));
  }

  static MachineModel dictationMachine() {
    SpeedSetting only =
        new SpeedSetting(SpeedSettingId.next(), DICTATION, SpeedUnit.CM_PER_S, 4.7625, null, 250.0);
    return new MachineModel(
        ModelId.next(),
        "Tessolin D5 dictation machine",
        null,
        "The tachometer sits on the motor; the belt turns the capstan.",
        List.of(only),
        List.of(
            new RotatingPart("capstan", PartBasis.DIAMETER_MM, 2.5, null),
            new RotatingPart("belt", PartBasis.FIXED_PER_MINUTE, 114, null)),
        List.of(
            limit(only, FigureName.DEVIATION, 1.5),
            limit(only, FigureName.WEIGHTED_TWO_SIGMA, 0.25)));
  }

  private static SpeedSetting tape(String label, double cmPerS, @Nullable Double pulses) {
    return new SpeedSetting(
        SpeedSettingId.next(), label, SpeedUnit.CM_PER_S, cmPerS, SampleUploads.TONE_HZ, pulses);
  }

  private static SpeedSetting turning(String label, double perMinute) {
    return new SpeedSetting(
        SpeedSettingId.next(),
        label,
        SpeedUnit.REV_PER_MIN,
        perMinute,
        SampleUploads.TONE_HZ,
        null);
  }

  private static ServiceLimit limit(SpeedSetting setting, FigureName figure, double bound) {
    return new ServiceLimit(setting.id(), figure, bound, INVENTED);
  }
}
