package turnsheet.demo;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.Drive;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ModelId;
import turnsheet.shop.PartBasis;
import turnsheet.shop.PartDetails;
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
            new RotatingPart(
                "capstan",
                PartKind.CAPSTAN,
                PartBasis.DIAMETER_MM,
                9.096,
                null,
                new PartDetails(0.1, null, null, null, null, null, null, null, null, null)),
            new RotatingPart(
                "tachometer ring",
                PartKind.SENSOR,
                PartBasis.TURNS_PER_TURN,
                1,
                "capstan",
                PartDetails.ofCount(120)),
            new RotatingPart(
                "capstan bearing",
                PartKind.BEARING,
                PartBasis.TURNS_PER_TURN,
                1,
                "capstan",
                PartDetails.ofBalls(8, 4.76, 22)),
            new RotatingPart("pinch roller", PartKind.ROLLER, PartBasis.DIAMETER_MM, 38, null),
            new RotatingPart("guide roller", PartKind.ROLLER, PartBasis.DIAMETER_MM, 22, null),
            new RotatingPart(
                "supply reel",
                PartKind.REEL,
                PartBasis.DIAMETER_MM,
                250,
                null,
                PartDetails.ofPack(115, Drive.Winding.GIVES)),
            new RotatingPart(
                "take-up reel",
                PartKind.REEL,
                PartBasis.DIAMETER_MM,
                250,
                null,
                PartDetails.ofPack(115, Drive.Winding.TAKES_UP))),
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
            new RotatingPart("platter", PartKind.PLATTER, PartBasis.TURNS_PER_TURN, 1, null),
            new RotatingPart(
                "belt", PartKind.BELT, PartBasis.LENGTH_MM, 568, "platter", PartDetails.ofRim(280)),
            new RotatingPart("motor", PartKind.MOTOR, PartBasis.MAINS_POLE_PAIRS, 9, null),
            new RotatingPart(
                "motor pulley", PartKind.PULLEY, PartBasis.TURNS_PER_TURN, 1, "motor")),
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
            new RotatingPart("capstan", PartKind.CAPSTAN, PartBasis.DIAMETER_MM, 2.5, null),
            new RotatingPart(
                "belt", PartKind.BELT, PartBasis.LENGTH_MM, 231, "capstan", PartDetails.ofRim(23)),
            new RotatingPart(
                "motor",
                PartKind.MOTOR,
                PartBasis.TURNS_PER_TURN,
                3.4,
                "capstan",
                PartDetails.ofCount(3))),
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
