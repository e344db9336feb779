package turnsheet.pair.web;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import turnsheet.core.diagnose.pair.PairFindings;
import turnsheet.evidence.web.Picture;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.Curve;
import turnsheet.reading.chart.SvgChart;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** The spectra of both sensors and of what they share, in one frame. */
final class PairPicture {

  private static final int HEIGHT = 300;
  private static final int TABLE_EVERY = 6;

  private PairPicture() {}

  static Picture of(PairFindings findings, Wording words) {
    List<PairFindings.Point> points = findings.spectrum();
    double highest = 0;
    double lowest = Double.POSITIVE_INFINITY;
    for (PairFindings.Point point : points) {
      highest = Math.max(highest, Math.max(point.original(), point.replacement()));
      lowest = Math.min(lowest, Math.min(point.original(), point.replacement()));
    }
    double top = Math.max(1e-7, 1.3 * highest);
    SvgChart chart =
        new SvgChart(
                Axis.logarithmic(
                    words.text("sensors.picture.rate"),
                    "Hz",
                    points.get(0).rateHz(),
                    points.get(points.size() - 1).rateHz()),
                Axis.logarithmic(
                    words.text("sensors.picture.density"),
                    "%/√Hz",
                    Math.max(lowest / 2, top / 1e5),
                    top),
                HEIGHT,
                words.text("sensors.picture.title"),
                words.text("sensors.picture.more"))
            .decimalSign(words.numbers().decimalSign())
            .curve(curve(points, PairFindings.Point::original))
            .curve(curve(points, PairFindings.Point::replacement))
            .curve(curve(points, PairPicture::common));
    return new Picture(
        chart.toSvg(),
        List.of(
            words.text("sensors.picture.column.rate"),
            words.text("sensors.picture.column.original"),
            words.text("sensors.picture.column.replacement"),
            words.text("sensors.picture.column.common"),
            words.text("sensors.picture.column.coherence"),
            words.text("sensors.picture.column.chance")),
        rows(points, words.numbers()));
  }

  private static double common(PairFindings.Point point) {
    Double common = point.common();
    return common == null ? Double.NaN : common;
  }

  /** The rates are not even, and a curve is: one of a single value for each. */
  private static Curve[] curve(
      List<PairFindings.Point> points, ToDoubleFunction<PairFindings.Point> of) {
    return points.stream()
        .map(p -> Curve.ofSamples(p.rateHz(), 1, new float[] {(float) of.applyAsDouble(p)}))
        .toArray(Curve[]::new);
  }

  private static List<List<String>> rows(List<PairFindings.Point> points, Numbers numbers) {
    List<List<String>> rows = new ArrayList<>();
    for (int i = 0; i < points.size(); i += TABLE_EVERY) {
      PairFindings.Point p = points.get(i);
      Double common = p.common();
      rows.add(
          List.of(
              numbers.fixed(p.rateHz(), 2),
              three(numbers, p.original()),
              three(numbers, p.replacement()),
              common == null ? "–" : three(numbers, common),
              numbers.fixed(p.coherence(), 3),
              numbers.fixed(p.chance(), 3)));
    }
    return rows;
  }

  private static String three(Numbers numbers, double value) {
    return numbers.show(value, null, "", Numbers.Sign.PLAIN).text();
  }
}
