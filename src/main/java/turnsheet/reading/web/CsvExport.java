package turnsheet.reading.web;

import de.siegmar.fastcsv.writer.CsvWriter;
import java.io.IOException;
import java.io.Writer;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Reading;
import turnsheet.core.measure.Series;
import turnsheet.document.FigurePaths;
import turnsheet.reading.SeriesName;
import turnsheet.reading.chart.Curve;

/** Writes tables of numbers: a point as decimal sign, units in the heads. */
final class CsvExport {

  private CsvExport() {}

  /** One row a figure, under its path in the result contract. */
  static void figures(Reading reading, Writer out) throws IOException {
    CsvWriter csv = CsvWriter.builder().build(out);
    csv.writeRecord("figure", "value", "expandedUncertainty", "k", "why");
    FigurePaths.of(reading)
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
