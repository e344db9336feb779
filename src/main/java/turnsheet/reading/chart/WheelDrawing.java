package turnsheet.reading.chart;

import java.util.List;
import java.util.Locale;

/**
 * What repeats with each turn of a wheel, drawn round it: a circle for even spacing, a spoke for
 * every tooth that ends outside where its edge is late and inside where it is early, exaggerated.
 * The first place is at the top, the others follow clockwise.
 *
 * <p>Told apart without colour; looks may be overruled by class as in {@link SvgChart}.
 */
public final class WheelDrawing {

  private static final int SIZE = 560;
  private static final double MIDDLE = SIZE / 2.0;
  private static final double RADIUS = 170;

  /** The largest deviation is drawn this long. */
  private static final double REACH = 52;

  private static final double NUMBERS_AT = RADIUS + REACH + 22;
  private static final int MOST_NUMBERS = 24;

  private WheelDrawing() {}

  /**
   * One place of the wheel.
   *
   * @param place from 0
   * @param late in any unit, positive outwards
   * @param flagged whether it stands out
   */
  public record Tooth(int place, double late, boolean flagged) {}

  /**
   * The drawing.
   *
   * @param places of a turn
   * @param teeth those that are there, in order
   * @param missing flagged places without a tooth, from 0
   * @param markFrom first place of the reference mark; {@code places} where there is none
   * @param ringAt deviation of the two dashed circles, in the unit of the teeth
   * @param markWord written beside the mark
   */
  public static String of(
      int places,
      List<Tooth> teeth,
      List<Integer> missing,
      int markFrom,
      double ringAt,
      String markWord,
      String title,
      String description) {
    double most = ringAt;
    for (Tooth tooth : teeth) {
      most = Math.max(most, Math.abs(tooth.late()));
    }
    double scale = most > 0 ? REACH / most : 0;
    StringBuilder svg =
        new StringBuilder(
            ("<svg xmlns=\"http://www.w3.org/2000/svg\" class=\"drawn\" role=\"img\""
                    + " viewBox=\"0 0 %d %d\" font-size=\"13\"><title>%s</title><desc>%s</desc>")
                .formatted(SIZE, SIZE, Svg.escape(title), Svg.escape(description)));
    svg.append(circle("drawn-axis", RADIUS, "", 1));
    svg.append(circle("drawn-grid", RADIUS + ringAt * scale, "3 4", 0.8));
    svg.append(circle("drawn-grid", RADIUS - ringAt * scale, "3 4", 0.8));
    StringBuilder spokes = new StringBuilder();
    StringBuilder round = new StringBuilder();
    for (Tooth tooth : teeth) {
      double end = RADIUS + tooth.late() * scale;
      spokes.append('M').append(point(tooth.place(), places, RADIUS));
      spokes.append('L').append(point(tooth.place(), places, end));
      round.append(round.isEmpty() ? 'M' : 'L').append(point(tooth.place(), places, end));
    }
    svg.append(Svg.path("drawn-spokes", spokes.toString(), 1.2, ""));
    svg.append(Svg.path("drawn-series series-1", round + "z", 1.4, ""));
    for (Tooth tooth : teeth) {
      if (tooth.flagged()) {
        svg.append(dot(tooth.place(), places, RADIUS + tooth.late() * scale));
      }
    }
    for (int place : missing) {
      svg.append(dot(place, places, RADIUS));
    }
    if (markFrom < places) {
      svg.append(mark(places, markFrom, markWord));
    }
    numbers(svg, places, markFrom);
    return svg.append("</svg>").toString();
  }

  private static void numbers(StringBuilder svg, int places, int markFrom) {
    int every = 1;
    for (int step : new int[] {1, 2, 5, 10, 20, 50, 100, 200, 500}) {
      every = step;
      if (places <= step * MOST_NUMBERS) {
        break;
      }
    }
    for (int place = 0; place < markFrom; place++) {
      int number = place + 1;
      boolean room = place == 0 || places - place >= every / 2.0;
      if (number == 1 || (number % every == 0 && room)) {
        svg.append(
            Svg.words(
                "drawn-tick",
                x(place, places, NUMBERS_AT),
                y(place, places, NUMBERS_AT) + 4,
                "middle",
                Integer.toString(number)));
      }
    }
  }

  private static String mark(int places, int from, String word) {
    // half a place beyond the first and the last of the missing teeth
    StringBuilder path = new StringBuilder();
    int steps = 2 * (places - from) + 1;
    for (int i = 0; i < steps; i++) {
      path.append(i == 0 ? 'M' : 'L').append(point(from - 0.5 + i / 2.0, places, RADIUS));
    }
    double middle = from + (places - from - 1) / 2.0;
    double at = RADIUS - REACH - 16;
    return Svg.path("drawn-limit", path.toString(), 7, "")
        + Svg.words(
            "drawn-limit", x(middle, places, at), y(middle, places, at) + 8, "middle", word);
  }

  private static String circle(String look, double radius, String dashes, double width) {
    return ("<circle class=\"%s\" cx=\"%s\" cy=\"%s\" r=\"%s\" fill=\"none\""
            + " stroke=\"currentColor\" stroke-width=\"%s\"%s/>")
        .formatted(
            look,
            Svg.number(MIDDLE),
            Svg.number(MIDDLE),
            Svg.number(radius),
            String.format(Locale.ROOT, "%.1f", width),
            dashes.isEmpty() ? "" : " stroke-dasharray=\"" + dashes + "\"");
  }

  private static String dot(int place, int places, double radius) {
    return Svg.dot(2, x(place, places, radius), y(place, places, radius));
  }

  private static String point(double place, int places, double radius) {
    return Svg.number(x(place, places, radius)) + " " + Svg.number(y(place, places, radius));
  }

  private static double x(double place, int places, double radius) {
    return MIDDLE + radius * Math.sin(2 * Math.PI * place / places);
  }

  private static double y(double place, int places, double radius) {
    return MIDDLE - radius * Math.cos(2 * Math.PI * place / places);
  }
}
