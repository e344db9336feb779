package turnsheet.capture;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.UUID;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;

/**
 * Where files grow until they are whole: uploads, and exports before they are sent. What a killed
 * process left in it is removed at the next start.
 */
@Component
public class IncomingFolder {

  static final String PART = ".part";

  private static final Logger log = LoggerFactory.getLogger(IncomingFolder.class);

  /** Form uploads lie here under names of the server's own, without a lock that tells their age. */
  private static final Duration OLD = Duration.ofHours(6);

  private final Path path;

  public IncomingFolder(@Value("${turnsheet.data-dir}") Path dataDir, Clock clock)
      throws IOException {
    this.path = dataDir.toAbsolutePath().normalize().resolve("incoming");
    Files.createDirectories(path);
    clean(clock.instant().minus(OLD));
  }

  public Path path() {
    return path;
  }

  /** A name that nobody else has, for whoever holds a lock on the file while it is needed. */
  public Path newPart() {
    return path.resolve(UUID.randomUUID() + PART);
  }

  private void clean(Instant oldBefore) throws IOException {
    try (DirectoryStream<Path> files = Files.newDirectoryStream(path)) {
      for (Path file : files) {
        boolean leftover =
            file.toString().endsWith(PART)
                ? nobodyWrites(file)
                : Files.getLastModifiedTime(file).toInstant().isBefore(oldBefore);
        if (leftover && Files.isRegularFile(file)) {
          Files.deleteIfExists(file);
          log.info("removed what an interrupted upload or export left: {}", file.getFileName());
        }
      }
    }
  }

  private static boolean nobodyWrites(Path file) throws IOException {
    try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE);
        FileLock lock = channel.tryLock()) {
      return lock != null;
    } catch (OverlappingFileLockException e) {
      return false;
    }
  }
}
