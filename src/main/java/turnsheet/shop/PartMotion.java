package turnsheet.shop;

import java.util.List;
import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.Drive;
import turnsheet.core.diagnose.parts.Feature;
import turnsheet.core.diagnose.parts.MachinePart;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.diagnose.parts.Running;

/** The parts of a model as the core knows them. */
public final class PartMotion {

  private static final double MM_PER_CM = 10;

  private PartMotion() {}

  /** All parts of a model, in its order. */
  public static List<MachinePart> parts(MachineModel model) {
    return model.parts().stream().map(PartMotion::part).toList();
  }

  /** A machine at a setting that runs as the setting says. */
  public static Running nominal(SpeedSetting setting, double mainsHertz) {
    return Running.nominal(tape(setting), turns(setting), mainsHertz);
  }

  /**
   * A machine at a setting as it was measured.
   *
   * @param deviationPercent from nominal speed
   * @param limitPercent half width of that
   */
  public static Running measured(
      SpeedSetting setting, double deviationPercent, double limitPercent, double mainsHertz) {
    return new Running(
        tape(setting),
        turns(setting),
        deviationPercent,
        limitPercent,
        mainsHertz,
        Running.USUAL_MAINS_LIMIT_HERTZ);
  }

  private static @Nullable Double tape(SpeedSetting setting) {
    OptionalDouble speed = setting.tapeSpeedCmPerS();
    return speed.isPresent() ? speed.getAsDouble() * MM_PER_CM : null;
  }

  private static @Nullable Double turns(SpeedSetting setting) {
    OptionalDouble turns = setting.turnsPerSecond();
    return turns.isPresent() ? turns.getAsDouble() : null;
  }

  static MachinePart part(RotatingPart part) {
    return new MachinePart(
        part.name(), part.kind(), drive(part), feature(part), part.details().tolerancePercent());
  }

  private static Drive drive(RotatingPart part) {
    PartDetails d = part.details();
    return switch (part.basis()) {
      case DIAMETER_MM -> {
        Double empty = part.kind() == PartKind.REEL ? d.emptyMm() : null;
        Drive.Winding winding = d.winding();
        yield empty == null
            ? new Drive.Rim(part.amount())
            : new Drive.Pack(part.amount(), empty, winding == null ? Drive.Winding.GIVES : winding);
      }
      case TURNS_PER_TURN -> new Drive.Geared(part.amount(), part.referencePart());
      case FIXED_PER_MINUTE -> new Drive.Own(part.amount());
      case LENGTH_MM -> new Drive.Loop(part.amount(), part.referencePart(), d.rimMm());
      case MAINS_POLE_PAIRS ->
          new Drive.Supply(
              (int) part.amount(), share(d.slipLowPercent()), share(d.slipHighPercent()));
    };
  }

  private static double share(@Nullable Double percent) {
    return percent == null ? 0 : percent / 100;
  }

  private static @Nullable Feature feature(RotatingPart part) {
    PartDetails d = part.details();
    Integer count = d.count();
    Double ball = d.ballMm();
    Double pitch = d.pitchMm();
    if (count == null) {
      return null;
    }
    return switch (part.kind()) {
      case GEAR, SENSOR -> new Feature.Teeth(count);
      case MOTOR -> part.basis() == PartBasis.MAINS_POLE_PAIRS ? null : new Feature.Poles(count);
      case BEARING -> {
        Double angle = d.contactDegrees();
        yield ball == null || pitch == null
            ? null
            : new Feature.Balls(count, ball, pitch, angle == null ? 0 : angle);
      }
      default -> null;
    };
  }
}
