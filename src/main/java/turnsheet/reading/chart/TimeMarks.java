package turnsheet.reading.chart;

import java.util.List;
import java.util.function.DoubleUnaryOperator;
import turnsheet.reading.chart.SvgChart.Mark;

/**
 * What stands in a drawing of single values over the years, told apart without colour: each series
 * has a shape of its own. Classes for a style sheet: {@code drawn-dot series-1}, {@code
 * drawn-uncertainty}, {@code drawn-join}, {@code drawn-band}, {@code drawn-trend}, {@code
 * drawn-visit}.
 */
public final class TimeMarks {

  private static final int BAND_POINTS = 60;

  private TimeMarks() {}

  /**
   * A value at a place.
   *
   * @param below length of the bar below the value; 0 for none
   * @param above length of the bar above it
   */
  public record Point(double x, double y, double below, double above) {

    /** With an interval that lies evenly about the value. */
    public static Point of(double x, double y, double halfWidth) {
      return new Point(x, y, halfWidth, halfWidth);
    }
  }

  /**
   * Dots, each with the bar of its interval.
   *
   * @param series from 1; the shapes repeat after four
   */
  public static Mark dots(int series, List<Point> points) {
    List<Point> kept = List.copyOf(points);
    return place -> {
      StringBuilder drawn = new StringBuilder();
      for (Point p : kept) {
        double at = place.left().applyAsDouble(p.x());
        if (p.below() > 0 || p.above() > 0) {
          String bar =
              "M%s %sh8m-4 0V%sm-4 0h8"
                  .formatted(
                      Svg.number(at - 4),
                      Svg.number(place.top().applyAsDouble(p.y() - p.below())),
                      Svg.number(place.top().applyAsDouble(p.y() + p.above())));
          drawn.append(Svg.path("drawn-uncertainty", bar, 1, ""));
        }
        drawn.append(Svg.dot(series, at, place.top().applyAsDouble(p.y())));
      }
      return drawn.toString();
    };
  }

  /** A thin line from value to value. */
  public static Mark join(List<Point> points) {
    List<Point> kept = List.copyOf(points);
    return place -> {
      StringBuilder path = new StringBuilder();
      for (Point p : kept) {
        path.append(path.isEmpty() ? 'M' : 'L').append(place.at(p.x(), p.y()));
      }
      return kept.size() < 2 ? "" : Svg.path("drawn-join", path.toString(), 0.8, "");
    };
  }

  /** A line with the band about it between two places. */
  public static Mark band(
      double from, double to, DoubleUnaryOperator line, DoubleUnaryOperator halfWidth) {
    return place -> {
      StringBuilder edge = new StringBuilder();
      for (int i = 0; i <= 2 * BAND_POINTS + 1; i++) {
        boolean upper = i <= BAND_POINTS;
        int step = upper ? i : 2 * BAND_POINTS + 1 - i;
        double x = from + (to - from) * step / BAND_POINTS;
        double y = line.applyAsDouble(x) + (upper ? 1 : -1) * halfWidth.applyAsDouble(x);
        edge.append(i == 0 ? 'M' : 'L').append(place.at(x, y));
      }
      String straight =
          "M"
              + place.at(from, line.applyAsDouble(from))
              + "L"
              + place.at(to, line.applyAsDouble(to));
      return Svg.area("drawn-band", edge.append('Z').toString())
          + Svg.path("drawn-trend", straight, 1.3, "9 3 2 3");
    };
  }

  /** Small triangles that stand on the horizontal axis. */
  public static Mark visits(double bottom, List<Double> places) {
    List<Double> kept = List.copyOf(places);
    return place -> {
      StringBuilder drawn = new StringBuilder();
      for (double x : kept) {
        String triangle = "M" + place.at(x, bottom) + "l-4 -8h8z";
        drawn.append(Svg.path("drawn-visit", triangle, 1, ""));
      }
      return drawn.toString();
    };
  }
}
