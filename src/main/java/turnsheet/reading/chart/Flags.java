package turnsheet.reading.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Words above places of a curve, each tied to its place by a thin line; they keep clear of each
 * other.
 */
final class Flags {

  private static final int ROW_HEIGHT = 15;
  private static final int ROWS = 3;

  private final List<Flag> flags = new ArrayList<>();

  private record Flag(double x, double y, String word) {}

  void add(double x, double y, String word) {
    flags.add(new Flag(x, y, word));
  }

  /** The room that they need above the curve. */
  int height() {
    return flags.isEmpty() ? 0 : ROWS * ROW_HEIGHT;
  }

  /**
   * Puts each word into the first row where it does not run into one that stands there.
   *
   * @param left edge that no word begins before
   * @param right edge that words end at as far as they can
   * @param top where the first row stands
   */
  String drawn(double left, double right, double top, SvgChart.Place place) {
    StringBuilder svg = new StringBuilder();
    double[] taken = new double[ROWS];
    List<Flag> inOrder = new ArrayList<>(flags);
    inOrder.sort(Comparator.comparingDouble(Flag::x));
    for (Flag flag : inOrder) {
      double at = place.left().applyAsDouble(flag.x());
      double wide = flag.word().length() * SvgChart.LETTER;
      double begin = Math.max(left, Math.min(at + 3, right - wide));
      int row = 0;
      while (row < ROWS - 1 && taken[row] > begin) {
        row++;
      }
      taken[row] = begin + wide + 8;
      double level = top + row * ROW_HEIGHT;
      String pole =
          "M%s %sV%s"
              .formatted(
                  Svg.number(at),
                  Svg.number(level - 8),
                  Svg.number(place.top().applyAsDouble(flag.y())));
      svg.append(Svg.path("drawn-flag", pole, 0.6, ""));
      svg.append(Svg.words("drawn-flag", begin, level, "start", flag.word()));
    }
    return svg.toString();
  }
}
