package turnsheet.capture;

import java.io.FileInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;
import turnsheet.core.format.api.ByteSource;

/**
 * The bytes of all captures, each under its SHA-256: {@code captures/ab/ab....}. An object is
 * complete and on the disk before it has its name, and never changes afterwards.
 *
 * <p>Memory: one buffer of 64 KiB per upload, whatever its length.
 */
@Component
public class CaptureStore {

  private static final Logger log = LoggerFactory.getLogger(CaptureStore.class);

  private static final int BUFFER_BYTES = 64 * 1024;

  private final Path captures;
  private final IncomingFolder incoming;

  public CaptureStore(@Value("${turnsheet.data-dir}") Path dataDir, IncomingFolder incoming)
      throws IOException {
    this.captures = dataDir.toAbsolutePath().normalize().resolve("captures");
    this.incoming = incoming;
    Files.createDirectories(captures);
  }

  /**
   * Takes in a stream to its end; the caller closes it. The same bytes twice are one object.
   *
   * @throws BrokenUploadException if the stream breaks; nothing is left of it
   * @throws StoreException if the disk does not take the bytes; nothing is left of them
   */
  public StoredBytes receive(InputStream in) throws BrokenUploadException, StoreException {
    Path part = incoming.newPart();
    try {
      StoredBytes stored = write(in, part);
      keep(part, stored);
      return stored;
    } catch (BrokenUploadException e) {
      throw e;
    } catch (IOException e) {
      throw new StoreException(e);
    } finally {
      try {
        Files.deleteIfExists(part);
      } catch (IOException e) {
        log.warn("left behind until the next start: {}", part, e);
      }
    }
  }

  /** Opens stored bytes for reading, as often as needed. */
  public ByteSource open(StoredBytes bytes) {
    Path file = pathOf(bytes);
    return new ByteSource() {
      @Override
      public InputStream open() throws IOException {
        // a plain file stream outlives an interrupt of its thread, one on a channel does not
        return new FileInputStream(file.toFile());
      }

      @Override
      public long length() {
        return bytes.length();
      }
    };
  }

  /** Whether such bytes lie here. */
  public boolean holds(StoredBytes bytes) {
    return pathOf(bytes).toFile().length() == bytes.length() && Files.isRegularFile(pathOf(bytes));
  }

  private static StoredBytes write(InputStream in, Path part)
      throws IOException, BrokenUploadException {
    MessageDigest digest = sha256();
    byte[] buffer = new byte[BUFFER_BYTES];
    long length = 0;
    try (FileChannel out =
        FileChannel.open(part, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
      // tells the cleaning of another start that this is no leftover; ends with the channel
      out.lock();
      for (int n = read(in, buffer); n >= 0; n = read(in, buffer)) {
        digest.update(buffer, 0, n);
        ByteBuffer bytes = ByteBuffer.wrap(buffer, 0, n);
        while (bytes.hasRemaining()) {
          out.write(bytes);
        }
        length += n;
      }
      out.force(true);
    }
    return new StoredBytes(HexFormat.of().formatHex(digest.digest()), length);
  }

  private static int read(InputStream in, byte[] buffer) throws BrokenUploadException {
    try {
      return in.read(buffer);
    } catch (IOException e) {
      throw new BrokenUploadException(e);
    }
  }

  private void keep(Path part, StoredBytes bytes) throws IOException {
    Path target = pathOf(bytes);
    Path folder = target.resolveSibling(".").normalize();
    if (!Files.isDirectory(folder)) {
      Files.createDirectories(folder);
      sync(captures);
    }
    if (Files.exists(target) && Files.size(target) == bytes.length()) {
      return;
    }
    try {
      Files.move(part, target, StandardCopyOption.ATOMIC_MOVE);
    } catch (AtomicMoveNotSupportedException e) {
      throw new IOException("the data folder must lie on one file system", e);
    }
    sync(folder);
  }

  /** Makes a new name survive a power cut; not every system can open a folder for that. */
  private static void sync(Path folder) {
    try (FileChannel channel = FileChannel.open(folder, StandardOpenOption.READ)) {
      channel.force(true);
    } catch (IOException e) {
      log.debug("folder not synced: {}", folder, e);
    }
  }

  private Path pathOf(StoredBytes bytes) {
    return captures.resolve(bytes.sha256().substring(0, 2)).resolve(bytes.sha256());
  }

  private static MessageDigest sha256() {
    try {
      return MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException(e);
    }
  }
}
