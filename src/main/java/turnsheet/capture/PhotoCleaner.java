package turnsheet.capture;

import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.util.Iterator;
import javax.imageio.IIOImage;
import javax.imageio.ImageIO;
import javax.imageio.ImageReadParam;
import javax.imageio.ImageReader;
import javax.imageio.ImageWriteParam;
import javax.imageio.ImageWriter;
import javax.imageio.stream.ImageInputStream;
import javax.imageio.stream.MemoryCacheImageOutputStream;
import turnsheet.web.RefusedRequestException;

/**
 * Makes a photograph into one that can be kept and shown: an upright JPEG of moderate size without
 * anything beside the picture, such as the place where it was taken.
 */
public final class PhotoCleaner {

  static final int MOST_BYTES = 20_000_000;
  static final int LONGEST_SIDE_PX = 2000;

  /** More than telephones take; a picture is never held whole before it is made smaller. */
  private static final long MOST_PIXELS = 120_000_000;

  private static final float QUALITY = 0.85f;

  private PhotoCleaner() {}

  /** A cleaned picture. */
  @SuppressWarnings("ArrayRecordComponent") // handed on at once, never compared
  record Cleaned(byte[] jpeg, int widthPx, int heightPx) {}

  /**
   * Cleans a picture.
   *
   * @param in read up to the bound; the caller closes it
   * @throws RefusedRequestException if it is too big, neither JPEG nor PNG by its bytes, or damaged
   */
  static Cleaned clean(InputStream in) throws IOException {
    BufferedImage upright = upright(in, LONGEST_SIDE_PX);
    return new Cleaned(jpeg(upright), upright.getWidth(), upright.getHeight());
  }

  /**
   * The picture alone, upright, on white.
   *
   * @param longestSide of the result at most, in pixels
   * @throws RefusedRequestException as {@link #clean}
   */
  public static BufferedImage upright(InputStream in, int longestSide) throws IOException {
    byte[] bytes = in.readNBytes(MOST_BYTES + 1);
    if (bytes.length > MOST_BYTES) {
      throw new RefusedRequestException(
          "photoTooBig", "The picture is larger than 20 MB: take one with fewer pixels.");
    }
    String format = format(bytes);
    try {
      return ExifOrientation.of(bytes).upright(smaller(format, bytes, longestSide));
    } catch (IOException | IllegalArgumentException | IndexOutOfBoundsException e) {
      throw damaged(e);
    }
  }

  private static String format(byte[] b) {
    if (b.length > 3 && (b[0] & 0xff) == 0xff && (b[1] & 0xff) == 0xd8 && (b[2] & 0xff) == 0xff) {
      return "jpeg";
    }
    if (b.length > 8 && (b[0] & 0xff) == 0x89 && b[1] == 'P' && b[2] == 'N' && b[3] == 'G') {
      return "png";
    }
    throw new RefusedRequestException(
        "photoFormat", "The file is neither a JPEG nor a PNG picture: choose another.");
  }

  private static BufferedImage smaller(String format, byte[] bytes, int longestSide)
      throws IOException {
    Iterator<ImageReader> readers = ImageIO.getImageReadersByFormatName(format);
    ImageReader reader = readers.next();
    ImageIO.setUseCache(false);
    try (ImageInputStream in = ImageIO.createImageInputStream(new ByteArrayInputStream(bytes))) {
      reader.setInput(in, true, true);
      int width = reader.getWidth(0);
      int height = reader.getHeight(0);
      if ((long) width * height > MOST_PIXELS) {
        throw new RefusedRequestException(
            "photoTooBig", "The picture has more than 120 million pixels: take a smaller one.");
      }
      ImageReadParam param = reader.getDefaultReadParam();
      // leaves up to twice the wanted size; the rest is done smoothly
      int step = Math.max(1, Math.max(width, height) / (2 * longestSide));
      param.setSourceSubsampling(step, step, 0, 0);
      return scaled(reader.read(0, param), longestSide);
    } finally {
      reader.dispose();
    }
  }

  /** Also puts the picture on white, where a PNG lets through what is behind it. */
  private static BufferedImage scaled(BufferedImage image, int longestSide) {
    double scale =
        Math.min(1, longestSide / (double) Math.max(image.getWidth(), image.getHeight()));
    int width = Math.max(1, (int) Math.round(image.getWidth() * scale));
    int height = Math.max(1, (int) Math.round(image.getHeight() * scale));
    BufferedImage plain = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
    Graphics2D draw = plain.createGraphics();
    draw.setBackground(Color.WHITE);
    draw.clearRect(0, 0, width, height);
    draw.setRenderingHint(
        RenderingHints.KEY_INTERPOLATION, RenderingHints.VALUE_INTERPOLATION_BILINEAR);
    draw.drawImage(
        image,
        AffineTransform.getScaleInstance(
            width / (double) image.getWidth(), height / (double) image.getHeight()),
        null);
    draw.dispose();
    return plain;
  }

  private static byte[] jpeg(BufferedImage image) throws IOException {
    ImageWriter writer = ImageIO.getImageWritersByFormatName("jpeg").next();
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (MemoryCacheImageOutputStream out = new MemoryCacheImageOutputStream(bytes)) {
      ImageWriteParam param = writer.getDefaultWriteParam();
      param.setCompressionMode(ImageWriteParam.MODE_EXPLICIT);
      param.setCompressionQuality(QUALITY);
      writer.setOutput(out);
      writer.write(null, new IIOImage(image, null, null), param);
    } finally {
      writer.dispose();
    }
    return bytes.toByteArray();
  }

  private static RefusedRequestException damaged(Exception cause) {
    RefusedRequestException refused =
        new RefusedRequestException(
            "photoDamaged", "The picture cannot be read to its end: take or send it again.");
    refused.initCause(cause);
    return refused;
  }
}
