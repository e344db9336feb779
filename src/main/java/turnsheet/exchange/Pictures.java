package turnsheet.exchange;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Base64;
import java.util.HexFormat;
import java.util.Optional;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import turnsheet.access.ShopProfiles;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.PhotoCleaner;
import turnsheet.capture.StoredBytes;

/** Pictures in and out of a document: photographs that lie in the store, and the shop's logo. */
@Component
final class Pictures {

  private static final Logger log = LoggerFactory.getLogger(Pictures.class);

  /** More than any picture that the service keeps has on a side. */
  private static final int LONGEST_SIDE_PX = 2000;

  private static final String JPEG = "jpeg";

  private final CaptureStore store;

  Pictures(CaptureStore store) {
    this.store = store;
  }

  /** The entry with its picture; empty for a photograph whose file is gone. */
  Optional<Entry> filled(Entry entry) throws IOException {
    if (!entry.is(BenchKinds.PHOTOS)) {
      return Optional.of(entry);
    }
    StoredBytes bytes = bytes(entry);
    if (!store.holds(bytes)) {
      log.warn("the photograph of visit {} is not exported, its file is gone", entry.key());
      return Optional.empty();
    }
    try (InputStream in = store.open(bytes).open()) {
      return Optional.of(entry.with(JPEG, Base64.getEncoder().encodeToString(in.readAllBytes())));
    }
  }

  /**
   * Brings the picture of a photograph into the store; of anything else nothing.
   *
   * @throws IllegalArgumentException if the picture is not what the entry says of it
   * @throws RefusedFileException {@code noRoom} if the disk does not take it
   */
  void keep(Entry entry) {
    if (!entry.is(BenchKinds.PHOTOS)) {
      return;
    }
    byte[] jpeg = Base64.getDecoder().decode(entry.text(JPEG));
    StoredBytes bytes = bytes(entry);
    require(
        jpeg.length == bytes.length() && sha256(jpeg).equals(bytes.sha256()),
        "its picture is not the one of its SHA-256 and length");
    require((jpeg[0] & 0xff) == 0xff, "its picture is no JPEG");
    BufferedImage picture = picture(jpeg);
    require(
        picture.getWidth() == entry.whole("widthPx")
            && picture.getHeight() == entry.whole("heightPx"),
        "its picture has another size");
    try {
      store.receive(new ByteArrayInputStream(jpeg));
    } catch (IOException e) {
      log.error("cannot store a photograph", e);
      throw new RefusedFileException(
          "noRoom",
          "The disk of the service did not take a photograph of the file: make room in the data"
              + " folder, then import the file again.");
    }
  }

  /** The same for an entry that is here already, whose file may have been lost. */
  void restore(Entry entry) {
    if (entry.is(BenchKinds.PHOTOS) && !store.holds(bytes(entry))) {
      keep(entry);
    }
  }

  /** Holds a logo against what the shop's own page would have kept. */
  static void checkLogo(Entry entry) {
    byte[] png = Base64.getDecoder().decode(entry.text("content"));
    require(
        "image/png".equals(entry.value("mediaType"))
            && png.length > 0
            && png.length <= ShopProfiles.LOGO_BYTES
            && (png[0] & 0xff) == 0x89,
        "it is no PNG of 200 kB at most");
    picture(png);
  }

  private static BufferedImage picture(byte[] bytes) {
    try {
      return PhotoCleaner.upright(new ByteArrayInputStream(bytes), LONGEST_SIDE_PX);
    } catch (IOException e) {
      throw new IllegalStateException("a read from memory failed", e);
    }
  }

  private static String sha256(byte[] bytes) {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException(e);
    }
  }

  private static StoredBytes bytes(Entry entry) {
    return new StoredBytes(entry.text("sha256"), entry.whole("byteLength"));
  }

  private static void require(boolean kept, String otherwise) {
    if (!kept) {
      throw new IllegalArgumentException(otherwise);
    }
  }
}
