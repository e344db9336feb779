package turnsheet.capture;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import turnsheet.web.RefusedRequestException;

class PhotoCleanerTest {

  private static final int RED = 0xd02020;
  private static final int BLUE = 0x2020d0;

  @Test
  void aPictureComesOutAsAPlainJpegOfModerateSize() throws IOException {
    PhotoCleaner.Cleaned cleaned = clean(encoded(halves(5000, 1000), "png"));
    assertThat(cleaned.widthPx()).isEqualTo(PhotoCleaner.LONGEST_SIDE_PX);
    assertThat(cleaned.heightPx()).isEqualTo(400);
    BufferedImage read = ImageIO.read(new ByteArrayInputStream(cleaned.jpeg()));
    assertThat(read.getWidth()).isEqualTo(2000);
    assertNear(read.getRGB(100, 200), RED);
    assertNear(read.getRGB(1900, 200), BLUE);
  }

  @Test
  void aSmallPictureKeepsItsSize() throws IOException {
    PhotoCleaner.Cleaned cleaned = clean(encoded(halves(64, 48), "jpeg"));
    assertThat(cleaned.widthPx()).isEqualTo(64);
    assertThat(cleaned.heightPx()).isEqualTo(48);
  }

  /** The place where it was taken lies in the same segment as the way the camera was held. */
  @Test
  void whatStandsBesideThePictureIsGone() throws IOException {
    byte[] taken = withExif(encoded(halves(64, 48), "jpeg"), 1, "N51.5 W0.1 secret");
    assertThat(new String(taken, StandardCharsets.ISO_8859_1)).contains("secret");
    String kept = new String(clean(taken).jpeg(), StandardCharsets.ISO_8859_1);
    assertThat(kept).doesNotContain("secret").doesNotContain("Exif");
  }

  /** Left is red as the sensor saw it; by the standard value 3 turns it by half a turn. */
  @Test
  void thePictureStandsAsItWasHeld() throws IOException {
    byte[] plain = encoded(halves(64, 48), "jpeg");
    assertCorner(clean(withExif(plain, 1, "")), 64, 48, 4, 24, RED);
    assertCorner(clean(withExif(plain, 2, "")), 64, 48, 60, 24, RED);
    assertCorner(clean(withExif(plain, 3, "")), 64, 48, 60, 24, RED);
    assertCorner(clean(withExif(plain, 4, "")), 64, 48, 4, 24, RED);
    // 6: the row that was first is at the right, so the left of the sensor is the top
    assertCorner(clean(withExif(plain, 6, "")), 48, 64, 24, 4, RED);
    // 8: the row that was first is at the left, so the left of the sensor is the bottom
    assertCorner(clean(withExif(plain, 8, "")), 48, 64, 24, 60, RED);
    assertCorner(clean(withExif(plain, 5, "")), 48, 64, 24, 4, RED);
    assertCorner(clean(withExif(plain, 7, "")), 48, 64, 24, 60, RED);
    assertCorner(clean(withExif(plain, 99, "")), 64, 48, 4, 24, RED);
  }

  @Test
  void whatIsNoPictureIsRefusedByItsBytes() throws IOException {
    refused("photoFormat", "GIF89a...".getBytes(StandardCharsets.US_ASCII));
    refused("photoFormat", "<svg xmlns='x'/>".getBytes(StandardCharsets.US_ASCII));
    refused("photoFormat", new byte[0]);
    byte[] jpeg = encoded(halves(64, 48), "jpeg");
    refused("photoDamaged", Arrays.copyOf(jpeg, 40));
    refused("photoTooBig", new byte[PhotoCleaner.MOST_BYTES + 1]);
  }

  /** A PNG of 65000 x 65000 pixels may be a few bytes long; its head alone is looked at. */
  @Test
  void aPictureOfTooManyPixelsIsRefusedBeforeItIsUnpacked() throws IOException {
    byte[] png = encoded(halves(8, 8), "png");
    // width and height are the first two numbers of the first chunk, 16 bytes in (PNG, 11.2.1)
    for (int at : new int[] {16, 20}) {
      png[at] = 0;
      png[at + 1] = 0;
      png[at + 2] = (byte) 0xfd;
      png[at + 3] = (byte) 0xe8;
    }
    refused("photoTooBig", png);
  }

  private static void assertCorner(
      PhotoCleaner.Cleaned cleaned, int width, int height, int x, int y, int rgb)
      throws IOException {
    assertThat(cleaned.widthPx()).isEqualTo(width);
    assertThat(cleaned.heightPx()).isEqualTo(height);
    assertNear(ImageIO.read(new ByteArrayInputStream(cleaned.jpeg())).getRGB(x, y), rgb);
  }

  /** JPEG keeps colours roughly. */
  private static void assertNear(int rgb, int wanted) {
    for (int shift : new int[] {0, 8, 16}) {
      assertThat(Math.abs((rgb >> shift & 0xff) - (wanted >> shift & 0xff))).isLessThan(25);
    }
  }

  private static void refused(String code, byte[] bytes) {
    assertThatThrownBy(() -> clean(bytes))
        .isInstanceOfSatisfying(
            RefusedRequestException.class, e -> assertThat(e.code()).isEqualTo(code));
  }

  private static PhotoCleaner.Cleaned clean(byte[] bytes) throws IOException {
    return PhotoCleaner.clean(new ByteArrayInputStream(bytes));
  }

  static byte[] encoded(BufferedImage image, String format) throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ImageIO.write(image, format, out);
    return out.toByteArray();
  }

  static BufferedImage halves(int width, int height) {
    BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
    for (int y = 0; y < height; y++) {
      for (int x = 0; x < width; x++) {
        image.setRGB(x, y, x < width / 2 ? RED : BLUE);
      }
    }
    return image;
  }

  /** Puts an Exif segment with one tag after the first marker, and a text behind it. */
  static byte[] withExif(byte[] jpeg, int orientation, String text) {
    byte[] words = text.getBytes(StandardCharsets.US_ASCII);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    out.write(jpeg, 0, 2);
    int length = 2 + 6 + 8 + 2 + 12 + 4 + words.length;
    out.writeBytes(new byte[] {(byte) 0xff, (byte) 0xe1, (byte) (length >> 8), (byte) length});
    out.writeBytes("Exif\0\0MM\0*\0\0\0\u0008".getBytes(StandardCharsets.US_ASCII));
    out.writeBytes(new byte[] {0, 1, 1, 0x12, 0, 3, 0, 0, 0, 1, 0, (byte) orientation, 0, 0});
    out.writeBytes(new byte[] {0, 0, 0, 0});
    out.writeBytes(words);
    out.write(jpeg, 2, jpeg.length - 2);
    return out.toByteArray();
  }
}
