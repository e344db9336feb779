package turnsheet.pair.web;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.pair.PairFindings;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.pair.PairSheet;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** The figures of both sensors side by side. */
final class PairRows {

  private PairRows() {}

  static List<PairSheetPage.Row> of(PairSheet sheet, Wording words) {
    PairFindings findings = sheet.findings();
    List<PairSheetPage.Row> rows = new ArrayList<>();
    if (findings == null) {
      sheet.compared().forEach(compared -> rows.add(row(compared, words)));
    } else {
      together(findings, rows, words);
    }
    rows.add(
        new PairSheetPage.Row(
            words.text("sensors.row.teeth"),
            Integer.toString(sheet.order().original().teeth()),
            Integer.toString(sheet.order().replacement().teeth()),
            ""));
    rows.add(
        new PairSheetPage.Row(
            words.text("sensors.row.updates"),
            rate(sheet.original().pulseRateHz(), words),
            rate(sheet.replacement().pulseRateHz(), words),
            ""));
    return rows;
  }

  private static void together(PairFindings findings, List<PairSheetPage.Row> rows, Wording words) {
    PairFindings.Sensor one = findings.original();
    PairFindings.Sensor other = findings.replacement();
    Figure ratio = findings.noiseRatio();
    rows.add(
        new PairSheetPage.Row(
            words.text("sensors.row.noise"),
            PairWords.noise(one, words),
            PairWords.noise(other, words),
            change(ratio, 1, words)));
    // the same noise of an edge shows less flutter where there are more edges
    double denser = Math.sqrt(other.edgesPerSecond() / one.edgesPerSecond());
    rows.add(
        new PairSheetPage.Row(
            words.text("sensors.row.noiseWeighted"),
            percent(one.noiseWeightedPercent(), words),
            percent(other.noiseWeightedPercent(), words),
            change(ratio, denser, words)));
    rows.add(
        new PairSheetPage.Row(
            words.text("sensors.row.noiseUnweighted"),
            percent(one.noiseUnweightedPercent(), words),
            percent(other.noiseUnweightedPercent(), words),
            change(ratio, denser, words)));
    rows.add(
        new PairSheetPage.Row(
            words.text("sensors.row.single"),
            words
                .numbers()
                .show(one.singleEdgeNoiseMicroseconds(), "µs", Numbers.Sign.PLAIN)
                .text(),
            words
                .numbers()
                .show(other.singleEdgeNoiseMicroseconds(), "µs", Numbers.Sign.PLAIN)
                .text(),
            ""));
  }

  private static String percent(Figure figure, Wording words) {
    return words.numbers().show(figure, "%", Numbers.Sign.PLAIN).text();
  }

  private static String rate(double hertz, Wording words) {
    return words.numbers().show(hertz, null, "/s", Numbers.Sign.PLAIN).text();
  }

  /** By how much it got less or more, where the interval leaves no doubt. */
  private static String change(Figure ratio, double factor, Wording words) {
    Double value = ratio.value();
    Double u = ratio.expandedUncertainty();
    if (value == null || u == null) {
      return words.text("sensors.change.untold");
    }
    double times = value * factor;
    double spread = u * factor;
    if (times - spread > 1) {
      return words.text("sensors.change.less", PairWords.times(times, spread, words));
    }
    if (times + spread < 1) {
      return words.text(
          "sensors.change.more", PairWords.times(1 / times, spread / (times * times), words));
    }
    return words.text("sensors.change.none");
  }

  private static PairSheetPage.Row row(PairSheet.Compared compared, Wording words) {
    Numbers numbers = words.numbers();
    Difference difference = compared.difference();
    String by = numbers.show(difference.difference(), compared.unit(), Numbers.Sign.SHOWN).text();
    String change =
        switch (difference.change()) {
          case IMPROVED -> words.text("sensors.change.improved", by);
          case WORSE -> words.text("sensors.change.worse", by);
          case TOO_SMALL_TO_MATTER, NO_CHANGE_SHOWN -> words.text("sensors.change.open", by);
        };
    return new PairSheetPage.Row(
        FigureName.ofPath(compared.name())
            .map(words::nameOf)
            .orElseGet(() -> words.text("sensors.row.edgeNoise")),
        numbers.show(compared.original(), compared.unit(), Numbers.Sign.PLAIN).text(),
        numbers.show(compared.replacement(), compared.unit(), Numbers.Sign.PLAIN).text(),
        change);
  }
}
