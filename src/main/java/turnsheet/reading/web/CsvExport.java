package turnsheet.reading.web;

import de.siegmar.fastcsv.writer.CsvWriter;
import java.io.IOException;
import java.io.Writer;
import java.util.LinkedHashMap;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;
import turnsheet.core.measure.Series;
import turnsheet.reading.SeriesName;
import turnsheet.reading.chart.Curve;

/** Writes tables of numbers: a point as decimal sign, units in the heads. */
final class CsvExport {

  private CsvExport() {}

  /** One row a figure, under its path in the result contract. */
  static void figures(Reading reading, Writer out) throws IOException {
    CsvWriter csv = CsvWriter.builder().build(out);
    csv.writeRecord("figure", "value", "expandedUncertainty", "k", "why");
    figures(reading)
        .forEach(
            (path, figure) ->
                csv.writeRecord(
                    path,
                    text(figure.value()),
                    text(figure.expandedUncertainty()),
                    text(figure.k()),
                    figure.why() == null ? "" : figure.why()));
    csv.flush();
  }

  /** One row a point: samples, or lowest and highest of each bucket. */
  static void curve(SeriesName name, Curve curve, Writer out) throws IOException {
    CsvWriter csv = CsvWriter.builder().build(out);
    String x = name == SeriesName.TRACE ? "timeSeconds" : "rateHz";
    String y = name == SeriesName.TRACE ? "speedPercent" : "peakPercent";
    if (curve.isExact()) {
      csv.writeRecord(x, y);
    } else {
      csv.writeRecord(x, "lowest" + capital(y), "highest" + capital(y));
    }
    for (int i = 0; i < curve.size(); i++) {
      String at = Double.toString(curve.x(i));
      if (curve.isExact()) {
        csv.writeRecord(at, text(curve.low(i)));
      } else {
        csv.writeRecord(at, text(curve.low(i)), text(curve.high(i)));
      }
    }
    csv.flush();
  }

  static void histogram(Series.Histogram histogram, Writer out) throws IOException {
    CsvWriter csv = CsvWriter.builder().build(out);
    csv.writeRecord("fromMicroseconds", "toMicroseconds", "count");
    for (int k = 0; k < histogram.size(); k++) {
      double from = histogram.fromMicroseconds() + k * histogram.widthMicroseconds();
      csv.writeRecord(
          Double.toString(from),
          Double.toString(from + histogram.widthMicroseconds()),
          Long.toString(histogram.count(k)));
    }
    csv.flush();
  }

  private static Map<String, Figure> figures(Reading reading) {
    Map<String, Figure> figures = new LinkedHashMap<>();
    Reading.Speed speed = reading.speed();
    figures.put("speed.meanHz", speed.meanHz());
    figures.put("speed.deviationPercent", speed.deviationPercent());
    figures.put("speed.driftPercentPerMinute", speed.driftPercentPerMinute());
    figures.put("speed.startDeviationPercent", speed.startDeviationPercent());
    figures.put("speed.endDeviationPercent", speed.endDeviationPercent());
    Reading.Flutter flutter = reading.flutter();
    figures.put("flutter.weightedTwoSigmaPercent", flutter.weightedTwoSigmaPercent());
    figures.put("flutter.weightedQuasiPeakPercent", flutter.weightedQuasiPeakPercent());
    figures.put("flutter.weightedRmsPercent", flutter.weightedRmsPercent());
    figures.put("flutter.unweightedRmsPercent", flutter.unweightedRmsPercent());
    flutter.bands().forEach(b -> figures.put("flutter.bands." + b.name(), b.rmsPercent()));
    for (int i = 0; i < reading.lines().size(); i++) {
      figures.put("lines." + (i + 1) + ".rateHz", reading.lines().get(i).rateHz());
      figures.put("lines." + (i + 1) + ".peakPercent", reading.lines().get(i).peakPercent());
    }
    Reading.Edges edges = reading.edges();
    if (edges != null) {
      figures.put("edges.meanPeriodMicroseconds", edges.meanPeriodMicroseconds());
      figures.put("edges.periodStdDevMicroseconds", edges.periodStdDevMicroseconds());
      figures.put("edges.cycleToCycleMicroseconds", edges.cycleToCycleMicroseconds());
      putIfKnown(figures, "edges.dutyPercent", edges.dutyPercent());
      figures.put("edges.edgeNoiseMicroseconds", edges.edgeNoiseMicroseconds());
      Reading.Wheel wheel = edges.wheel();
      putIfKnown(
          figures,
          "edges.wheel.patternRmsPercentOfPeriod",
          wheel == null ? null : wheel.patternRmsPercentOfPeriod());
      edges
          .stability()
          .forEach(
              s ->
                  figures.put(
                      "edges.stability." + s.tauSeconds() + "s.allanDeviation",
                      s.allanDeviation()));
    }
    figures.put("signal.snrDb", reading.signal().snrDb());
    figures.put("signal.floorPercent", reading.signal().floorPercent());
    return figures;
  }

  private static void putIfKnown(
      Map<String, Figure> figures, String path, @Nullable Figure figure) {
    if (figure != null) {
      figures.put(path, figure);
    }
  }

  private static String capital(String word) {
    return Character.toUpperCase(word.charAt(0)) + word.substring(1);
  }

  private static String text(@Nullable Double value) {
    return value == null ? "" : value.toString();
  }

  private static String text(float value) {
    return Float.isNaN(value) ? "" : Float.toString(value);
  }
}
