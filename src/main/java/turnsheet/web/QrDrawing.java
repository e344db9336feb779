package turnsheet.web;

import com.google.zxing.WriterException;
import com.google.zxing.qrcode.decoder.ErrorCorrectionLevel;
import com.google.zxing.qrcode.encoder.ByteMatrix;
import com.google.zxing.qrcode.encoder.Encoder;

/**
 * A QR code (ISO/IEC 18004) as one path of an SVG drawing whose user unit is a module. The empty
 * border of four modules that the standard asks for is part of it.
 *
 * @param modules width and height of the drawing, border included
 * @param path of the dark modules
 */
public record QrDrawing(int modules, String path) {

  private static final int BORDER = 4;

  /**
   * Draws a text so that 15 % of it may be soiled.
   *
   * @throws IllegalArgumentException where it is longer than a QR code holds, or has characters
   *     beyond ASCII, which readers take in different ways
   */
  public static QrDrawing of(String text) {
    if (!text.chars().allMatch(c -> c < 0x80)) {
      throw new IllegalArgumentException("text beyond ASCII: " + text);
    }
    try {
      return drawn(Encoder.encode(text, ErrorCorrectionLevel.M).getMatrix());
    } catch (WriterException e) {
      throw new IllegalArgumentException("text of " + text.length() + " characters", e);
    }
  }

  /** Dark modules beside each other are one box: fewer seams where the screen rounds. */
  private static QrDrawing drawn(ByteMatrix dark) {
    StringBuilder path = new StringBuilder();
    for (int y = 0; y < dark.getHeight(); y++) {
      for (int x = 0; x < dark.getWidth(); x++) {
        int from = x;
        while (x < dark.getWidth() && dark.get(x, y) == 1) {
          x++;
        }
        if (x > from) {
          int run = x - from;
          path.append('M').append(from + BORDER).append(' ').append(y + BORDER);
          path.append('h').append(run).append("v1h-").append(run).append('z');
        }
      }
    }
    return new QrDrawing(dark.getWidth() + 2 * BORDER, path.toString());
  }
}
