package turnsheet.reading.web;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.DoubleStream;
import java.util.stream.Stream;
import turnsheet.core.measure.Reading;
import turnsheet.core.measure.Series;
import turnsheet.document.CoreJson;
import turnsheet.reading.ReadingId;
import turnsheet.reading.SeriesName;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.Curve;
import turnsheet.reading.chart.SvgChart;
import turnsheet.web.Wording;

/** Draws the curves of one reading. */
final class Drawings {

  private static final int HEIGHT = 270;
  private static final int SPECTRUM_HEIGHT = 310;

  /** Two points to a unit of the drawing's width cannot be told apart. */
  private static final int POINTS = 620;

  private static final int TABLE_ROWS = 20;
  private static final double LOWEST_HZ = 0.1;
  private static final double HIGHEST_HZ = 200;
  private static final int MOST_FLAGS = 8;

  private final Wording words;
  private final ReadingId id;

  Drawings(Wording words, ReadingId id) {
    this.words = words;
    this.id = id;
  }

  /** The speed over time; a limit of the mean deviation is drawn where it is near. */
  Drawn trace(Curve whole, OptionalDouble deviationLimit) {
    Curve curve = whole.reducedTo(POINTS);
    Axis own = Axis.around("", "%", extremes(curve));
    List<Level> levels = levels(own, deviationLimit);
    double[] bounds = levels.stream().mapToDouble(Level::value).toArray();
    double air = 0.08 * (own.to() - own.from());
    Axis y =
        percent(
            "reading.chart.speed",
            Math.min(own.from(), DoubleStream.of(bounds).min().orElse(own.from()) - air),
            Math.max(own.to(), DoubleStream.of(bounds).max().orElse(own.to()) + air));
    Axis x =
        Axis.linear(
            words.text("reading.chart.time"),
            "s",
            whole.start(),
            Math.max(whole.end(), whole.start() + whole.step()));
    SvgChart chart =
        new SvgChart(
                x,
                y,
                HEIGHT,
                words.text("reading.chart.trace.title"),
                words.text(
                    "reading.chart.trace.more", n(x.to(), 1), n(own.from(), 3), n(own.to(), 3)))
            .decimalSign(words.numbers().decimalSign());
    chart.curve(curve);
    levels.forEach(level -> chart.limit(level.value(), level.name()));
    return new Drawn(
        chart.toSvg(),
        source(SeriesName.TRACE),
        x.title(),
        y.title(),
        x.from(),
        x.to(),
        y.from(),
        y.to(),
        CoreJson.toJson(new Marks(levels, List.of())),
        columns("reading.chart.time.s", "reading.chart.lowest", "reading.chart.highest"),
        stretches(whole));
  }

  /** The spectrum on a logarithmic axis, with a word at each of the strongest lines. */
  Drawn spectrum(Curve whole, List<Reading.Line> lines) {
    double to = Math.max(Math.min(HIGHEST_HZ, whole.end()), 2 * LOWEST_HZ);
    Axis x = Axis.logarithmic(words.text("reading.chart.rate"), "Hz", LOWEST_HZ, to);
    List<Curve> parts = new ArrayList<>();
    for (double decade = LOWEST_HZ; decade < to; decade *= 10) {
      parts.add(whole.window(decade, Math.min(to, decade * 10), POINTS / 3));
    }
    double highest = 0;
    for (Curve part : parts) {
      for (int i = 0; i < part.size(); i++) {
        highest = part.high(i) > highest && x.holds(part.x(i)) ? part.high(i) : highest;
      }
    }
    Axis y = percent("reading.chart.peak", 0, highest == 0 ? 1 : 1.08 * highest);
    SvgChart chart =
        new SvgChart(
                x,
                y,
                SPECTRUM_HEIGHT,
                words.text("reading.chart.spectrum.title"),
                words.text("reading.chart.spectrum.more"))
            .decimalSign(words.numbers().decimalSign());
    List<Flag> flags = flags(lines, x);
    flags.forEach(flag -> chart.flag(flag.x(), flag.y(), flag.word()));
    return new Drawn(
        chart.curve(parts.toArray(Curve[]::new)).toSvg(),
        source(SeriesName.SPECTRUM),
        x.title(),
        y.title(),
        x.from(),
        x.to(),
        0,
        y.to(),
        CoreJson.toJson(new Marks(List.of(), flags)),
        List.of(),
        List.of());
  }

