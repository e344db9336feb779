package turnsheet.browser;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.Map;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.apache.pdfbox.rendering.ImageType;
import org.apache.pdfbox.rendering.PDFRenderer;
import org.apache.pdfbox.text.PDFTextStripper;
import org.apache.pdfbox.text.TextPosition;
import turnsheet.testing.QrReader;

/** The labels that stand open, as the browser prints them: sizes in millimetres on paper. */
final class PrintedLabels {

  private static final double POINTS_PER_MM = 72 / 25.4;
  private static final float DOTS_PER_INCH = 300;
  private static final double PIXELS_PER_MM = DOTS_PER_INCH / 25.4;

  /** Coarse, for whole pages: a module of a label is still four pixels wide. */
  private static final float PAGE_DOTS_PER_INCH = 150;

  /** {@code .unit-label .qr} of app.css; the empty border of four modules is part of it. */
  private static final double DRAWING_MM = 25;

  /** An edge falls on a pixel at either end. */
  private static final double EDGE_MM = 2 / PIXELS_PER_MM;

  /** As many as the page of a long list has. */
  private static final int MANY = 50;

  private final Visitor visitor;
  private final String code;

  PrintedLabels(Visitor visitor, String code) {
    this.visitor = visitor;
    this.code = code;
  }

  /** The page of one label: the label's own size, whatever paper the shop likes. */
  void alone(String serial) throws Exception {
    try (PDDocument pdf = print()) {
      assertThat(pdf.getNumberOfPages()).isEqualTo(1);
      hasSize(pdf, 62, 29);
      assertThat(new PDFTextStripper().getText(pdf)).contains(code).contains(serial);
      nothingLiesOutside(pdf);
      isReadAndOfSize(new PDFRenderer(pdf).renderImageWithDPI(0, DOTS_PER_INCH, ImageType.RGB));
    }
  }

  /** A sheet of many labels: the paper of the shop, every label whole on one page. */
  void sheet(double widthMm, double heightMm) throws Exception {
    visitor.script(
        """
        const sheet = document.querySelector(".label-sheet");
        while (sheet.children.length < arguments[0]) sheet.append(sheet.firstElementChild.cloneNode(true));
        """,
        MANY);
    try (PDDocument pdf = print()) {
      hasSize(pdf, widthMm, heightMm);
      nothingLiesOutside(pdf);
      List<Spot> spots = codes(pdf);
      assertThat(spots).hasSize(MANY);
      PDFRenderer renderer = new PDFRenderer(pdf);
      for (int page = 0; page < pdf.getNumberOfPages(); page++) {
        BufferedImage whole = renderer.renderImageWithDPI(page, PAGE_DOTS_PER_INCH, ImageType.GRAY);
        for (Spot spot : spots) {
          if (spot.page() == page) {
            assertThat(QrReader.read(beside(spot, whole))).endsWith("/u/" + code.replace("-", ""));
          }
        }
      }
    }
  }

  /**
   * Where the code of a label is printed, in points from the upper left corner.
   *
   * @param page from 0
   */
  private record Spot(int page, double x, double y) {}

  /** The drawing of a label and some of what is above and below it. */
  private static BufferedImage beside(Spot spot, BufferedImage page) {
    double pixels = PAGE_DOTS_PER_INCH / 72;
    int right = (int) (spot.x() * pixels);
    int left = (int) ((spot.x() - 28 * POINTS_PER_MM) * pixels);
    int top = (int) ((spot.y() - 15 * POINTS_PER_MM) * pixels);
    int bottom = (int) ((spot.y() + 16 * POINTS_PER_MM) * pixels);
    left = Math.max(0, left);
    top = Math.max(0, top);
    return page.getSubimage(left, top, right - left, Math.min(page.getHeight(), bottom) - top);
  }

  private List<Spot> codes(PDDocument pdf) throws IOException {
    List<Spot> spots = new ArrayList<>();
    PDFTextStripper stripper =
        new PDFTextStripper() {
          @Override
          protected void writeString(String text, List<TextPosition> letters) {
            int at = text.indexOf(code);
            if (at >= 0) {
              TextPosition first = letters.get(at);
              spots.add(new Spot(getCurrentPageNo() - 1, first.getXDirAdj(), first.getYDirAdj()));
            }
          }
        };
    stripper.getText(pdf);
    return spots;
  }

  private void isReadAndOfSize(BufferedImage page) throws Exception {
    QrReader.Found found = QrReader.find(page);
    assertThat(found.text()).endsWith("/u/" + code.replace("-", ""));
    int modules = (int) Math.round(found.edgePixels() / found.modulePixels());
    double dark = DRAWING_MM * modules / (modules + 8);
    assertThat(found.edgePixels() / PIXELS_PER_MM).isCloseTo(dark, within(EDGE_MM));
  }

  private static void hasSize(PDDocument pdf, double widthMm, double heightMm) {
    for (int page = 0; page < pdf.getNumberOfPages(); page++) {
      PDRectangle box = pdf.getPage(page).getMediaBox();
      // the browser rounds to whole CSS pixels, three quarters of a point
      assertThat((double) box.getWidth()).isCloseTo(widthMm * POINTS_PER_MM, within(1.0));
      assertThat((double) box.getHeight()).isCloseTo(heightMm * POINTS_PER_MM, within(1.0));
    }
  }

  private static void nothingLiesOutside(PDDocument pdf) throws IOException {
    PDFTextStripper inside =
        new PDFTextStripper() {
          @Override
          protected void writeString(String text, List<TextPosition> letters) throws IOException {
            for (TextPosition letter : letters) {
              assertThat(letter.getXDirAdj()).as(text).isNotNegative();
              assertThat(letter.getXDirAdj() + letter.getWidthDirAdj())
                  .as(text)
                  .isLessThanOrEqualTo(letter.getPageWidth());
              assertThat(letter.getYDirAdj() - letter.getHeightDir()).as(text).isNotNegative();
              assertThat(letter.getYDirAdj()).as(text).isLessThanOrEqualTo(letter.getPageHeight());
            }
            super.writeString(text, letters);
          }
        };
    inside.getText(pdf);
  }

  private PDDocument print() throws IOException {
    Object data =
        visitor.protocol("Page.printToPDF", Map.of("preferCSSPageSize", true)).get("data");
    return Loader.loadPDF(Base64.getDecoder().decode(String.valueOf(data)));
  }
}
