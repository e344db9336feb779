package turnsheet.capture;

import java.awt.image.BufferedImage;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/**
 * How a camera was held, as a JPEG says it: tag 274 of the first directory of its Exif segment
 * (CIPA DC-008, Exif 2.32, 4.6.4). Cleaning drops the tag, so the picture is turned first.
 *
 * @param value 1 to 8, of which 1 is upright
 */
record ExifOrientation(int value) {

  private static final int APP1 = 0xe1;
  private static final int START_OF_SCAN = 0xda;
  private static final int ORIENTATION = 0x112;
  private static final int ENTRY_BYTES = 12;

  /** What the bytes of a picture say; upright where they say nothing that can be read. */
  static ExifOrientation of(byte[] picture) {
    int value = 1;
    try {
      value = find(ByteBuffer.wrap(picture));
    } catch (IndexOutOfBoundsException | IllegalArgumentException e) {
      // a damaged segment beside a good picture
    }
    return new ExifOrientation(value < 1 || value > 8 ? 1 : value);
  }

  private static int find(ByteBuffer jpeg) {
    if (jpeg.limit() < 4 || (jpeg.getShort(0) & 0xffff) != 0xffd8) {
      return 1;
    }
    int at = 2;
    while (at + 4 <= jpeg.limit() && (jpeg.get(at) & 0xff) == 0xff) {
      int marker = jpeg.get(at + 1) & 0xff;
      int length = jpeg.getShort(at + 2) & 0xffff;
      if (marker == START_OF_SCAN) {
        return 1;
      }
      // "Exif" and two zeros before the directory
      if (marker == APP1 && jpeg.getInt(at + 4) == 0x45786966 && jpeg.getShort(at + 8) == 0) {
        return inDirectory(jpeg.slice(at + 10, length - 8));
      }
      at += 2 + length;
    }
    return 1;
  }

  private static int inDirectory(ByteBuffer tiff) {
    tiff.order(tiff.get(0) == 'I' ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
    int directory = tiff.getInt(4);
    int entries = tiff.getShort(directory) & 0xffff;
    for (int i = 0; i < entries; i++) {
      int entry = directory + 2 + ENTRY_BYTES * i;
      if ((tiff.getShort(entry) & 0xffff) == ORIENTATION) {
        return tiff.getShort(entry + 8) & 0xffff;
      }
    }
    return 1;
  }

  /** The picture as it was seen. */
  BufferedImage upright(BufferedImage taken) {
    if (value == 1) {
      return taken;
    }
    int w = taken.getWidth();
    int h = taken.getHeight();
    boolean onItsSide = value >= 5;
    BufferedImage turned =
        new BufferedImage(onItsSide ? h : w, onItsSide ? w : h, BufferedImage.TYPE_INT_RGB);
    for (int y = 0; y < h; y++) {
      for (int x = 0; x < w; x++) {
        int rgb = taken.getRGB(x, y);
        switch (value) {
          case 2 -> turned.setRGB(w - 1 - x, y, rgb);
          case 3 -> turned.setRGB(w - 1 - x, h - 1 - y, rgb);
          case 4 -> turned.setRGB(x, h - 1 - y, rgb);
          case 5 -> turned.setRGB(y, x, rgb);
          case 6 -> turned.setRGB(h - 1 - y, x, rgb);
          case 7 -> turned.setRGB(h - 1 - y, w - 1 - x, rgb);
          default -> turned.setRGB(y, w - 1 - x, rgb);
        }
      }
    }
    return turned;
  }
}
