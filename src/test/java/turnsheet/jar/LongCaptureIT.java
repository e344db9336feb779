package turnsheet.jar;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.BufferedOutputStream;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class LongCaptureIT {

  private static final int RATE_HERTZ = 48_000;
  private static final long DATA_BYTES = (2L << 30) - 4096;

  /** 320 samples at 48 kHz hold 21 turns of 3150 Hz, so the block repeats without a seam. */
  private static final int BLOCK_SAMPLES = 320 * 256;

  @Test
  void twoGibibytesAreMeasuredInAQuarterOfAGibibyteOfHeap(@TempDir Path folder) throws Exception {
    Path file = folder.resolve("six-hours.wav");
    write(file);

    BuiltJar.Ended ended =
        BuiltJar.run(
            200, List.of("-Xmx256m"), "measure", file.toString(), "--tone-hz", "3150", "--json");

    assertThat(ended.err()).isEmpty();
    assertThat(ended.status()).isZero();
    var deviation =
        Pattern.compile("\"deviationPercent\"\\s*:\\s*\\{\\s*\"value\"\\s*:\\s*([-0-9.eE]+)")
            .matcher(ended.out());
    assertThat(deviation.find()).isTrue();
    // the tone is exact; what is left is the rounding of single-precision traces
    assertThat(Double.parseDouble(deviation.group(1))).isCloseTo(0, within(1e-5));
  }

  private static void write(Path file) throws Exception {
    ByteBuffer block = ByteBuffer.allocate(2 * BLOCK_SAMPLES).order(ByteOrder.LITTLE_ENDIAN);
    for (int i = 0; i < BLOCK_SAMPLES; i++) {
      block.putShort((short) Math.round(16000 * Math.sin(2 * Math.PI * 3150 * i / RATE_HERTZ)));
    }
    ByteBuffer head = ByteBuffer.allocate(44).order(ByteOrder.LITTLE_ENDIAN);
    head.put(ascii("RIFF")).putInt((int) (36 + DATA_BYTES)).put(ascii("WAVEfmt "));
    head.putInt(16).putShort((short) 1).putShort((short) 1).putInt(RATE_HERTZ);
    head.putInt(2 * RATE_HERTZ).putShort((short) 2).putShort((short) 16);
    head.put(ascii("data")).putInt((int) DATA_BYTES);
    try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(file), 1 << 20)) {
      out.write(head.array());
      long left = DATA_BYTES;
      while (left > 0) {
        int part = (int) Math.min(left, block.capacity());
        out.write(block.array(), 0, part);
        left -= part;
      }
    }
  }

  private static byte[] ascii(String text) {
    return text.getBytes(StandardCharsets.US_ASCII);
  }
}
