package turnsheet.reading.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.function.Supplier;

/**
 * Draws curves with their axes as one SVG element, for paper and for pages without scripts.
 *
 * <p>Everything is told apart without colour: the first series is a full line, the second is
 * dashed, the third dotted; limits are long dashes with their name; dots and bands are {@link
 * TimeMarks}. Looks are set by presentation attributes, which a style sheet may overrule by class
 * ({@code drawn-axis}, {@code drawn-grid}, {@code drawn-series series-1}, {@code drawn-limit},
 * {@code drawn-flag}, {@code drawn-bar}, {@code drawn-uncertainty}): it needs neither inline styles
 * nor a style sheet.
 *
 * <p>Not thread-safe; one object makes one drawing. Lengths are in the drawing's own units, of
 * which {@link #WIDTH} make the full width.
 */
public final class SvgChart {

  /** Width of every drawing; on paper it is set to the width of the column. */
  public static final int WIDTH = 760;

  private static final int LEFT = 64;
  private static final int RIGHT = WIDTH - 14;
  private static final int BOTTOM = 46;
  private static final int TOP = 12;

  /** Width of a letter at the size of the drawing's words, a little on the wide side. */
  static final double LETTER = 6.6;

  private static final List<String> DASHES = List.of("", "6 3", "1.5 2.5");

  private final Axis x;
  private final Axis y;
  private final int height;
  private final String title;
  private final String description;
  private final List<Supplier<String>> marks = new ArrayList<>();
  private final Flags flags = new Flags();
  private List<Axis.Tick> xTicks;
  private boolean dated;
  private char decimalSign = '.';
  private int series;

  /**
   * An empty drawing.
   *
   * @param title short name, read first by a screen reader
   * @param description what the curve shows, in one or two sentences
   */
  public SvgChart(Axis x, Axis y, int height, String title, String description) {
    this.x = x;
    this.y = y;
    this.height = height;
    this.title = title;
    this.description = description;
    this.xTicks = x.ticks(8);
  }

  /** The decimal sign of the numbers at the axes; a point where nothing is said. */
  public SvgChart decimalSign(char sign) {
    decimalSign = sign;
    return this;
  }

  /** Marks along the horizontal axis in place of round numbers, such as dates. */
  public SvgChart xTicks(List<Axis.Tick> ticks) {
    xTicks = List.copyOf(ticks);
    dated = true;
    return this;
  }

  /**
   * A curve; where its points are buckets, the band between lowest and highest.
   *
   * @param parts adjoining windows of one curve, as a logarithmic axis needs them
   */
  public SvgChart curve(Curve... parts) {
    int number = ++series;
    List<Curve> kept = List.of(parts);
    marks.add(() -> line(number, trail(kept)));
    return this;
  }

  /** Whatever knows how to draw itself where values lie. */
  public SvgChart mark(Mark mark) {
    marks.add(() -> mark.drawn(new Place(this::left, this::top)));
    return this;
  }

  /** Upright bars of one width side by side, as for a histogram. */
  public SvgChart bars(double from, double width, double[] heights) {
    double[] kept = heights.clone();
    marks.add(
        () -> {
          StringBuilder bars = new StringBuilder();
          for (int k = 0; k < kept.length; k++) {
            double edge = left(from + k * width);
            double crest = top(kept[k]);
            double wide = left(from + (k + 1) * width) - edge;
            bars.append(Svg.bar(edge, crest, wide, top(y.from()) - crest));
          }
          return bars.toString();
        });
    return this;
  }

  /** A level line with its name; left out where it lies outside the drawing. */
  public SvgChart limit(double value, String name) {
    if (y.holds(value)) {
      marks.add(
          () -> {
            double level = top(value);
            double words = level < frameTop() + 16 ? level + 13 : level - 4;
            String line = "M%d %sH%d".formatted(LEFT, n(level), RIGHT);
            return Svg.ground(line)
                + Svg.path("drawn-limit", line, 1.2, "10 4")
                + Svg.grounded("drawn-limit", RIGHT - 4, words, name.length() * LETTER, name);
          });
    }
    return this;
  }

