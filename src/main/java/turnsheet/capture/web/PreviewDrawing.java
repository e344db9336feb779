package turnsheet.capture.web;

import java.util.Locale;
import turnsheet.capture.Preview;

/**
 * A preview as the points of an SVG polyline in a box of 640 x 120.
 *
 * @param fromMilliseconds where the stretch begins
 * @param lengthMilliseconds how long it is
 */
record PreviewDrawing(
    String points, String fromMilliseconds, String lengthMilliseconds, String low, String high) {

  static final int WIDTH = 640;
  static final int HEIGHT = 120;
  private static final int MARGIN = 6;

  static PreviewDrawing of(Preview preview) {
    int n = preview.size();
    double start = preview.seconds(0);
    double span = preview.seconds(n - 1) - start;
    double low = preview.lowest();
    double height = preview.highest() - low;
    StringBuilder points = new StringBuilder(n * 12);
    double before = 0;
    for (int i = 0; i < n; i++) {
      double x = span > 0 ? (preview.seconds(i) - start) / span * WIDTH : 0;
      double level = height > 0 ? (preview.level(i) - low) / height : 0.5;
      double y = HEIGHT - MARGIN - level * (HEIGHT - 2 * MARGIN);
      if (preview.steps()) {
        add(points, x, i == 0 ? HEIGHT - MARGIN - (1 - level) * (HEIGHT - 2 * MARGIN) : before);
      }
      add(points, x, y);
      before = y;
    }
    return new PreviewDrawing(
        points.toString(),
        number(start * 1000),
        number(span * 1000),
        number(low),
        number(preview.highest()));
  }

  private static void add(StringBuilder points, double x, double y) {
    points.append(String.format(Locale.ROOT, "%.1f,%.1f ", x, y));
  }

  /** Three digits are enough beside a sketch. */
  private static String number(double value) {
    return turnsheet.web.Numbers.onPage(
        new java.math.BigDecimal(value)
            .round(new java.math.MathContext(3))
            .stripTrailingZeros()
            .toPlainString());
  }
}
