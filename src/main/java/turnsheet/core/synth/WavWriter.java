package turnsheet.core.synth;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;

/** Writes samples as a plain RIFF/WAVE file of integer PCM. */
public final class WavWriter {

  private WavWriter() {}

  /**
   * Writes a whole file; the stream stays open.
   *
   * @param bits 16 or 24
   * @param channels one array per channel, equal lengths, full scale 1; beyond it is clipped
   */
  public static void write(OutputStream out, int sampleRateHertz, int bits, double[]... channels)
      throws IOException {
    if (bits != 16 && bits != 24) {
      throw new IllegalArgumentException(bits + " bits");
    }
    int bytes = bits / 8;
    int frames = channels[0].length;
    int dataBytes = Math.multiplyExact(frames, bytes * channels.length);
    ByteBuffer head = ByteBuffer.allocate(44).order(ByteOrder.LITTLE_ENDIAN);
    head.put(ascii("RIFF")).putInt(36 + dataBytes + (dataBytes & 1)).put(ascii("WAVE"));
    head.put(ascii("fmt ")).putInt(16).putShort((short) 1).putShort((short) channels.length);
    head.putInt(sampleRateHertz).putInt(sampleRateHertz * bytes * channels.length);
    head.putShort((short) (bytes * channels.length)).putShort((short) bits);
    head.put(ascii("data")).putInt(dataBytes);
    out.write(head.array());
    long scale = 1L << (bits - 1);
    byte[] frame = new byte[bytes * channels.length];
    for (int i = 0; i < frames; i++) {
      int at = 0;
      for (double[] channel : channels) {
        long v = Math.max(-scale, Math.min(scale - 1, Math.round(channel[i] * scale)));
        for (int b = 0; b < bytes; b++) {
          frame[at++] = (byte) (v >> (8 * b));
        }
      }
      out.write(frame);
    }
    if ((dataBytes & 1) == 1) {
      out.write(0);
    }
  }

  private static byte[] ascii(String text) {
    return text.getBytes(StandardCharsets.US_ASCII);
  }
}
