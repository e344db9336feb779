package turnsheet.bench.web;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import turnsheet.bench.ClockCheck;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.DateTicks;
import turnsheet.reading.chart.SvgChart;
import turnsheet.reading.chart.TimeMarks;
import turnsheet.web.Wording;

/** Draws how a bench instrument has done over time. */
final class HealthCharts {

  private static final int HEIGHT = 240;
  private static final double SECONDS_PER_DAY = 86_400;

  /** The dot of a month stands in its middle. */
  private static final int MIDDLE_OF_MONTH = 15;

  private final Wording words;

  HealthCharts(Wording words) {
    this.words = words;
  }

  /**
   * Clock errors with their uncertainty: full dots for checks that were taken into the record,
   * hollow ones for others.
   *
   * @param checks at least one, in any order
   */
  String clock(List<ClockCheck> checks) {
    List<TimeMarks.Point> taken = points(checks.stream().filter(c -> c.taken() != null));
    List<TimeMarks.Point> open = points(checks.stream().filter(c -> c.taken() == null));
    List<TimeMarks.Point> all = Stream.concat(taken.stream(), open.stream()).toList();
    Axis y = Axis.around(words.text("bench.chart.error"), ClockPage.PPM, ends(all));
    return chart(all, y, "bench.chart.clock", "bench.chart.clockMore")
        .mark(TimeMarks.dots(1, taken))
        .mark(TimeMarks.dots(2, open))
        .toSvg();
  }

  /**
   * Medians with a bar from quartile to quartile where there are enough recordings.
   *
   * @param months at least one
   */
  String floor(List<FloorMonth> months) {
    List<TimeMarks.Point> points = months.stream().map(HealthCharts::point).toList();
    double highest = Axis.around("", "", ends(points)).to();
    Axis y = Axis.linear(words.text("bench.chart.floorName"), "%", 0, highest > 0 ? highest : 1);
    return chart(points, y, "bench.chart.floor", "bench.chart.floorMore")
        .mark(TimeMarks.dots(1, points))
        .toSvg();
  }

  private SvgChart chart(List<TimeMarks.Point> points, Axis y, String title, String more) {
    double first = points.stream().mapToDouble(TimeMarks.Point::x).min().orElseThrow();
    double last = points.stream().mapToDouble(TimeMarks.Point::x).max().orElseThrow();
    // at least a month on either side, so that a few days do not look like years
    double air = Math.max(30, 0.05 * (last - first));
    Axis x = Axis.linear(words.text("reading.chart.day"), "", first - air, last + air);
    return new SvgChart(x, y, HEIGHT, words.text(title), words.text(more))
        .decimalSign(words.numbers().decimalSign())
        .xTicks(DateTicks.between(x.from(), x.to(), words.locale()));
  }

  private static List<TimeMarks.Point> points(Stream<ClockCheck> checks) {
    return checks
        .map(
            c ->
                TimeMarks.Point.of(
                    c.madeAt().getEpochSecond() / SECONDS_PER_DAY,
                    c.found().errorPpm(),
                    c.found().expandedUncertaintyPpm()))
        .toList();
  }

  private static TimeMarks.Point point(FloorMonth month) {
    double middle = (double) month.month().atDay(MIDDLE_OF_MONTH).toEpochDay();
    double median = month.quantiles().median();
    return month.hasQuartiles()
        ? new TimeMarks.Point(
            middle,
            median,
            median - month.quantiles().at(0.25),
            month.quantiles().at(0.75) - median)
        : TimeMarks.Point.of(middle, median, 0);
  }

  private static double[] ends(List<TimeMarks.Point> points) {
    List<Double> ends = new ArrayList<>(List.of(0.0));
    for (TimeMarks.Point point : points) {
      ends.add(point.y() - point.below());
      ends.add(point.y() + point.above());
    }
    return ends.stream().mapToDouble(Double::doubleValue).toArray();
  }
}
