package turnsheet.trial.web;

import java.util.Locale;
import turnsheet.core.diagnose.filter.SallenKey;

/**
 * Draws one stage of a filter: resistors as boxes, capacitors as plates, the amplifier as a
 * triangle, with the values beside them. Black on nothing, so that it prints and turns dark.
 */
final class StageDrawing {

  private static final int WIDTH = 380;
  private static final int HEIGHT = 190;

  private final StringBuilder svg = new StringBuilder();

  private StageDrawing() {}

  /**
   * The drawing.
   *
   * @param number of the stage, from 1
   * @param title for a screen reader
   * @param in what the left end is
   * @param out what the right end is
   */
  static String of(
      SallenKey stage, int number, String title, String in, String out, Values values) {
    StageDrawing drawing = new StageDrawing();
    boolean high = stage.wanted().highPass();
    String n = Integer.toString(number);
    String r1 = "R" + n + "1 " + values.ohms(stage.r1Ohm());
    String r2 = "R" + n + "2 " + values.ohms(stage.r2Ohm());
    String c1 = "C" + n + "1 " + values.farads(stage.c1Farad());
    String c2 = "C" + n + "2 " + values.farads(stage.c2Farad());
    drawing.begin(title);
    drawing.wires();
    drawing.lying(high, 75, 80, high ? c1 : r1);
    drawing.lying(high, 165, 80, high ? c2 : r2);
    drawing.lying(!high, 228, 24, high ? r1 : c1);
    drawing.standing(!high, 205, 118, high ? r2 : c2);
    drawing.amplifier();
    drawing.words(4, 102, "start", in);
    drawing.words(WIDTH - 4, 112, "end", out);
    return drawing.svg.append("</g></svg>").toString();
  }

  private void begin(String title) {
    svg.append(
        String.format(
            Locale.ROOT,
            "<svg class=\"stage\" viewBox=\"0 0 %d %d\" role=\"img\" aria-label=\"%s\""
                + " font-size=\"12\"><g stroke=\"currentColor\" fill=\"none\""
                + " stroke-width=\"1.4\">",
            WIDTH,
            HEIGHT,
            escape(title)));
  }

  private void wires() {
    // in, through both series parts to the amplifier's input
    line("M10 80H60M90 80H150M180 80H255");
    // from between them over the top to the output
    line("M120 80V24H213M243 24H350V95");
    // from the input to ground
    line("M205 80V103M205 133V158M193 158H217M197 163H213M202 168H208");
    // the output and back to the other input
    line("M320 95H370M335 95V150H240V110H255");
    dot(120, 80);
    dot(205, 80);
    dot(335, 95);
    dot(350, 95);
    ring(10, 80);
    ring(370, 95);
  }

  /** A part of 30 in length in the middle of a horizontal wire. */
  private void lying(boolean capacitor, int x, int y, String label) {
    if (capacitor) {
      line(
          String.format(
              Locale.ROOT,
              "M%d %dH%dM%d %dV%dM%d %dV%dM%d %dH%d",
              x - 15,
              y,
              x - 4,
              x - 4,
              y - 11,
              y + 11,
              x + 4,
              y - 11,
              y + 11,
              x + 4,
              y,
              x + 15));
    } else {
      box(x - 15, y - 6, 30, 12);
    }
    words(x, y - 15 < 12 ? y + 22 : y - 16, "middle", label);
  }

  private void standing(boolean capacitor, int x, int y, String label) {
    if (capacitor) {
      line(
          String.format(
              Locale.ROOT,
              "M%d %dV%dM%d %dH%dM%d %dH%dM%d %dV%d",
              x,
              y - 15,
              y - 4,
              x - 11,
              y - 4,
              x + 11,
              x - 11,
              y + 4,
              x + 11,
              x,
              y + 4,
              y + 15));
    } else {
      box(x - 6, y - 15, 12, 30);
    }
    words(x - 18, y + 4, "end", label);
  }

  private void amplifier() {
    line("M255 60V130L320 95Z");
    words(263, 84, "start", "+");
    words(263, 115, "start", "\u2212");
  }

  private void line(String path) {
    svg.append("<path d=\"").append(path).append("\"/>");
  }

  private void box(int x, int y, int width, int height) {
    svg.append(
        String.format(
            Locale.ROOT,
            "<rect x=\"%d\" y=\"%d\" width=\"%d\" height=\"%d\"/>",
            x,
            y,
            width,
            height));
  }

  private void dot(int x, int y) {
    svg.append(
        String.format(
            Locale.ROOT, "<circle cx=\"%d\" cy=\"%d\" r=\"2.2\" fill=\"currentColor\"/>", x, y));
  }

  private void ring(int x, int y) {
    svg.append(String.format(Locale.ROOT, "<circle cx=\"%d\" cy=\"%d\" r=\"3\"/>", x, y));
  }

  private void words(int x, int y, String anchor, String words) {
    svg.append(
        String.format(
            Locale.ROOT,
            "<text x=\"%d\" y=\"%d\" text-anchor=\"%s\" fill=\"currentColor\" stroke=\"none\">%s"
                + "</text>",
            x,
            y,
            anchor,
            escape(words)));
  }

  private static String escape(String words) {
    return words.replace("&", "&amp;").replace("<", "&lt;").replace("\"", "&quot;");
  }
}
