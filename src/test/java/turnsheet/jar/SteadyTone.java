package turnsheet.jar;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;

/** A very long recording of an exact 3150 Hz tone, 16 bit at 48 kHz, written at disk speed. */
final class SteadyTone {

  private static final int RATE_HERTZ = 48_000;

  /** 320 samples at 48 kHz hold 21 turns of 3150 Hz, so the block repeats without a seam. */
  private static final int BLOCK_SAMPLES = 320 * 256;

  private SteadyTone() {}

  static void write(Path file, long samples) throws IOException {
    ByteBuffer block = ByteBuffer.allocate(2 * BLOCK_SAMPLES).order(ByteOrder.LITTLE_ENDIAN);
    for (int i = 0; i < BLOCK_SAMPLES; i++) {
      block.putShort((short) Math.round(16000 * Math.sin(2 * Math.PI * 3150 * i / RATE_HERTZ)));
    }
    long dataBytes = 2 * samples;
    ByteBuffer head = ByteBuffer.allocate(44).order(ByteOrder.LITTLE_ENDIAN);
    head.put(ascii("RIFF")).putInt((int) (36 + dataBytes)).put(ascii("WAVEfmt "));
    head.putInt(16).putShort((short) 1).putShort((short) 1).putInt(RATE_HERTZ);
    head.putInt(2 * RATE_HERTZ).putShort((short) 2).putShort((short) 16);
    head.put(ascii("data")).putInt((int) dataBytes);
    try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(file), 1 << 20)) {
      out.write(head.array());
      for (long left = dataBytes; left > 0; left -= block.capacity()) {
        out.write(block.array(), 0, (int) Math.min(left, block.capacity()));
      }
    }
  }

  private static byte[] ascii(String text) {
    return text.getBytes(StandardCharsets.US_ASCII);
  }
}
