package turnsheet.report.web;

import turnsheet.reading.Readings;
import turnsheet.reading.SeriesName;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.Curve;
import turnsheet.reading.chart.SvgChart;
import turnsheet.report.SheetPair;
import turnsheet.web.Wording;

/** Draws the spectra of both sides of a pair into one frame: after full, before dashed. */
final class OverlaidSpectra {

  private static final int HEIGHT = 230;
  private static final int POINTS = 300;
  private static final double LOWEST_HZ = 0.2;
  private static final double HIGHEST_HZ = 100;

  private final Wording words;
  private final Readings readings;

  OverlaidSpectra(Wording words, Readings readings) {
    this.words = words;
    this.readings = readings;
  }

  /** The drawing as SVG; empty where a side has no spectrum. */
  String draw(SheetPair pair) {
    Curve before = readings.curve(pair.before().stored().id(), SeriesName.SPECTRUM).orElse(null);
    Curve after = readings.curve(pair.after().stored().id(), SeriesName.SPECTRUM).orElse(null);
    if (before == null || after == null) {
      return "";
    }
    double to = Math.min(HIGHEST_HZ, Math.min(before.end(), after.end()));
    Curve[] first = windows(after, to);
    Curve[] second = windows(before, to);
    double highest = Math.max(highest(first), highest(second));
    return new SvgChart(
            Axis.logarithmic(words.text("report.spectrum.rate"), "Hz", LOWEST_HZ, to),
            Axis.linear(
                words.text("report.spectrum.peak"), "%", 0, highest > 0 ? 1.08 * highest : 1),
            HEIGHT,
            words.text("report.spectrum.title"),
            words.text("report.spectrum.more"))
        .curve(first)
        .curve(second)
        .toSvg();
  }

  /** A decade at a time, so that the low rates keep their points on the logarithmic axis. */
  private static Curve[] windows(Curve whole, double to) {
    var parts = new java.util.ArrayList<Curve>();
    for (double from = LOWEST_HZ; from < to; from *= 10) {
      parts.add(whole.window(from, Math.min(to, from * 10), POINTS));
    }
    return parts.toArray(Curve[]::new);
  }

  private static double highest(Curve[] parts) {
    double highest = 0;
    for (Curve part : parts) {
      for (int i = 0; i < part.size(); i++) {
        if (part.x(i) >= LOWEST_HZ && part.high(i) > highest) {
          highest = part.high(i);
        }
      }
    }
    return highest;
  }
}
