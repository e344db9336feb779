package turnsheet.capture;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.SequenceInputStream;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.FileTime;
import java.time.Clock;
import java.time.Duration;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CaptureStoreTest {

  /** FIPS 180-2, appendix B.1: the digest of the three characters abc. */
  private static final String DIGEST_OF_ABC =
      "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";

  @TempDir Path data;
  private CaptureStore store;

  @BeforeEach
  void start() throws IOException {
    store = new CaptureStore(data, new IncomingFolder(data, Clock.systemUTC()));
  }

  @Test
  void keepsBytesUnderTheirDigest() throws IOException {
    StoredBytes stored = store.receive(bytes("abc"));
    assertThat(stored).isEqualTo(new StoredBytes(DIGEST_OF_ABC, 3));
    assertThat(files()).containsExactly(data.resolve("captures/ba").resolve(DIGEST_OF_ABC));
    for (int i = 0; i < 2; i++) {
      try (InputStream in = store.open(stored).open()) {
        assertThat(in.readAllBytes()).isEqualTo("abc".getBytes(StandardCharsets.US_ASCII));
      }
    }
    assertThat(store.open(stored).length()).isEqualTo(3);
  }

  @Test
  void keepsTheSameBytesOnce() throws IOException {
    StoredBytes first = store.receive(bytes("abc"));
    FileTime written = Files.getLastModifiedTime(files().get(0));
    assertThat(store.receive(bytes("abc"))).isEqualTo(first);
    assertThat(files()).hasSize(1);
    assertThat(Files.getLastModifiedTime(files().get(0))).isEqualTo(written);
  }

  @Test
  void mendsAnObjectOfAnotherLength() throws IOException {
    StoredBytes first = store.receive(bytes("abc"));
    Files.write(files().get(0), new byte[1]);
    store.receive(bytes("abc"));
    try (InputStream in = store.open(first).open()) {
      assertThat(in.readAllBytes()).hasSize(3);
    }
  }

  @Test
  void leavesNothingOfABrokenUpload() {
    InputStream breaking = new SequenceInputStream(new Endless(100_000), new BrokenStream());
    assertThatThrownBy(() -> store.receive(breaking)).isInstanceOf(BrokenUploadException.class);
    assertThat(files()).isEmpty();
  }

  @Test
  void tellsADiskThatDoesNotTakeTheBytesFromABrokenUpload() throws IOException {
    Files.delete(data.resolve("incoming"));
    assertThatThrownBy(() -> store.receive(bytes("abc"))).isInstanceOf(StoreException.class);
    assertThat(files()).isEmpty();
  }

  @Test
  void removesWhatAKilledProcessLeft() throws IOException {
    Path incoming = data.resolve("incoming");
    Path part = Files.write(incoming.resolve("a.part"), new byte[10]);
    Path oldForm = Files.write(incoming.resolve("upload_1.tmp"), new byte[10]);
    Path newForm = Files.write(incoming.resolve("upload_2.tmp"), new byte[10]);
    Path busy = incoming.resolve("b.part");
    Files.setLastModifiedTime(
        oldForm, FileTime.from(Clock.systemUTC().instant().minus(Duration.ofDays(1))));
    try (FileChannel writing =
        FileChannel.open(busy, StandardOpenOption.CREATE, StandardOpenOption.WRITE)) {
      writing.lock();
      new IncomingFolder(data, Clock.systemUTC());
      assertThat(part).doesNotExist();
      assertThat(oldForm).doesNotExist();
      assertThat(newForm).exists();
      assertThat(busy).exists();
    }
  }

  @Test
  void takesALongStreamInSmallPieces() throws IOException {
    long length = 64L << 20;
    Endless stream = new Endless(length);
    assertThat(store.receive(stream).length()).isEqualTo(length);
    // the one buffer of the store: nobody asked for more at once
    assertThat(stream.largestRead).isLessThanOrEqualTo(64 * 1024);
  }

  private static InputStream bytes(String text) {
    return new ByteArrayInputStream(text.getBytes(StandardCharsets.US_ASCII));
  }

  private List<Path> files() {
    try (Stream<Path> all = Files.walk(data)) {
      return all.filter(Files::isRegularFile).toList();
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  private static final class Endless extends InputStream {
    private long left;
    private int largestRead;

    Endless(long length) {
      left = length;
    }

    @Override
    public int read() {
      return left-- > 0 ? 1 : -1;
    }

    @Override
    public int read(byte[] into, int from, int count) {
      largestRead = Math.max(largestRead, count);
      if (left == 0) {
        return -1;
      }
      int n = (int) Math.min(left, count);
      left -= n;
      return n;
    }
  }
}
