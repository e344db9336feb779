package turnsheet.core.synth;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;

/** Writes samples of one channel as a plain AIFF file of 24-bit PCM. */
public final class AiffWriter {

  private static final int BYTES = 3;
  private static final int EXPONENT_BIAS = 16383;

  private AiffWriter() {}

  /**
   * Writes a whole file; the stream stays open.
   *
   * @param samples full scale 1; beyond it is clipped
   */
  public static void write(OutputStream out, int sampleRateHertz, double[] samples)
      throws IOException {
    int dataBytes = Math.multiplyExact(samples.length, BYTES);
    int padding = dataBytes & 1;
    ByteBuffer head = ByteBuffer.allocate(54);
    head.put(ascii("FORM")).putInt(46 + dataBytes + padding).put(ascii("AIFF"));
    head.put(ascii("COMM")).putInt(18).putShort((short) 1).putInt(samples.length);
    head.putShort((short) (8 * BYTES));
    putExtended(head, sampleRateHertz);
    head.put(ascii("SSND")).putInt(8 + dataBytes).putInt(0).putInt(0);
    out.write(head.array());
    byte[] data = new byte[dataBytes + padding];
    int scale = 1 << (8 * BYTES - 1);
    for (int i = 0; i < samples.length; i++) {
      long v = Math.max(-scale, Math.min(scale - 1, Math.round(samples[i] * scale)));
      for (int b = 0; b < BYTES; b++) {
        data[BYTES * i + b] = (byte) (v >> (8 * (BYTES - 1 - b)));
      }
    }
    out.write(data);
  }

  /**
   * The 80-bit extended format of the COMM chunk: biased exponent, then an explicit leading one.
   */
  private static void putExtended(ByteBuffer into, int positive) {
    int exponent = 31 - Integer.numberOfLeadingZeros(positive);
    into.putShort((short) (EXPONENT_BIAS + exponent));
    into.putLong((long) positive << (63 - exponent));
  }

  private static byte[] ascii(String text) {
    return text.getBytes(StandardCharsets.US_ASCII);
  }
}
