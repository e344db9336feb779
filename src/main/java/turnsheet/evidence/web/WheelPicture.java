package turnsheet.evidence.web;

import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import turnsheet.core.diagnose.wheel.ToothDamage;
import turnsheet.core.diagnose.wheel.WheelFinding;
import turnsheet.core.diagnose.wheel.WheelPlace;
import turnsheet.reading.chart.WheelDrawing;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** Draws the pattern round the wheel. */
final class WheelPicture {

  private static final double[] STEPS = {1, 2, 5, 10};

  private WheelPicture() {}

  static Picture of(WheelFinding finding, Wording words) {
    Set<Integer> flagged =
        finding.damage().stream().map(ToothDamage::tooth).collect(Collectors.toSet());
    List<Integer> missing =
        finding.damage().stream()
            .filter(d -> d.kind() == ToothDamage.Kind.MISSING)
            .map(d -> d.tooth() - 1)
            .toList();
    String svg =
        WheelDrawing.of(
            finding.places(),
            finding.teeth().stream()
                .map(
                    t ->
                        new WheelDrawing.Tooth(
                            t.tooth() - 1, t.percentOfPeriod(), flagged.contains(t.tooth())))
                .toList(),
            missing,
            finding.places() - finding.markMissing(),
            ring(finding),
            words.text("wheel.mark"),
            words.text("wheel.picture"),
            scale(finding, words));
    return new Picture(
        svg,
        List.of(
            words.text("wheel.column.tooth"),
            words.text("wheel.column.late"),
            words.text("wheel.column.arc")),
        finding.teeth().stream().map(t -> row(t, finding, words)).toList());
  }

  /** How the drawing is to be read. */
  static String scale(WheelFinding finding, Wording words) {
    String ring = words.numbers().show(ring(finding), null, "%", Numbers.Sign.PLAIN).valueAndUnit();
    return words.text("wheel.scale", ring);
  }

  /** A round number near half of the largest deviation. */
  private static double ring(WheelFinding finding) {
    double most =
        finding.teeth().stream().mapToDouble(t -> Math.abs(t.percentOfPeriod())).max().orElse(0);
    if (!(most > 0)) {
      return 1;
    }
    double decade = Math.pow(10, Math.floor(Math.log10(most)));
    double ring = decade / 2;
    for (double step : STEPS) {
      if (step * decade <= most * 1.000001) {
        ring = step * decade;
      }
    }
    return ring;
  }

  private static List<String> row(WheelPlace place, WheelFinding finding, Wording words) {
    Numbers numbers = words.numbers();
    double u = finding.placeUncertaintyPercent();
    double toArc = 1296000.0 / 100 / finding.places();
    return List.of(
        Integer.toString(place.tooth()),
        numbers.show(place.percentOfPeriod(), u, "", Numbers.Sign.SHOWN).text(),
        numbers.show(place.arcSeconds(), u * toArc, "", Numbers.Sign.SHOWN).text());
  }
}
