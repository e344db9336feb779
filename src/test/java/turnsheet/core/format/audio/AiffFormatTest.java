package turnsheet.core.format.audio;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

/**
 * Files built byte by byte.
 *
 * <p>Source: Apple, "Audio Interchange File Format" 1.3: big-endian, signed, left-justified in
 * whole bytes; rates as 80-bit floating point (44100 = 400E AC44 0000 0000 0000, its own example).
 */
class AiffFormatTest {

  private static final byte[] RATE_44100 = {0x40, 0x0e, (byte) 0xac, 0x44, 0, 0, 0, 0, 0, 0};

  @Test
  void readsIntegersOfEveryWidth() throws Exception {
    reads(file("AIFF", "", 1, 2, 8, bytes(0x80, 0x7f)), -1, 127 / 128.0);
    reads(file("AIFF", "", 1, 2, 16, bytes(0x80, 0, 0, 1)), -1, 1 / 32768.0);
    reads(file("AIFF", "", 1, 2, 12, bytes(0x80, 0, 0, 0x10)), -1, 1 / 2048.0);
    reads(file("AIFF", "", 1, 2, 24, bytes(0x80, 0, 0, 0, 0, 1)), -1, 0x1p-23);
    reads(file("AIFF", "", 1, 2, 32, bytes(0x80, 0, 0, 0, 0, 0, 0, 1)), -1, 0x1p-31);
  }

  @Test
  void readsTheUncompressedKindsOfAiffC() throws Exception {
    reads(file("AIFC", "NONE", 1, 1, 16, bytes(0, 1)), 1 / 32768.0);
    reads(file("AIFC", "twos", 1, 1, 16, bytes(0, 1)), 1 / 32768.0);
    reads(file("AIFC", "sowt", 1, 1, 16, bytes(1, 0)), 1 / 32768.0);
    reads(file("AIFC", "in24", 1, 1, 24, bytes(0, 0, 1)), 0x1p-23);
    reads(file("AIFC", "in32", 1, 1, 32, bytes(0, 0, 0, 1)), 0x1p-31);
    reads(file("AIFC", "raw ", 1, 1, 8, bytes(0)), -1);
    byte[] single = ByteBuffer.allocate(4).putFloat(-0.375f).array();
    reads(file("AIFC", "fl32", 1, 1, 32, single), -0.375);
    reads(file("AIFC", "FL32", 1, 1, 32, single), -0.375);
    byte[] wide = ByteBuffer.allocate(8).putDouble(Math.E).array();
    reads(file("AIFC", "fl64", 1, 1, 64, wide), Math.E);
    reads(file("AIFC", "FL64", 1, 1, 64, wide), Math.E);
    assertThat(Reading.accepted(file("AIFC", "sowt", 1, 1, 16, bytes(1, 0))).format())
        .isEqualTo("AIFF-C (sowt), 16-bit PCM");
  }

  @Test
  void readsTheRateAndTheChosenChannel() throws Exception {
    byte[] file = file("AIFF", "", 2, 1, 16, bytes(0, 1, 0, 2));
    assertThat(Reading.accepted(file).sampleRateHertz()).isEqualTo(44100);
    assertThat(Reading.accepted(file).format()).isEqualTo("AIFF, 16-bit PCM");
    assertThat(Reading.samples(file, 2, 9)).containsExactly(2 / 32768.0);
  }

  @Test
  void readsChunksInAnyOrderWithOffsetAndPadding() throws Exception {
    byte[] sound = join(bytes(0, 0, 0, 3, 0, 0, 0, 0), bytes(9, 9, 9), bytes(0, 1));
    byte[] common = common("", 1, 1, 16);
    byte[] file =
        form("AIFF", chunk("ANNO", new byte[5]), chunk("SSND", sound), chunk("COMM", common));
    reads(file, 1 / 32768.0);
    assertThat(Reading.accepted(file).warnings()).isEmpty();
  }

