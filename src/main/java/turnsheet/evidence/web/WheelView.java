package turnsheet.evidence.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.wheel.FlutterTrio;
import turnsheet.core.diagnose.wheel.Standing;
import turnsheet.core.diagnose.wheel.ToothDamage;
import turnsheet.core.diagnose.wheel.WheelFinding;
import turnsheet.core.diagnose.wheel.WheelHarmonic;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.signal.Rejection;
import turnsheet.evidence.Section;
import turnsheet.evidence.WheelEvidence;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** Shows the sensor wheel. */
@Component
@Order(40)
class WheelView implements SectionView {

  private static final String NARROW_SPACE = "\u202f";
  private static final String PERCENT = "%";

  /** With fewer places there is no telling what is usual on the wheel. */
  private static final int FEWEST_JUDGED = 8;

  @Override
  public String name() {
    return "wheel";
  }

  @Override
  public String template() {
    return "evidence/_wheel";
  }

  @Override
  public String title(Wording words) {
    return words.text("wheel.title");
  }

  @Override
  public String what(Wording words) {
    return words.text("wheel.what");
  }

  @Override
  public WheelPage page(Section section, Beside beside, Wording words) {
    WheelEvidence evidence = section.found(WheelEvidence.class).orElseThrow();
    Integer stated = evidence.statedTeeth();
    String number = stated == null ? "" : Integer.toString(stated);
    WheelFinding finding = evidence.finding();
    if (finding == null) {
      Rejection why = evidence.why();
      return new WheelPage(
          beside.captureId(),
          why == null ? "" : words.said(why.message()),
          List.of(),
          stated == null || stated < 2,
          number,
          null,
          "",
          List.of(),
          List.of(),
          List.of(),
          List.of(),
          false);
    }
    return new WheelPage(
        beside.captureId(),
        answer(finding, words),
        new WheelNotes(finding, words).all(),
        stated == null || finding.origin() != WheelFinding.Origin.STATED,
        number,
        WheelPicture.of(finding, words),
        WheelPicture.scale(finding, words),
        flutterColumns(finding, words),
        flutter(finding, words),
        harmonics(finding, words),
        finding.damage().stream().map(d -> damage(d, words)).toList(),
        finding.places() >= FEWEST_JUDGED);
  }

  private static String answer(WheelFinding finding, Wording words) {
    Numbers numbers = words.numbers();
    Figure rms = finding.patternRmsPercentOfPeriod();
    Double value = rms.value();
    Double u = rms.expandedUncertainty();
    String places = Integer.toString(finding.places());
    if (value == null || u == null || value <= u) {
      double most = (value == null ? 0 : value) + (u == null ? 0 : u);
      return words.text(
          "wheel.answer.none",
          places,
          numbers.show(most, null, PERCENT, Numbers.Sign.PLAIN).valueAndUnit());
    }
    return words.text(
        "wheel.answer",
        places,
        numbers.show(rms, PERCENT, Numbers.Sign.PLAIN).text(),
        numbers.show(finding.patternRmsArcSeconds(), "\u2033", Numbers.Sign.PLAIN).text(),
        numbers.fixed(finding.turns(), 0));
  }

  private static List<String> flutterColumns(WheelFinding finding, Wording words) {
    List<String> columns = new ArrayList<>();
    columns.add(words.text("wheel.flutter.figure"));
    columns.add(words.text("wheel.flutter.measured"));
    columns.add(words.text("wheel.flutter.without"));
    if (finding.flutterWithoutSpacing() != null) {
      columns.add(words.text("wheel.flutter.openLeft"));
    }
    return columns;
  }

  private static List<WheelPage.Row> flutter(WheelFinding finding, Wording words) {
    return List.of(
        row(FigureName.WEIGHTED_TWO_SIGMA, FlutterTrio::weightedTwoSigmaPercent, finding, words),
        row(FigureName.WEIGHTED_RMS, FlutterTrio::weightedRmsPercent, finding, words),
        row(FigureName.UNWEIGHTED_RMS, FlutterTrio::unweightedRmsPercent, finding, words));
  }

  private static WheelPage.Row row(
      FigureName name,
      java.util.function.Function<FlutterTrio, Figure> figure,
      WheelFinding finding,
      Wording words) {
    List<String> cells = new ArrayList<>();
    cells.add(shown(name, figure.apply(finding.flutter()), words));
    cells.add(shown(name, figure.apply(finding.flutterWithout()), words));
    FlutterTrio left = finding.flutterWithoutSpacing();
    if (left != null) {
      cells.add(shown(name, figure.apply(left), words));
    }
    return new WheelPage.Row(words.nameOf(name), cells);
  }

  private static String shown(FigureName name, Figure figure, Wording words) {
    return words.show(name, figure).text();
  }

  private static List<WheelPage.Row> harmonics(WheelFinding finding, Wording words) {
    Numbers numbers = words.numbers();
    List<WheelPage.Row> rows = new ArrayList<>();
    for (WheelHarmonic h : finding.harmonics()) {
      rows.add(
          new WheelPage.Row(
              Integer.toString(h.order()),
              List.of(
                  plain(numbers, h.rateHertz(), "Hz"),
                  numbers
                      .show(
                          h.peakPercent(),
                          h.expandedUncertaintyPercent(),
                          PERCENT,
                          Numbers.Sign.PLAIN)
                      .text(),
                  plain(numbers, h.sameSpeedPeakPercent(), PERCENT),
                  standing(h, words))));
    }
    return rows;
  }

  private static String standing(WheelHarmonic harmonic, Wording words) {
    return harmonic.standing() == Standing.MOTION
        ? words.text(
            "wheel.standing.motion", plain(words.numbers(), harmonic.motionPeakPercent(), PERCENT))
        : words.text("wheel.standing." + harmonic.standing().name().toLowerCase(Locale.ROOT));
  }

  private static String damage(ToothDamage damage, Wording words) {
    return words.text(
        "wheel.damage." + damage.kind().name().toLowerCase(Locale.ROOT),
        Integer.toString(damage.tooth()),
        plain(words.numbers(), Math.abs(damage.percentOfPeriod()), PERCENT),
        words.numbers().fixed(100 * damage.shareOfTurns(), 0) + NARROW_SPACE + PERCENT);
  }

  private static String plain(Numbers numbers, double value, @Nullable String unit) {
    return numbers.show(value, null, unit == null ? "" : unit, Numbers.Sign.PLAIN).valueAndUnit();
  }
}
