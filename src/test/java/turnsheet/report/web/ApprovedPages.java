package turnsheet.report.web;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import javax.imageio.ImageIO;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.rendering.ImageType;
import org.apache.pdfbox.rendering.PDFRenderer;

/**
 * Pages of a document against pictures that somebody has looked at and found good.
 *
 * <p>The fonts are in the document and PDFBox fills their outlines through the rasteriser of the
 * Java installation, so the picture does not depend on the machine's fonts. How that rasteriser
 * shades the edge of a letter changes a little between Java versions: from 17 to 25, four pixels of
 * a page by 7 levels of 255. A pixel counts as different beyond 32 levels, and one in a hundred
 * thousand may be; another digit in place of a printed one is more than that.
 */
final class ApprovedPages {

  private static final Path APPROVED = Path.of("src", "test", "resources", "approved");
  private static final Path ACTUAL = Path.of("target", "approved");
  private static final float DOTS_PER_INCH = 60;
  private static final int LEVELS = 32;
  private static final double SHARE = 1e-5;

  private ApprovedPages() {}

  /** What differs, one line for each page, with what to do; empty where all is as approved. */
  static List<String> differences(PDDocument document, String name) throws IOException {
    List<String> differences = new ArrayList<>();
    PDFRenderer renderer = new PDFRenderer(document);
    Files.createDirectories(ACTUAL);
    for (int page = 0; page < document.getNumberOfPages(); page++) {
      Path file = Path.of("%s-%d.png".formatted(name, page + 1));
      BufferedImage actual = renderer.renderImageWithDPI(page, DOTS_PER_INCH, ImageType.GRAY);
      ImageIO.write(actual, "png", ACTUAL.resolve(file).toFile());
      double share = differing(actual, APPROVED.resolve(file));
      if (share > SHARE) {
        differences.add(
            "%.4f %% of page %d differ from %s: look at %s, and if it is good, copy it there"
                .formatted(100 * share, page + 1, APPROVED.resolve(file), ACTUAL.resolve(file)));
      }
    }
    Path further = APPROVED.resolve("%s-%d.png".formatted(name, document.getNumberOfPages() + 1));
    if (Files.exists(further)) {
      differences.add("there is no page any more for " + further);
    }
    return differences;
  }

  /** Share of the pixels, 0 to 1; 1 where there is nothing to compare with. */
  private static double differing(BufferedImage actual, Path approvedFile) throws IOException {
    if (!Files.exists(approvedFile)) {
      return 1;
    }
    BufferedImage approved = ImageIO.read(approvedFile.toFile());
    if (approved.getWidth() != actual.getWidth() || approved.getHeight() != actual.getHeight()) {
      return 1;
    }
    int[] one = levels(actual);
    int[] other = levels(approved);
    int different = 0;
    for (int i = 0; i < one.length; i++) {
      if (Math.abs(one[i] - other[i]) > LEVELS) {
        different++;
      }
    }
    return (double) different / one.length;
  }

  private static int[] levels(BufferedImage image) {
    return image.getRaster().getSamples(0, 0, image.getWidth(), image.getHeight(), 0, (int[]) null);
  }
}
