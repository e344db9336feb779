package turnsheet.report;

import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.UUID;
import javax.imageio.ImageIO;
import turnsheet.capture.CaptureId;
import turnsheet.capture.ToneMethod;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.reading.ReadingId;
import turnsheet.reading.SampleReadings;
import turnsheet.reading.StoredReading;
import turnsheet.reading.VisitReading;
import turnsheet.report.SheetSide.CurvePart;
import turnsheet.shop.FittedPart;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.ShopRules.Rules;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

/**
 * A report that is the same whenever and wherever it is made, with one of everything a report can
 * hold: a mark, several runs, each verdict, cautions, charts, lines, a condition without partner.
 */
public final class SampleReport {

  /** At eleven in universal time it is the same day in nearly every zone. */
  private static final Instant RECEIVED = Instant.parse("2026-03-02T11:00:00Z");

  private static final Instant REPAIRED = Instant.parse("2026-03-09T11:00:00Z");
  private static final SpeedSettingId SETTING = new SpeedSettingId(id(1));
  private static final Rules RULES = new Rules(DecisionRule.GUARDED, 10, 0.05);

  private SampleReport() {}

  /** The report in {@code en} or {@code de}. */
  public static Report in(String language) {
    Issue issue =
        new Issue(
            42,
            REPAIRED,
            language,
            "A4",
            "A. Person",
            "B. Person",
            "230 V, 21 °C, warmed up for 30 min",
            "Second cassette well not measured.",
            41L,
            "wrong serial number");
    return new Report(
        new VisitId(id(2)),
        new Report.Content(issue, sheet()),
        "",
        "ab".repeat(32),
        "0a1b2-c3d4e-5f607-18293",
        null);
  }

  private static Sheet sheet() {
    Conditions fast = conditions("19 cm/s", CaptureKind.TONE, 0.06);
    Conditions slow = conditions("9.5 cm/s", CaptureKind.TONE, 0.068);
    Conditions wheel = conditions("19 cm/s", CaptureKind.TACHOMETER, 0.07);
    return new Sheet(
        new Sheet.Letterhead("Bench and Belt", "1 Example Lane\nSampletown", mark()),
        new Sheet.Item(
            "Testdeck 100",
            "0042",
            "A. Customer",
            "customer@mail.example",
            RECEIVED,
            REPAIRED,
            "voices waver, high notes are dull",
            "belt and pinch roller replaced, capstan cleaned, speed set",
            List.of(
                new FittedPart("drive belt", 2), new FittedPart("felt of the supply reel", null)),
            "Hall sensor in place of the lamp"),
        new Sheet.Terms(
            RULES.rule(), RULES.leastFlutterChangePercent(), RULES.leastSpeedChangePercent()),
        List.of(
            fast.pair(
                List.of(
                    run(10, "as received", RECEIVED, 0.64, 0.121, true),
                    run(11, "as received", RECEIVED, 0.61, 0.127, true)),
                List.of(
                    run(12, "after repair", REPAIRED, 0.03, 0.041, true),
                    run(13, "after repair", REPAIRED, 0.02, 0.043, true))),
            slow.pair(
                List.of(run(14, "as received", RECEIVED, 0.37, 0.0690, true)),
                List.of(run(15, "after repair", REPAIRED, 0.36, 0.0675, false)))),
        List.of(
            wheel.single(List.of(run(16, "after cleaning the wheel", REPAIRED, 0.01, 0.05, true)))),
        List.of());
  }

  private static Conditions conditions(String setting, CaptureKind kind, double limitPercent) {
    return new Conditions(
        setting,
        kind,
        List.of(
            new ServiceLimit(SETTING, FigureName.DEVIATION, 0.5, "service manual"),
            new ServiceLimit(
                SETTING,
                FigureName.WEIGHTED_TWO_SIGMA,
                limitPercent,
                "service manual, section 4.2, for the transport alone")),
        RULES,
        reading -> SampleReadings.blocks(),
        SampleReport::spectrum);
  }

  private static VisitReading run(
      int number,
      String condition,
      Instant receivedAt,
      double deviationPercent,
      double twoSigmaPercent,
      boolean places) {
    Reading tone = SampleReadings.tone(deviationPercent, twoSigmaPercent);
    List<Reading.Line> lines = new ArrayList<>(tone.lines());
    if (condition.equals("as received")) {
      lines.add(
          new Reading.Line(
              Figure.of(3.42, 0.02),
              Figure.of(0.083, 0.001),
              List.of(new Reading.Suspect("supply reel table with its felt", 1, 3.41))));
      lines.add(new Reading.Line(Figure.of(24.9, 0.02), Figure.of(0.012, 0.001), List.of()));
    }
    return new VisitReading(
        SETTING,
        condition,
        "testdeck-0042-19cms-side-a-run-%d.wav".formatted(number),
        receivedAt,
        places ? "recorder 1" : null,
        places ? "reference tape 3150 Hz" : null,
        places ? ToneMethod.REPLAY : null,
        null,
        new StoredReading(
            new ReadingId(id(number)),
            new CaptureId(id(number)),
            receivedAt,
            new Reading(
                tone.source(),
                tone.method(),
                tone.speed(),
                tone.flutter(),
                lines,
                tone.edges(),
                tone.signal(),
                tone.warnings())));
  }

  /** A floor that falls with the rate, and the capstan's line, larger before the repair. */
  private static List<CurvePart> spectrum(VisitReading of) {
    double line = of.condition().equals("as received") ? 0.09 : 0.03;
    List<CurvePart> parts = new ArrayList<>();
    for (double from = 0.2; from < 100; from *= 10) {
      double step = from * 0.03;
      List<Float> high = new ArrayList<>();
      for (double hz = from; hz <= Math.min(100, from * 10); hz += step) {
        double bell = Math.exp(-Math.pow((hz - 9.98) / (0.2 + step), 2));
        high.add((float) (0.01 / (1 + hz / 5) + line * bell));
      }
      parts.add(new CurvePart(from, step, high));
    }
    return parts;
  }

  /** A disc on clear ground: paper must show through, and PDF/A sets terms for that. */
  private static String mark() {
    BufferedImage image = new BufferedImage(96, 96, BufferedImage.TYPE_INT_ARGB);
    Graphics2D pen = image.createGraphics();
    pen.setColor(new Color(40, 40, 40, 160));
    pen.fillOval(8, 8, 80, 80);
    pen.dispose();
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try {
      ImageIO.write(image, "png", out);
    } catch (IOException e) {
      throw new UncheckedIOException(e); // nothing but memory is written to
    }
    return "data:image/png;base64," + Base64.getEncoder().encodeToString(out.toByteArray());
  }

  private static UUID id(int number) {
    return new UUID(0, number);
  }
}
