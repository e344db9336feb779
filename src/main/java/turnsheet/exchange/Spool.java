package turnsheet.exchange;

import java.io.BufferedWriter;
import java.io.IOException;
import java.io.OutputStream;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.channels.Channels;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileStore;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.concurrent.Semaphore;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.stereotype.Component;
import turnsheet.capture.IncomingFolder;
import turnsheet.web.RefusedRequestException;

/**
 * Writes exports to the disk before they are sent: the database is done with when the first byte
 * leaves, however slowly somebody reads. What a killed process left is removed by the folder at the
 * next start.
 *
 * <p>At most {@value #AT_A_TIME} are written at a time, the others wait for their turn: each holds
 * a connection to the database meanwhile, and pages need some too.
 */
@Component
public final class Spool {

  static final int AT_A_TIME = 2;

  /** Left to the database and to recordings that arrive meanwhile. */
  private static final long RESERVE_BYTES = 100_000_000;

  /** How much is written between two looks at the room that is left. */
  private static final long STRIDE_BYTES = 1 << 20;

  private static final Logger log = LoggerFactory.getLogger(Spool.class);

  private final IncomingFolder folder;
  private final long reserveBytes;
  private final Semaphore turns = new Semaphore(AT_A_TIME, true);

  @Autowired
  public Spool(IncomingFolder folder) {
    this(folder, RESERVE_BYTES);
  }

  Spool(IncomingFolder folder, long reserveBytes) {
    this.folder = folder;
    this.reserveBytes = reserveBytes;
  }

  /** What is to be sent. */
  public interface Writing {
    void to(Writer out) throws IOException;
  }

  /** Where it goes once it is whole; its length is known then. */
  public interface Sending {
    OutputStream open(long lengthBytes) throws IOException;
  }

  /**
   * Writes, then sends. Nothing stays on the disk, whatever happens.
   *
   * @throws RefusedRequestException {@code noRoom} if the disk does not take it; nothing was sent
   * @throws IOException if whoever asked has gone
   */
  public void send(Writing writing, Sending sending) throws IOException {
    Path file = folder.newPart();
    try (FileChannel channel =
        open(
            file,
            StandardOpenOption.CREATE_NEW,
            StandardOpenOption.WRITE,
            StandardOpenOption.READ)) {
      write(writing, file, channel);
      try (OutputStream out = sending.open(channel.size())) {
        Channels.newInputStream(channel.position(0)).transferTo(out);
      }
    } finally {
      remove(file);
    }
  }

  private void write(Writing writing, Path file, FileChannel channel) {
    turns.acquireUninterruptibly();
    try {
      // tells the cleaning of another start that this is no leftover; ends with the channel
      channel.lock();
      Writer out =
          new BufferedWriter(
              new OutputStreamWriter(
                  new Bounded(Channels.newOutputStream(channel), Files.getFileStore(file)),
                  StandardCharsets.UTF_8));
      writing.to(out);
      out.flush();
    } catch (IOException e) {
      throw noRoom(e);
    } finally {
      turns.release();
    }
  }

  private static FileChannel open(Path file, StandardOpenOption... options) {
    try {
      return FileChannel.open(file, options);
    } catch (IOException e) {
      throw noRoom(e);
    }
  }

  private static void remove(Path file) {
    try {
      Files.deleteIfExists(file);
    } catch (IOException e) {
      log.warn("left behind until the next start: {}", file, e);
    }
  }

  private static RefusedRequestException noRoom(IOException cause) {
    log.error("cannot write an export", cause);
    return new RefusedRequestException(
        "noRoom",
        "The disk of the service has no room for this export, and nothing of it was sent: make"
            + " room in the data folder, or export single units.");
  }

  /** Stops before the disk is full: a database that cannot write any more is worse. */
  private final class Bounded extends OutputStream {
    private final OutputStream out;
    private final FileStore disk;
    private long toNextLook;

    Bounded(OutputStream out, FileStore disk) {
      this.out = out;
      this.disk = disk;
    }

    @Override
    public void write(int b) throws IOException {
      write(new byte[] {(byte) b}, 0, 1);
    }

    @Override
    public void write(byte[] bytes, int from, int length) throws IOException {
      if (toNextLook <= 0) {
        long usable = disk.getUsableSpace();
        if (usable - reserveBytes < STRIDE_BYTES) {
          throw new IOException(usable + " bytes left on the disk");
        }
        toNextLook = STRIDE_BYTES;
      }
      toNextLook -= length;
      out.write(bytes, from, length);
    }
  }
}
