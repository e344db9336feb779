package turnsheet.trial.web;

import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.stream.IntStream;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.filter.FilterDesign;
import turnsheet.core.diagnose.filter.FilterFamily;
import turnsheet.core.diagnose.filter.FilterKind;
import turnsheet.core.diagnose.filter.TrialResult;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.SvgChart;
import turnsheet.web.Wording;

/**
 * Draws the candidates of one kind over cutoff and poles. Shapes tell all: circles are Butterworth,
 * squares Bessel; full ones are quiet enough, hollow ones keep every edge, a cross loses or adds
 * some; a ring is about the chosen one. Beside each stands by how much its edges move.
 */
final class TrialMap {

  private static final int HEIGHT = 320;
  private static final double LANE = 0.4;

  private final TrialResult result;
  private final Wording words;
  private final Values values;

  TrialMap(TrialResult result, Wording words) {
    this.result = result;
    this.words = words;
    this.values = new Values(words);
  }

  /** The drawing of one kind; null where none was tried. */
  @Nullable String of(FilterKind kind, String title, String description) {
    List<Integer> rows =
        IntStream.range(1, result.rows().size())
            .filter(i -> design(i).kind() == kind)
            .boxed()
            .toList();
    if (rows.isEmpty()) {
      return null;
    }
    double low = rows.stream().mapToDouble(i -> cutoff(design(i))).min().orElseThrow();
    double high = rows.stream().mapToDouble(i -> cutoff(design(i))).max().orElseThrow();
    // air for the marks and the words beside the last
    double air = Math.max(1.08, Math.pow(high / low, 0.08));
    SvgChart chart =
        new SvgChart(
                Axis.logarithmic(words.text("trial.map.cutoff"), "Hz", low / air, high * air * air),
                Axis.linear(words.text("trial.map.poles"), "", 1, 9),
                HEIGHT,
                title,
                description)
            .decimalSign(words.numbers().decimalSign());
    rows.forEach(i -> chart.mark(place -> mark(i, place)));
    return chart.toSvg();
  }

  private FilterDesign design(int row) {
    return Objects.requireNonNull(result.rows().get(row).design());
  }

  private static double cutoff(FilterDesign design) {
    Double low = design.lowHz();
    Double high = design.highHz();
    return low != null ? low : high != null ? high : 1;
  }

  private String mark(int row, SvgChart.Place place) {
    FilterDesign design = design(row);
    boolean round = design.family() == FilterFamily.BUTTERWORTH;
    double x = place.left().applyAsDouble(cutoff(design));
    double y = place.top().applyAsDouble(design.poles() + (round ? LANE : -LANE));
    TrialResult.Edges edges = result.rows().get(row).compared();
    TrialResult.Choice choice = result.choice();
    String ring =
        choice != null && choice.row() == row
            ? String.format(
                Locale.ROOT,
                "<circle cx=\"%.1f\" cy=\"%.1f\" r=\"10\" fill=\"none\" stroke=\"currentColor\""
                    + " stroke-width=\"1.6\"/>",
                x,
                y)
            : "";
    Double error = edges.errorMicroseconds();
    String number =
        error == null
            ? ""
            : String.format(
                Locale.ROOT,
                "<text x=\"%.1f\" y=\"%.1f\" fill=\"currentColor\" font-size=\"11\">%s</text>",
                x + 12,
                y + 4,
                values.three(error));
    return ring + shape(edges, round, x, y) + number;
  }

  private String shape(TrialResult.Edges edges, boolean round, double x, double y) {
    if (!edges.allKept()) {
      return String.format(
          Locale.ROOT,
          "<path d=\"M%.1f %.1fl8 8m0 -8l-8 8\" stroke=\"currentColor\" stroke-width=\"1.6\""
              + " fill=\"none\"/>",
          x - 4,
          y - 4);
    }
    String fill = quiet(edges) ? "currentColor" : "none";
    return round
        ? String.format(
            Locale.ROOT,
            "<circle cx=\"%.1f\" cy=\"%.1f\" r=\"4.5\" fill=\"%s\" stroke=\"currentColor\"/>",
            x,
            y,
            fill)
        : String.format(
            Locale.ROOT,
            "<rect x=\"%.1f\" y=\"%.1f\" width=\"8\" height=\"8\" fill=\"%s\""
                + " stroke=\"currentColor\"/>",
            x - 4,
            y - 4,
            fill);
  }

  private boolean quiet(TrialResult.Edges edges) {
    TrialResult.Choice choice = result.choice();
    Double error = edges.errorMicroseconds();
    return choice != null && error != null && error <= choice.limitMicroseconds();
  }
}
