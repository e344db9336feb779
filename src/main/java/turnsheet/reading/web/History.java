package turnsheet.reading.web;

import java.time.Instant;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.DoubleStream;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.stats.TrendLine;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.Outlook;
import turnsheet.reading.Trend;
import turnsheet.reading.Trends;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.DateTicks;
import turnsheet.reading.chart.SvgChart;
import turnsheet.reading.chart.TimeMarks;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.Visit;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** Draws one figure of one unit over the years. */
final class History {

  private static final int HEIGHT = 300;
  private static final double SECONDS_PER_DAY = 86_400;
  private static final double DAYS_PER_YEAR = Trends.SECONDS_PER_YEAR / SECONDS_PER_DAY;

  private final Wording words;
  private final List<Visit> visits;

  History(Wording words, List<Visit> visits) {
    this.words = words;
    this.visits = visits;
  }

  /** The drawing; nothing to draw is the caller's to tell. */
  String draw(FigureHistory history, String setting) {
    List<Level> limits = limits(history.limit(), history.figure());
    Span band = span(history.trend());
    Axis x = days(history, band);
    Axis y = values(history, limits, band);
    SvgChart chart =
        new SvgChart(
                x,
                y,
                HEIGHT,
                words.text("history.chart.title", words.nameOf(history.figure()), setting),
                words.text(
                    "history.chart.more",
                    String.join(", ", history.conditions().stream().map(words::said).toList())))
            .decimalSign(words.numbers().decimalSign());
    chart.xTicks(DateTicks.between(x.from(), x.to(), words.locale()));
    limits.forEach(level -> chart.limit(level.value(), level.name()));
    if (band != null) {
      chart.mark(
          TimeMarks.band(
              band.from(),
              band.to(),
              day -> band.line().at(band.years(day)),
              day -> band.line().halfWidthAt(band.years(day))));
    }
    chart.mark(TimeMarks.visits(y.from(), visits.stream().map(v -> day(v.openedAt())).toList()));
    for (List<CaptureResult> visit : byVisit(history.shown())) {
      chart.mark(TimeMarks.join(points(visit, history.figure())));
    }
    int series = 0;
    for (String condition : history.conditions()) {
      chart.mark(
          TimeMarks.dots(
              ++series,
              points(
                  history.shown().stream().filter(r -> r.condition().equals(condition)).toList(),
                  history.figure())));
    }
    return chart.toSvg();
  }

  private static Collection<List<CaptureResult>> byVisit(List<CaptureResult> shown) {
    return shown.stream()
        .collect(
            Collectors.groupingBy(CaptureResult::visitId, LinkedHashMap::new, Collectors.toList()))
        .values();
  }

  private static List<TimeMarks.Point> points(List<CaptureResult> results, FigureName name) {
    List<TimeMarks.Point> points = new ArrayList<>();
    for (CaptureResult result : results) {
      Figure figure = result.figure(name);
      Double value = figure.value();
      Double uncertainty = figure.expandedUncertainty();
      if (value != null) {
        points.add(
            TimeMarks.Point.of(
                day(result.receivedAt()), value, uncertainty == null ? 0 : uncertainty));
      }
    }
    return points;
  }

  private List<Level> limits(@Nullable ServiceLimit limit, FigureName figure) {
    if (limit == null) {
      return List.of();
    }
    String bound = words.numbers().plain(limit.upperBound()) + "\u202f" + figure.unit();
    return Wording.signOf(figure) == Numbers.Sign.PLAIN
        ? List.of(new Level(limit.upperBound(), words.text("reading.chart.limit", bound)))
        : List.of(
            new Level(limit.upperBound(), words.text("reading.chart.limit", "+" + bound)),
            new Level(-limit.upperBound(), words.text("reading.chart.limit", "\u2212" + bound)));
  }

  /** The line is drawn over the readings, and on to the limit where it is told when it meets it. */
  private static @Nullable Span span(Trend trend) {
    if (!(trend instanceof Trend.Shown shown)) {
      return null;
    }
    Instant end = shown.last();
    if (shown.outlook() instanceof Outlook.Meets meets) {
      Instant latest = meets.latest();
      end = latest == null ? meets.horizon() : latest;
    }
    return new Span(shown.line(), day(shown.first()), Math.max(day(end), day(shown.last())));
  }

  private Axis days(FigureHistory history, @Nullable Span band) {
    List<Double> days = new ArrayList<>();
    history.shown().forEach(r -> days.add(day(r.receivedAt())));
    visits.forEach(v -> days.add(day(v.openedAt())));
    if (band != null) {
      days.add(band.to());
    }
    double first = days.stream().mapToDouble(Double::doubleValue).min().orElse(0);
    double last = days.stream().mapToDouble(Double::doubleValue).max().orElse(first);
    double air = Math.max(1, 0.04 * (last - first));
    return Axis.linear(words.text("reading.chart.day"), "", first - air, last + air);
  }

  /** From zero for amounts; about the values for what can be negative. */
  private Axis values(FigureHistory history, List<Level> limits, @Nullable Span band) {
    boolean plain = Wording.signOf(history.figure()) == Numbers.Sign.PLAIN;
    DoubleStream.Builder ends = DoubleStream.builder();
    limits.forEach(level -> ends.add(level.value()));
    if (plain) {
      ends.add(0);
    }
    if (band != null) {
      ends.add(band.line().at(0)).add(band.line().at(band.years(band.to())));
    }
    for (TimeMarks.Point point : points(history.shown(), history.figure())) {
      ends.add(point.y() - point.below()).add(point.y() + point.above());
    }
    Axis around =
        Axis.around(
            words.nameOf(history.figure()), history.figure().unit(), ends.build().toArray());
    return plain ? Axis.linear(around.name(), around.unit(), 0, around.to()) : around;
  }

  private static double day(Instant at) {
    return at.getEpochSecond() / SECONDS_PER_DAY;
  }

  private record Level(double value, String name) {}

  /** Where the line is drawn, in days. */
  private record Span(TrendLine line, double from, double to) {
    double years(double day) {
      return (day - from) / DAYS_PER_YEAR;
    }
  }
}
