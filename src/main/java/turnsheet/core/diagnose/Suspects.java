package turnsheet.core.diagnose;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.diagnose.parts.Drive;
import turnsheet.core.diagnose.parts.ExpectedRate;
import turnsheet.core.diagnose.parts.LineFinding;
import turnsheet.core.diagnose.parts.LineSuspects;
import turnsheet.core.diagnose.parts.MachinePart;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.diagnose.parts.RankedSuspect;
import turnsheet.core.diagnose.parts.RateTable;
import turnsheet.core.diagnose.parts.Running;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

/** Names the parts that can cause a line, in the words of the result contract. */
public final class Suspects {

  /** More would say nothing. */
  private static final int MOST = 8;

  private static final double ANY_MAINS_HERTZ = 50;

  private Suspects() {}

  /**
   * Gives every line its suspects.
   *
   * @param durationSeconds of the capture, positive
   */
  public static List<Reading.Line> name(
      List<Reading.Line> lines, List<MachinePart> parts, Running running, double durationSeconds) {
    return named(lines, new LineSuspects(RateTable.of(parts, running), running, durationSeconds));
  }

  /** The same where no more than the rates of the parts is known, each to one percent. */
  public static List<Reading.Line> name(
      List<Reading.Line> lines, List<RotatingPart> parts, double durationSeconds) {
    return named(lines, ofRates(parts, durationSeconds));
  }

  /** The suspects of one line, the most probable first; empty where no part comes near. */
  public static List<Reading.Suspect> of(
      double lineHertz, List<RotatingPart> parts, double durationSeconds) {
    Figure rate = Figure.withoutUncertainty(lineHertz, "only its rate is asked about");
    Reading.Line line = new Reading.Line(rate, rate, List.of());
    return named(List.of(line), ofRates(parts, durationSeconds)).get(0).suspects();
  }

  private static LineSuspects ofRates(List<RotatingPart> parts, double durationSeconds) {
    List<MachinePart> own = new ArrayList<>();
    for (RotatingPart part : parts) {
      own.add(MachinePart.of(part.name(), PartKind.OTHER, new Drive.Own(60 * part.rateHertz())));
    }
    Running running = Running.nominal(null, null, ANY_MAINS_HERTZ);
    List<ExpectedRate> rates =
        RateTable.of(own, running).stream().filter(r -> own.contains(r.part())).toList();
    return new LineSuspects(rates, running, durationSeconds);
  }

  private static List<Reading.Line> named(List<Reading.Line> lines, LineSuspects suspects) {
    return lines.stream()
        .map(
            line -> {
              List<Reading.Suspect> found =
                  suspects.of(line, lines).map(Suspects::contract).orElse(List.of());
              return new Reading.Line(line.rateHz(), line.peakPercent(), found);
            })
        .toList();
  }

  private static List<Reading.Suspect> contract(LineFinding finding) {
    return finding.suspects().stream().limit(MOST).map(Suspects::contract).toList();
  }

  private static Reading.Suspect contract(RankedSuspect ranked) {
    ExpectedRate expected = ranked.expected();
    return new Reading.Suspect(
        ranked.part(),
        expected.harmonic(),
        expected.rate().hertz(),
        expected.cause().word(),
        expected.sideband(),
        ranked.mismatchHz(),
        ranked.toleranceHz(),
        ranked.probability());
  }
}