  /** A word above one place of a curve, tied to it by a thin line. */
  public SvgChart flag(double atX, double atY, String word) {
    if (x.holds(atX)) {
      flags.add(atX, Math.min(atY, y.to()), word);
    }
    return this;
  }

  /** The finished element. */
  public String toSvg() {
    StringBuilder svg =
        new StringBuilder(
            ("<svg xmlns=\"http://www.w3.org/2000/svg\" class=\"drawn\" role=\"img\""
                    + " viewBox=\"0 0 %d %d\" font-size=\"12\"><title>%s</title><desc>%s</desc>")
                .formatted(WIDTH, height, Svg.escape(title), Svg.escape(description)));
    frame(svg);
    marks.forEach(mark -> svg.append(mark.get()));
    svg.append(flags.drawn(LEFT, RIGHT, TOP, new Place(this::left, this::top)));
    return svg.append("</svg>").toString();
  }

  private void frame(StringBuilder svg) {
    double bottom = top(y.from());
    for (Axis.Tick tick : y.ticks(Math.max(2, height / 55))) {
      double level = top(tick.value());
      svg.append(Svg.grid(LEFT, level, RIGHT, level));
      svg.append(Svg.words("drawn-tick", LEFT - 8, level + 4, "end", number(tick.text())));
    }
    for (Axis.Tick tick : xTicks) {
      double at = left(tick.value());
      svg.append(Svg.grid(at, bottom, at, bottom + 5));
      svg.append(
          Svg.words(
              "drawn-tick", at, bottom + 18, "middle", dated ? tick.text() : number(tick.text())));
    }
    String axes = "M%d %sV%sH%d".formatted(LEFT, n(frameTop()), n(bottom), RIGHT);
    svg.append(Svg.path("drawn-axis", axes, 1, ""));
    svg.append(Svg.words("drawn-name", (LEFT + RIGHT) / 2.0, height - 8, "middle", x.title()));
    // a name longer than the drawing is high is set smaller, in its middle, rather than cut
    double room = (height - 8) / (y.title().length() * LETTER);
    double middle = room < 1.5 ? height / 2.0 : (frameTop() + bottom) / 2;
    svg.append(Svg.upright(14, middle, Math.min(1, room), y.title()));
  }

  private String number(String text) {
    return text.replace('.', decimalSign);
  }

  private String trail(List<Curve> parts) {
    StringBuilder path = new StringBuilder();
    double reached = Double.NEGATIVE_INFINITY;
    boolean pen = false;
    for (Curve curve : parts) {
      for (int i = 0; i < curve.size(); i++) {
        double at = curve.x(i);
        if (at <= reached) {
          // windows overlap by the points beyond their edges
          continue;
        }
        if (Float.isNaN(curve.low(i)) || !x.holds(at)) {
          pen = false;
          continue;
        }
        path.append(pen ? 'L' : 'M').append(place(at, curve.low(i)));
        if (curve.high(i) != curve.low(i)) {
          path.append('L').append(place(at, curve.high(i)));
        }
        pen = true;
        reached = at;
      }
    }
    return path.toString();
  }

  private static String line(int number, String path) {
    String dashes = DASHES.get((number - 1) % DASHES.size());
    return path.isEmpty() ? "" : Svg.path("drawn-series series-" + number, path, 1.1, dashes);
  }

  private String place(double atX, double atY) {
    return n(left(atX)) + " " + n(top(atY));
  }

  private double left(double value) {
    return LEFT + x.share(value) * (RIGHT - LEFT);
  }

  /** Values beyond the drawing lie on its edge. */
  private double top(double wanted) {
    double value = Math.max(y.from(), Math.min(y.to(), wanted));
    return height - BOTTOM - y.share(value) * (height - BOTTOM - frameTop());
  }

  private double frameTop() {
    return TOP + flags.height();
  }

  private static String n(double length) {
    return Svg.number(length);
  }

  /** Something in a drawing. */
  public interface Mark {
    String drawn(Place place);
  }

  /** Where values lie in a drawing: lengths from its left and upper edge. */
  public record Place(DoubleUnaryOperator left, DoubleUnaryOperator top) {

    String at(double x, double y) {
      return Svg.number(left.applyAsDouble(x)) + " " + Svg.number(top.applyAsDouble(y));
    }
  }
}
