package turnsheet.reading.chart;

import java.util.Locale;

/** Elements of a drawing as text. */
final class Svg {

  private Svg() {}

  /** A path in the current colour; {@code dashes} empty for a full line. */
  static String path(String look, String path, double width, String dashes) {
    return "<path class=\"%s\" d=\"%s\" fill=\"none\" stroke=\"currentColor\" stroke-width=\"%s\"%s/>"
        .formatted(
            look,
            path,
            number(width),
            dashes.isEmpty() ? "" : " stroke-dasharray=\"" + dashes + "\"");
  }

  static String grid(double x1, double y1, double x2, double y2) {
    return ("<line class=\"drawn-grid\" x1=\"%s\" y1=\"%s\" x2=\"%s\" y2=\"%s\""
            + " stroke=\"currentColor\" stroke-opacity=\"0.25\" stroke-width=\"0.7\"/>")
        .formatted(number(x1), number(y1), number(x2), number(y2));
  }

  static String words(String look, double x, double y, String anchor, String words) {
    return "<text class=\"%s\" x=\"%s\" y=\"%s\" text-anchor=\"%s\" fill=\"currentColor\">%s</text>"
        .formatted(look, number(x), number(y), anchor, escape(words));
  }

  /** A light stroke under a line, so that it is seen across a dark curve. */
  static String ground(String path) {
    return ("<path class=\"drawn-ground\" d=\"%s\" fill=\"none\" stroke=\"white\""
            + " stroke-width=\"3.5\"/>")
        .formatted(path);
  }

  /** Words that end at a place, on a light ground of about their length. */
  static String grounded(String look, double x, double y, double length, String words) {
    return ("<rect class=\"drawn-ground\" x=\"%s\" y=\"%s\" width=\"%s\" height=\"15\""
                + " fill=\"white\"/>")
            .formatted(number(x - length), number(y - 11.5), number(length + 4))
        + words(look, x, y, "end", words);
  }

  /**
   * Words from bottom to top, centred.
   *
   * @param y of their middle
   * @param scale of the letters, 1 for those of all other words
   */
  static String upright(double x, double y, double scale, String words) {
    return ("<text class=\"drawn-name\" x=\"%1$s\" y=\"%2$s\" text-anchor=\"middle\""
            + " fill=\"currentColor\"%4$s transform=\"rotate(-90 %1$s %2$s)\">%3$s</text>")
        .formatted(
            number(x),
            number(y),
            escape(words),
            scale < 1 ? " font-size=\"" + number(12 * scale) + "\"" : "");
  }

  /** A surface through which what lies below is seen. */
  static String area(String look, String path) {
    return ("<path class=\"%s\" d=\"%s\" fill=\"currentColor\" fill-opacity=\"0.14\""
            + " stroke=\"none\"/>")
        .formatted(look, path);
  }

  /**
   * A dot of one of four shapes: full and hollow circle, full and hollow square. A hollow one is
   * filled with the ground, so that no line runs through it.
   */
  static String dot(int series, double x, double y) {
    int shape = (series - 1) % 4;
    String look =
        "class=\"drawn-dot series-%d\" fill=\"%s\" stroke=\"currentColor\" stroke-width=\"1.2\"/>"
            .formatted(shape + 1, shape % 2 == 0 ? "currentColor" : "white");
    return shape < 2
        ? "<circle cx=\"%s\" cy=\"%s\" r=\"3.2\" ".formatted(number(x), number(y)) + look
        : "<rect x=\"%s\" y=\"%s\" width=\"6\" height=\"6\" "
                .formatted(number(x - 3), number(y - 3))
            + look;
  }

  static String bar(double x, double y, double width, double height) {
    return ("<rect class=\"drawn-bar\" x=\"%s\" y=\"%s\" width=\"%s\" height=\"%s\""
            + " fill=\"currentColor\" fill-opacity=\"0.35\" stroke=\"currentColor\""
            + " stroke-width=\"0.6\"/>")
        .formatted(number(x), number(y), number(width), number(height));
  }

  /** Cells of one darkness. */
  static String cells(String path, double darkness) {
    return ("<path class=\"drawn-cells\" d=\"%s\" fill=\"currentColor\" fill-opacity=\"%s\""
            + " stroke=\"none\"/>")
        .formatted(path, String.format(Locale.ROOT, "%.2f", darkness));
  }

  /** A length to one tenth, which is finer than any screen or printer shows. */
  static String number(double value) {
    String digits = String.format(Locale.ROOT, "%.1f", value);
    return digits.endsWith(".0") ? digits.substring(0, digits.length() - 2) : digits;
  }

  static String escape(String words) {
    return words
        .replace("&", "&amp;")
        .replace("<", "&lt;")
        .replace(">", "&gt;")
        .replace("\"", "&quot;");
  }
}
