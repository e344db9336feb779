package turnsheet.core.format.audio;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Files of several gigabytes that exist only as a rule for their bytes. */
@Timeout(20)
class LongFileTest {

  private static final long SIX_GIB = 6L << 30;

  @Test
  void readsAnRf64FileBeyond4GiB() throws Exception {
    byte[] head =
        WavBytes.of("RF64")
            .longSizes(SIX_GIB + 72, SIX_GIB, SIX_GIB / 4)
            .format(1, 2, 96000, 4, 16)
            .chunk("data", -1, new byte[0])
            .file(-1);
    ByteSource source = new RuledSource(head, SIX_GIB, true);
    Recognised recognised = accepted(source);
    assertThat(recognised.frames()).isEqualTo(SIX_GIB / 4);
    assertThat(recognised.warnings()).isEmpty();
    try (SampleReader reader =
        CaptureFormats.standard().openSamples(source, ReadOptions.none().withChannel(2))) {
      double[] block = new double[300_000];
      for (int i = 0; i < 3; i++) {
        assertThat(reader.read(block)).isEqualTo(block.length);
        // byte k of the data is k mod 251, so sample j of channel 2 lies in bytes 4j+2 and 4j+3
        for (int j = 0; j < block.length; j += 9973) {
          long at = 4 * ((long) i * block.length + j) + 2;
          short expected = (short) (((at + 1) % 251 << 8) | at % 251);
          assertThat(block[j]).isEqualTo(expected / 32768.0);
        }
      }
    }
  }

  @Test
  void readsAPlainFileBeyond4GiBWhoseSizesWrapped() throws Exception {
    byte[] head =
        WavBytes.of("RIFF")
            .format(1, 1, 96000, 2, 16)
            .chunk("data", (int) SIX_GIB, new byte[0])
            .file((int) SIX_GIB + 36);
    Recognised recognised = accepted(new RuledSource(head, SIX_GIB, true));
    assertThat(recognised.frames()).isEqualTo(SIX_GIB / 2);
    assertThat(recognised.warnings()).extracting(Warning::code).containsExactly("wrongSize");
  }

  @Test
  void gigabytesOfZerosBehindAHeaderAreReadInBlocks() throws Exception {
    byte[] head =
        WavBytes.of("RIFF").format(1, 1, 96000, 3, 24).chunk("data", -1, new byte[0]).file(-1);
    ByteSource source = new RuledSource(head, SIX_GIB, false);
    assertThat(accepted(source).frames()).isEqualTo(SIX_GIB / 3);
    try (SampleReader reader = CaptureFormats.standard().openSamples(source, ReadOptions.none())) {
      double[] block = new double[1 << 16];
      Arrays.fill(block, 1);
      assertThat(reader.read(block)).isEqualTo(block.length);
      assertThat(block).containsOnly(0);
    }
  }

  @Test
  void gigabytesOfZerosAsFlacOrAiffOrChunksAreRefused() throws Exception {
    byte[] flac = FlacFormatTest.header(44100, 1, 16, 0);
    byte[] aiff = "FORM\0\0\0\0AIFF".getBytes(StandardCharsets.ISO_8859_1);
    byte[] wav = "RIFF\0\0\0\0WAVE".getBytes(StandardCharsets.ISO_8859_1);
    assertThat(refusal(flac)).isEqualTo("damagedFlac");
    assertThat(refusal(aiff)).isEqualTo("noFormatChunk");
    assertThat(refusal(wav)).isEqualTo("tooManyChunks");
  }

  private static String refusal(byte[] head) throws IOException {
    return Reading.refused(new RuledSource(head, SIX_GIB, false), ReadOptions.none()).code();
  }

  private static Recognised accepted(ByteSource source) throws IOException {
    Recognition recognition = CaptureFormats.standard().recognise(source, ReadOptions.none());
    assertThat(recognition).isInstanceOf(Recognition.Accepted.class);
    return ((Recognition.Accepted) recognition).recognised();
  }

  /** A head and behind it bytes that follow a rule: all zero, or index modulo 251. */
  private static final class RuledSource implements ByteSource {
    private final byte[] head;
    private final long tail;
    private final boolean counting;

    RuledSource(byte[] head, long tail, boolean counting) {
      this.head = head.clone();
      this.tail = tail;
      this.counting = counting;
    }

    @Override
    public InputStream open() {
      return new RuledStream(head, head.length + tail, counting);
    }

    @Override
    public long length() {
      return head.length + tail;
    }
  }

  private static final class RuledStream extends InputStream {
    private final byte[] head;
    private final long length;
    private final boolean counting;
    private long position;

    RuledStream(byte[] head, long length, boolean counting) {
      this.head = head;
      this.length = length;
      this.counting = counting;
    }

    @Override
    public int read() {
      return position == length ? -1 : value(position++);
    }

    @Override
    public int read(byte[] into, int from, int count) {
      if (position == length) {
        return count == 0 ? 0 : -1;
      }
      int given = (int) Math.min(count, length - position);
      for (int i = 0; i < given; i++) {
        into[from + i] = (byte) value(position + i);
      }
      position += given;
      return given;
    }

    @Override
    public long skip(long count) {
      long given = Math.max(0, Math.min(count, length - position));
      position += given;
      return given;
    }

    private int value(long at) {
      if (at < head.length) {
        return head[(int) at] & 0xff;
      }
      return counting ? (int) ((at - head.length) % 251) : 0;
    }
  }
}