  @Test
  void saysWhereTheSizesDisagree() throws Exception {
    byte[] missing = file("AIFF", "", 1, 10, 16, new byte[5]);
    assertThat(Reading.warningsAfterReading(missing)).containsExactly("truncated", "partialFrame");
    assertThat(Reading.accepted(missing).frames()).isEqualTo(2);
    byte[] more = file("AIFF", "", 1, 2, 16, new byte[12]);
    assertThat(Reading.warningsAfterReading(more)).containsExactly("wrongSize");
    byte[] unknown = file("AIFF", "", 1, 0, 16, new byte[12]);
    assertThat(Reading.warningsAfterReading(unknown)).containsExactly("lengthUnknown");
    assertThat(Reading.accepted(unknown).frames()).isEqualTo(6);
  }

  @Test
  void refusesByName() throws Exception {
    refuses(file("AIFC", "ulaw", 1, 1, 8, bytes(0)), "compressedAudio", "mu-law");
    refuses(file("AIFC", "ima4", 1, 1, 16, bytes(0)), "compressedAudio", "IMA ADPCM");
    refuses(file("AIFC", "what", 1, 1, 16, bytes(0)), "unknownEncoding", "\"what\"");
    refuses(file("AIFF", "", 0, 1, 16, bytes(0, 0)), "noChannels", "0 channels");
    refuses(file("AIFF", "", 1, 1, 40, bytes(0, 0)), "unsupportedDepth", "40 bits");
    refuses(file("AIFF", "", 1, 9, 16, bytes(0)), "noSamples", "9 frames");
    refuses(form("AIFF", chunk("SSND", new byte[10])), "noFormatChunk", "COMM");
    refuses(form("AIFF", chunk("COMM", common("", 1, 1, 16))), "noDataChunk", "SSND");
    refuses(form("AIFF", chunk("COMM", new byte[3])), "damagedHeader", "3 bytes");
    byte[] noRate = common("", 1, 1, 16);
    Arrays.fill(noRate, 8, 18, (byte) 0);
    refuses(
        form("AIFF", chunk("COMM", noRate), chunk("SSND", new byte[10])),
        "noSampleRate",
        "0.0 samples per second");
    byte[] sound = join(bytes(0x7f, 0, 0, 0, 0, 0, 0, 0), bytes(0, 1));
    refuses(
        form("AIFF", chunk("COMM", common("", 1, 1, 16)), chunk("SSND", sound)),
        "damagedHeader",
        "behind the end");
  }

  private static void reads(byte[] file, double... expected) throws Exception {
    assertThat(Reading.samples(file, 1, 9)).containsExactly(expected);
  }

  private static void refuses(byte[] file, String code, String words) throws Exception {
    assertThat(Reading.refused(file).code()).isEqualTo(code);
    assertThat(Reading.refused(file).message()).contains(words).endsWith(".");
  }

  private static byte[] file(
      String kind, String compression, int channels, int frames, int bits, byte[] data) {
    return form(
        kind,
        chunk("COMM", common(compression, channels, frames, bits)),
        chunk("SSND", join(new byte[8], data)));
  }

  private static byte[] common(String compression, int channels, int frames, int bits) {
    ByteBuffer fields = ByteBuffer.allocate(8).putShort((short) channels).putInt(frames);
    fields.putShort((short) bits);
    return join(fields.array(), RATE_44100, compression.getBytes(StandardCharsets.US_ASCII));
  }

  private static byte[] form(String kind, byte[]... chunks) {
    byte[] content = join(chunks);
    return join(
        "FORM".getBytes(StandardCharsets.US_ASCII),
        ByteBuffer.allocate(4).putInt(4 + content.length).array(),
        kind.getBytes(StandardCharsets.US_ASCII),
        content);
  }

  private static byte[] chunk(String name, byte[] content) {
    return join(
        name.getBytes(StandardCharsets.US_ASCII),
        ByteBuffer.allocate(4).putInt(content.length).array(),
        content,
        new byte[content.length % 2]);
  }

  private static byte[] join(byte[]... parts) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    for (byte[] part : parts) {
      out.writeBytes(part);
    }
    return out.toByteArray();
  }

  private static byte[] bytes(int... values) {
    byte[] bytes = new byte[values.length];
    for (int i = 0; i < values.length; i++) {
      bytes[i] = (byte) values[i];
    }
    return bytes;
  }
}
