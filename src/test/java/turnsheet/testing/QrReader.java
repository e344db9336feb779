package turnsheet.testing;

import com.google.zxing.BinaryBitmap;
import com.google.zxing.DecodeHintType;
import com.google.zxing.NotFoundException;
import com.google.zxing.RGBLuminanceSource;
import com.google.zxing.Result;
import com.google.zxing.ResultPoint;
import com.google.zxing.common.HybridBinarizer;
import com.google.zxing.qrcode.QRCodeReader;
import com.google.zxing.qrcode.detector.FinderPattern;
import java.awt.image.BufferedImage;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads QR codes as a camera does: from pixels. */
public final class QrReader {

  private static final Pattern BOX = Pattern.compile("M(\\d+) (\\d+)h(\\d+)v1h-(\\d+)z");
  private static final int PIXELS_PER_MODULE = 4;

  private QrReader() {}

  /** What an SVG path of boxes says, drawn with four pixels to the module. */
  public static String read(int modules, String path) throws Exception {
    boolean[][] dark = pixels(modules, path);
    int size = modules * PIXELS_PER_MODULE;
    BufferedImage image = new BufferedImage(size, size, BufferedImage.TYPE_INT_RGB);
    for (int y = 0; y < size; y++) {
      for (int x = 0; x < size; x++) {
        image.setRGB(x, y, dark[y / PIXELS_PER_MODULE][x / PIXELS_PER_MODULE] ? 0 : 0xffffff);
      }
    }
    return read(image);
  }

  /** What the one code in a picture says. */
  public static String read(BufferedImage image) throws Exception {
    return found(image).getText();
  }

  /**
   * A code in an upright picture.
   *
   * @param edgePixels from the first to the last dark column, the empty border left out
   * @param modulePixels width of a module, as near as the reader tells
   */
  public record Found(String text, double edgePixels, double modulePixels) {}

  /** The one code in an upright picture, with its size. */
  public static Found find(BufferedImage image) throws Exception {
    Result result = found(image);
    // centres of the three finder patterns: below left, above left, above right
    ResultPoint[] centres = result.getResultPoints();
    double module = ((FinderPattern) centres[1]).getEstimatedModuleSize();
    int reach = (int) Math.round(5.5 * module); // half a pattern, then half of the border
    int row = Math.round(centres[1].getY() - Math.round(3 * module));
    int first = Integer.MAX_VALUE;
    int last = Integer.MIN_VALUE;
    int from = Math.round(centres[1].getX()) - reach;
    int to = Math.round(centres[2].getX()) + reach;
    for (int x = Math.max(0, from); x <= Math.min(image.getWidth() - 1, to); x++) {
      if ((image.getRGB(x, row) & 0xff) < 128) {
        first = Math.min(first, x);
        last = x;
      }
    }
    return new Found(result.getText(), last - first + 1.0, module);
  }

  private static Result found(BufferedImage image) throws Exception {
    try {
      return new QRCodeReader().decode(bitmap(image), Map.of(DecodeHintType.TRY_HARDER, true));
    } catch (NotFoundException e) {
      throw new AssertionError("no QR code in the picture", e);
    }
  }

  private static BinaryBitmap bitmap(BufferedImage image) {
    int[] pixels =
        image.getRGB(0, 0, image.getWidth(), image.getHeight(), null, 0, image.getWidth());
    var source = new RGBLuminanceSource(image.getWidth(), image.getHeight(), pixels);
    return new BinaryBitmap(new HybridBinarizer(source));
  }

  /** The modules that a path of boxes makes dark, by row and column. */
  public static boolean[][] pixels(int modules, String path) {
    boolean[][] dark = new boolean[modules][modules];
    Matcher box = BOX.matcher(path);
    int end = 0;
    while (box.find()) {
      if (box.start() != end || !box.group(3).equals(box.group(4))) {
        throw new AssertionError("not a path of boxes at " + box.start());
      }
      end = box.end();
      for (int i = 0; i < Integer.parseInt(box.group(3)); i++) {
        dark[Integer.parseInt(box.group(2))][Integer.parseInt(box.group(1)) + i] = true;
      }
    }
    if (end != path.length()) {
      throw new AssertionError("more than boxes in the path");
    }
    return dark;
  }
}
