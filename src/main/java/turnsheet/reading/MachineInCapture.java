package turnsheet.reading;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Suspects;
import turnsheet.core.diagnose.parts.LineFinding;
import turnsheet.core.diagnose.parts.LineSuspects;
import turnsheet.core.diagnose.parts.MachinePart;
import turnsheet.core.diagnose.parts.RateTable;
import turnsheet.core.diagnose.parts.Running;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;
import turnsheet.shop.MachineModel;
import turnsheet.shop.PartMotion;
import turnsheet.shop.SpeedSettingId;

/**
 * The machine behind a reading: its parts as the model has them now, and how it ran.
 *
 * @param parts of the model
 * @param running with the mean speed of the reading
 */
public record MachineInCapture(List<MachinePart> parts, Running running) {

  public MachineInCapture {
    parts = List.copyOf(parts);
  }

  /** Empty where the model does not have the speed setting any more. */
  public static Optional<MachineInCapture> of(
      MachineModel model, SpeedSettingId settingId, Reading reading, int mainsHertz) {
    Figure deviation = reading.speed().deviationPercent();
    return model
        .setting(settingId)
        .map(
            setting ->
                new MachineInCapture(
                    PartMotion.parts(model),
                    PartMotion.measured(
                        setting,
                        orZero(deviation.value()),
                        orZero(deviation.expandedUncertainty()),
                        mainsHertz)));
  }

  /** The reading with suspects behind its lines. */
  public Reading suspectsIn(Reading reading) {
    return reading.withLines(
        Suspects.name(reading.lines(), parts, running, reading.source().durationSeconds()));
  }

  /** What can be said about each line of a reading. */
  public List<LineFinding> findings(Reading reading) {
    return new LineSuspects(
            RateTable.of(parts, running), running, reading.source().durationSeconds())
        .of(reading.lines());
  }

  private static double orZero(@Nullable Double number) {
    return number == null ? 0 : number;
  }
}
