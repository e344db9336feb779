package turnsheet.core.format.audio;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;

/** Builds WAV files chunk by chunk. */
final class WavBytes {

  private final ByteArrayOutputStream chunks = new ByteArrayOutputStream();
  private final String container;
  private final ByteOrder order;

  private WavBytes(String container) {
    this.container = container;
    order = container.equals("RIFX") ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN;
  }

  static WavBytes of(String container) {
    return new WavBytes(container);
  }

  /** A whole file: plain header, one data chunk. */
  static byte[] plain(int code, int channels, int rate, int frameBytes, int bits, byte[] data) {
    return of("RIFF").format(code, channels, rate, frameBytes, bits).chunk("data", data).file();
  }

  WavBytes format(int code, int channels, int rate, int frameBytes, int bits) {
    return chunk("fmt ", formatFields(16, code, channels, rate, frameBytes, bits));
  }

  WavBytes extensible(int subCode, int channels, int rate, int frameBytes, int bits, int valid) {
    byte[] content = formatFields(40, 0xfffe, channels, rate, frameBytes, bits);
    ByteBuffer fields = ByteBuffer.wrap(content).order(order);
    fields.putShort(16, (short) 22).putShort(18, (short) valid).putInt(20, 0);
    // KSDATAFORMAT_SUBTYPE: xxxxxxxx-0000-0010-8000-00aa00389b71
    fields.putInt(24, subCode).putShort(28, (short) 0).putShort(30, (short) 0x10);
    fields.position(32);
    fields.put(new byte[] {(byte) 0x80, 0, 0, (byte) 0xaa, 0, 0x38, (byte) 0x9b, 0x71});
    return chunk("fmt ", content);
  }

  private byte[] formatFields(
      int size, int code, int channels, int rate, int frameBytes, int bits) {
    byte[] content = new byte[size];
    ByteBuffer fields = ByteBuffer.wrap(content).order(order);
    fields.putShort((short) code).putShort((short) channels).putInt(rate);
    fields.putInt(rate * frameBytes).putShort((short) frameBytes).putShort((short) bits);
    return content;
  }

  WavBytes longSizes(long riff, long data, long frames) {
    ByteBuffer sizes = ByteBuffer.allocate(28).order(order);
    sizes.putLong(riff).putLong(data).putLong(frames);
    return chunk("ds64", sizes.array());
  }

  WavBytes chunk(String name, byte[] content) {
    return chunk(name, content.length, content);
  }

  /** A chunk whose size field says something of its own. */
  WavBytes chunk(String name, int sizeField, byte[] content) {
    ByteBuffer head = ByteBuffer.allocate(8).order(order);
    head.put(name.getBytes(StandardCharsets.US_ASCII)).putInt(sizeField);
    chunks.writeBytes(head.array());
    chunks.writeBytes(content);
    if (content.length % 2 == 1) {
      chunks.write(0);
    }
    return this;
  }

  byte[] file() {
    return file(4 + chunks.size());
  }

  byte[] file(int sizeField) {
    ByteBuffer file = ByteBuffer.allocate(12 + chunks.size()).order(order);
    file.put(container.getBytes(StandardCharsets.US_ASCII)).putInt(sizeField);
    file.put("WAVE".getBytes(StandardCharsets.US_ASCII)).put(chunks.toByteArray());
    return file.array();
  }
}
