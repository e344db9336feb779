package turnsheet.core.format.audio;

import java.io.ByteArrayOutputStream;

/**
 * Writes FLAC frames bit by bit, with check sums by long division instead of tables.
 *
 * <p>Source: RFC 9639, sections 8 and 9.
 */
final class FlacBytes {

  private final ByteArrayOutputStream out = new ByteArrayOutputStream();
  private int pending;
  private int pendingBits;

  FlacBytes bits(long value, int count) {
    for (int i = count - 1; i >= 0; i--) {
      pending = pending << 1 | (int) (value >>> i & 1);
      if (++pendingBits == 8) {
        out.write(pending);
        pending = 0;
        pendingBits = 0;
      }
    }
    return this;
  }

  FlacBytes rice(long value, int parameter) {
    long folded = value >= 0 ? 2 * value : -2 * value - 1;
    for (long q = folded >> parameter; q > 0; q--) {
      bits(0, 1);
    }
    return bits(1, 1).bits(folded, parameter);
  }

  /** Head of a frame with fixed block size, rate and depth left to the stream's header. */
  static FlacBytes frame(int number, int blockSize, int channelCode) {
    return frame(number, blockSize, channelCode, 0, 0);
  }

  static FlacBytes frame(int number, int blockSize, int channelCode, int rateCode, int depthCode) {
    FlacBytes frame = new FlacBytes().bits(0xfff8, 16).bits(7, 4).bits(rateCode, 4);
    frame.bits(channelCode, 4).bits(depthCode, 3).bits(0, 1).bits(number, 8);
    frame.bits(blockSize - 1, 16);
    return frame.bits(remainder(frame.out.toByteArray(), 8, 0x107), 8);
  }

  FlacBytes verbatim(int depth, long... samples) {
    bits(1 << 1, 8);
    for (long sample : samples) {
      bits(sample, depth);
    }
    return this;
  }

  byte[] written() {
    return out.toByteArray();
  }

  byte[] frameEnd() {
    while (pendingBits > 0) {
      bits(0, 1);
    }
    return bits(remainder(out.toByteArray(), 16, 0x18005), 16).out.toByteArray();
  }

  /** Remainder of the message, {@code width} zeros appended, divided by the polynomial. */
  private static int remainder(byte[] message, int width, int polynomial) {
    int rest = 0;
    for (int i = 0; i < 8 * message.length + width; i++) {
      int bit = i < 8 * message.length ? message[i / 8] >> (7 - i % 8) & 1 : 0;
      rest = rest << 1 | bit;
      if ((rest >> width & 1) == 1) {
        rest ^= polynomial;
      }
    }
    return rest;
  }
}
