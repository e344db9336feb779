package turnsheet.report;

import java.util.ArrayList;
import java.util.List;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.SeriesName;
import turnsheet.reading.chart.Curve;

/**
 * The spectrum of a reading as a sheet keeps it: a decade at a time, so that the low rates keep
 * their points on a logarithmic axis.
 */
public final class FrozenSpectrum {

  /** The rates that a sheet shows. */
  public static final double LOWEST_HZ = 0.2;

  public static final double HIGHEST_HZ = 100;

  private static final int POINTS = 300;

  private FrozenSpectrum() {}

  /** Empty where the reading has no spectrum. */
  static List<SheetSide.CurvePart> of(Readings readings, ReadingId id) {
    return readings.curve(id, SeriesName.SPECTRUM).map(FrozenSpectrum::parts).orElse(List.of());
  }

  private static List<SheetSide.CurvePart> parts(Curve whole) {
    double to = Math.min(HIGHEST_HZ, whole.end());
    List<SheetSide.CurvePart> parts = new ArrayList<>();
    for (double from = LOWEST_HZ; from < to; from *= 10) {
      Curve window = whole.window(from, Math.min(to, from * 10), POINTS);
      List<Float> high = new ArrayList<>(window.size());
      for (int i = 0; i < window.size(); i++) {
        high.add(window.high(i));
      }
      parts.add(new SheetSide.CurvePart(window.start(), window.step(), high));
    }
    return parts;
  }
}