  /** How often each period came. */
  Drawn histogram(Series.Histogram histogram) {
    double from = histogram.fromMicroseconds();
    double width = histogram.widthMicroseconds();
    double[] counts = new double[histogram.size()];
    double most = 1;
    List<List<String>> rows = new ArrayList<>();
    for (int k = 0; k < counts.length; k++) {
      counts[k] = histogram.count(k);
      most = Math.max(most, counts[k]);
      if (counts[k] > 0) {
        String edges = n(from + k * width, 3) + " \u2013 " + n(from + (k + 1) * width, 3);
        rows.add(List.of(edges, Long.toString(histogram.count(k))));
      }
    }
    Axis x =
        Axis.linear(
            words.text("reading.chart.period"),
            "µs",
            from,
            from + Math.max(1, counts.length) * width);
    Axis y = Axis.linear(words.text("reading.chart.count"), "", 0, 1.05 * most);
    SvgChart chart =
        new SvgChart(
                x,
                y,
                HEIGHT,
                words.text("reading.chart.histogram.title"),
                words.text("reading.chart.histogram.more"))
            .decimalSign(words.numbers().decimalSign());
    return new Drawn(
        chart.bars(from, width, counts).toSvg(),
        source(SeriesName.HISTOGRAM),
        x.title(),
        y.title(),
        x.from(),
        x.to(),
        0,
        y.to(),
        "{}",
        columns("reading.chart.period.us", "reading.chart.count"),
        rows);
  }

  /** The bounds that lie in the drawing or less than its height away. */
  private List<Level> levels(Axis own, OptionalDouble limit) {
    if (limit.isEmpty()) {
      return List.of();
    }
    double reach = own.to() - own.from();
    String shown = words.numbers().plain(limit.getAsDouble()) + "\u202f%";
    return Stream.of(
            new Level(limit.getAsDouble(), words.text("reading.chart.limit", "+" + shown)),
            new Level(-limit.getAsDouble(), words.text("reading.chart.limit", "\u2212" + shown)))
        .filter(l -> l.value() < own.to() + reach && l.value() > own.from() - reach)
        .toList();
  }

  private List<Flag> flags(List<Reading.Line> lines, Axis x) {
    List<Flag> flags = new ArrayList<>();
    for (Reading.Line line : lines) {
      Double rate = line.rateHz().value();
      Double peak = line.peakPercent().value();
      if (rate != null && peak != null && x.holds(rate)) {
        flags.add(new Flag(rate, peak, n(rate, 2) + "\u202fHz" + suspect(line)));
      }
    }
    return flags.stream()
        .sorted(Comparator.comparingDouble(Flag::y).reversed())
        .limit(MOST_FLAGS)
        .toList();
  }

  private String suspect(Reading.Line line) {
    if (line.suspects().isEmpty()) {
      return "";
    }
    Reading.Suspect first = line.suspects().get(0);
    return " " + ("hum".equals(first.cause()) ? words.text("causes.hum") : first.part());
  }

  private List<List<String>> stretches(Curve whole) {
    Curve few = whole.reducedTo(TABLE_ROWS);
    List<List<String>> rows = new ArrayList<>();
    for (int i = 0; i < few.size(); i++) {
      double middle = few.x(i);
      double from = few.isExact() ? middle : middle - few.step() / 2;
      String times =
          n(Math.max(whole.start(), from), 2)
              + " \u2013 "
              + n(Math.min(whole.end(), from + few.step()), 2);
      rows.add(List.of(times, signed(few.low(i)), signed(few.high(i))));
    }
    return rows;
  }

  private String signed(float percent) {
    return Float.isNaN(percent) ? "\u2013" : words.numbers().fixed(percent, 3);
  }

  private String n(double value, int places) {
    return words.numbers().fixed(value, places);
  }

  private List<String> columns(String... keys) {
    return List.of(keys).stream().map(words::text).toList();
  }

  private Axis percent(String key, double from, double to) {
    return Axis.linear(words.text(key), "%", from, to);
  }

  private String source(SeriesName name) {
    return "/readings/" + id + "/series/" + name.word();
  }

  private static double[] extremes(Curve curve) {
    double[] values = new double[2 * curve.size()];
    for (int i = 0; i < curve.size(); i++) {
      values[2 * i] = curve.low(i);
      values[2 * i + 1] = curve.high(i);
    }
    return values;
  }

  /** What the script draws besides the curve. */
  record Marks(List<Level> limits, List<Flag> flags) {}

  record Level(double value, String name) {}

  record Flag(double x, double y, String word) {}
}
