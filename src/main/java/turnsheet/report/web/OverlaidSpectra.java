package turnsheet.report.web;

import java.util.List;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.Curve;
import turnsheet.reading.chart.SvgChart;
import turnsheet.report.FrozenSpectrum;
import turnsheet.report.SheetSide.CurvePart;
import turnsheet.web.Wording;

/** Draws the spectra of both sides of a pair into one frame: after full, before dashed. */
final class OverlaidSpectra {

  private static final int HEIGHT = 230;

  private final Wording words;

  OverlaidSpectra(Wording words) {
    this.words = words;
  }

  /** The drawing as SVG; empty where a side has no spectrum. */
  String draw(List<CurvePart> before, List<CurvePart> after) {
    if (before.isEmpty() || after.isEmpty()) {
      return "";
    }
    Curve[] dashed = curves(before);
    Curve[] full = curves(after);
    double to =
        Math.min(
            FrozenSpectrum.HIGHEST_HZ,
            Math.min(dashed[dashed.length - 1].end(), full[full.length - 1].end()));
    double highest = Math.max(highest(dashed), highest(full));
    return new SvgChart(
            Axis.logarithmic(
                words.text("report.spectrum.rate"), "Hz", FrozenSpectrum.LOWEST_HZ, to),
            Axis.linear(
                words.text("report.spectrum.peak"), "%", 0, highest > 0 ? 1.08 * highest : 1),
            HEIGHT,
            words.text("report.spectrum.title"),
            words.text("report.spectrum.more"))
        .decimalSign(words.numbers().decimalSign())
        .curve(full)
        .curve(dashed)
        .toSvg();
  }

  private static Curve[] curves(List<CurvePart> parts) {
    return parts.stream().map(OverlaidSpectra::curve).toArray(Curve[]::new);
  }

  private static Curve curve(CurvePart part) {
    float[] values = new float[part.high().size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = part.high().get(i);
    }
    return Curve.ofSamples(part.start(), part.step(), values);
  }

  private static double highest(Curve[] parts) {
    double highest = 0;
    for (Curve part : parts) {
      for (int i = 0; i < part.size(); i++) {
        if (part.x(i) >= FrozenSpectrum.LOWEST_HZ && part.high(i) > highest) {
          highest = part.high(i);
        }
      }
    }
    return highest;
  }
}
