package turnsheet.reading.web;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.document.CoreJson;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.Judged;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.DateTicks;
import turnsheet.reading.chart.SvgChart;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;
import turnsheet.web.Numbers;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** One figure of one unit over the years. */
final class History {

  private static final int HEIGHT = 290;
  private static final double SECONDS_PER_DAY = 86_400;

  private final Wording words;
  private final Times times;
  private final Standing standing;

  History(Wording words, Times times, Standing standing) {
    this.words = words;
    this.times = times;
    this.standing = standing;
  }

  /** The captures at a speed setting that have the figure. */
  static List<CaptureResult> with(
      List<CaptureResult> all, SpeedSettingId settingId, FigureName figure) {
    return all.stream()
        .filter(r -> r.settingId().equals(settingId) && r.figures().containsKey(figure))
        .toList();
  }

  /** Each condition is a line of its own. */
  static List<String> conditions(List<CaptureResult> shown) {
    return shown.stream().map(CaptureResult::condition).distinct().toList();
  }

  List<UnitPage.PointRow> points(List<CaptureResult> shown, FigureName figure) {
    return shown.stream()
        .map(
            r ->
                new UnitPage.PointRow(
                    times.day(r.receivedAt()),
                    r.condition(),
                    words.show(figure, r.figure(figure)),
                    verdict(r, figure),
                    String.valueOf(r.readingId())))
        .toList();
  }

  /** The drawing; nothing to draw is the caller's to tell. */
  Drawn draw(
      List<CaptureResult> shown, FigureName figure, @Nullable ServiceLimit limit, String setting) {
    List<Line> lines = conditions(shown).stream().map(c -> line(c, shown, figure)).toList();
    List<Level> limits = limits(limit, figure);
    Axis x = days(lines);
    Axis y = values(lines, limits, figure);
    SvgChart chart =
        new SvgChart(
            x,
            y,
            HEIGHT,
            words.text("reading.chart.history.title", words.nameOf(figure), setting),
            words.text("reading.chart.history.more", String.join(", ", conditions(shown))));
    List<Axis.Tick> ticks = DateTicks.between(x.from(), x.to());
    chart.xTicks(ticks);
    limits.forEach(level -> chart.limit(level.value(), level.name()));
    lines.forEach(line -> chart.points(line.points()));
    return new Drawn(
        chart.toSvg(),
        "",
        x.title(),
        y.title(),
        x.from(),
        x.to(),
        y.from(),
        y.to(),
        CoreJson.toJson(new Marks(limits, ticks, lines)),
        List.of(),
        List.of());
  }

  private Line line(String condition, List<CaptureResult> shown, FigureName name) {
    List<SvgChart.Point> points = new ArrayList<>();
    for (CaptureResult result : shown) {
      Figure figure = result.figure(name);
      Double value = figure.value();
      Double uncertainty = figure.expandedUncertainty();
      if (result.condition().equals(condition) && value != null) {
        points.add(
            new SvgChart.Point(
                day(result.receivedAt()), value, uncertainty == null ? 0 : uncertainty));
      }
    }
    return new Line(condition, points);
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

  private Axis days(List<Line> lines) {
    double[] days =
        lines.stream().flatMap(l -> l.points().stream()).mapToDouble(SvgChart.Point::x).toArray();
    double first = days[0];
    double last = days[0];
    for (double day : days) {
      first = Math.min(first, day);
      last = Math.max(last, day);
    }
    double air = Math.max(1, 0.04 * (last - first));
    return Axis.linear(words.text("reading.chart.day"), "", first - air, last + air);
  }

  /** From zero for amounts; about the values for what can be negative. */
  private Axis values(List<Line> lines, List<Level> limits, FigureName figure) {
    List<Double> ends = new ArrayList<>(limits.stream().map(Level::value).toList());
    if (Wording.signOf(figure) == Numbers.Sign.PLAIN) {
      ends.add(0.0);
    }
    for (Line line : lines) {
      for (SvgChart.Point point : line.points()) {
        ends.add(point.y() - point.uncertainty());
        ends.add(point.y() + point.uncertainty());
      }
    }
    Axis around =
        Axis.around(
            words.nameOf(figure),
            figure.unit(),
            ends.stream().mapToDouble(Double::doubleValue).toArray());
    return Wording.signOf(figure) == Numbers.Sign.PLAIN
        ? Axis.linear(around.name(), around.unit(), 0, around.to())
        : around;
  }

  private @Nullable String verdict(CaptureResult result, FigureName figure) {
    return standing.judged(result).stream()
        .filter(j -> j.limit().figure() == figure)
        .map((Judged j) -> FigureRow.word(j.judgement().verdict()))
        .findFirst()
        .orElse(null);
  }

  private static double day(Instant at) {
    return at.getEpochSecond() / SECONDS_PER_DAY;
  }

  /** What the script draws. */
  record Marks(List<Level> limits, List<Axis.Tick> ticks, List<Line> lines) {}

  record Level(double value, String name) {}

  record Line(String name, List<SvgChart.Point> points) {}
}
