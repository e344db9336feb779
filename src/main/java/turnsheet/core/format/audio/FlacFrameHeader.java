package turnsheet.core.format.audio;

import java.io.IOException;

/**
 * Head of one FLAC frame.
 *
 * <p>Source: RFC 9639, section 9.1.
 *
 * @param variableBlocks whether {@code number} counts samples (else frames)
 * @param pairing 0 for independent channels, else one of the three constants
 * @param bits 0 where only the stream header tells
 * @param sampleRateHertz 0 where only the stream header tells
 */
record FlacFrameHeader(
    boolean variableBlocks,
    long number,
    int blockSize,
    int sampleRateHertz,
    int channels,
    int pairing,
    int bits) {

  static final int LEFT_SIDE = 8;
  static final int SIDE_RIGHT = 9;
  static final int MID_SIDE = 10;

  private static final int[] RATES = {
    0, 88200, 176400, 192000, 8000, 16000, 22050, 24000, 32000, 44100, 48000, 96000
  };
  private static final int[] DEPTHS = {0, 8, 12, -1, 16, 20, 24, 32};

  static FlacFrameHeader read(FlacBits bits) throws IOException, FlacDamage {
    return new Parser(bits).read();
  }

  private static final class Parser {

    private final FlacBits bits;
    private int crc;

    Parser(FlacBits bits) {
      this.bits = bits;
    }

    FlacFrameHeader read() throws IOException, FlacDamage {
      int sync = next() << 8 | next();
      if ((sync & 0xfffe) != 0xfff8) {
        throw new FlacDamage("a frame does not begin with its mark");
      }
      int sizeAndRate = next();
      int channelsAndDepth = next();
      int assignment = channelsAndDepth >>> 4;
      int depth = DEPTHS[channelsAndDepth >>> 1 & 7];
      if (assignment > MID_SIDE || depth < 0 || (channelsAndDepth & 1) != 0) {
        throw new FlacDamage("a frame header uses reserved values");
      }
      long number = codedNumber();
      int blockSize = blockSize(sizeAndRate >>> 4);
      int rate = rate(sizeAndRate & 15);
      int expected = crc;
      if (next() != expected) {
        throw new FlacDamage("the check sum of a frame header does not match");
      }
      boolean paired = assignment >= LEFT_SIDE;
      return new FlacFrameHeader(
          (sync & 1) == 1,
          number,
          blockSize,
          rate,
          paired ? 2 : assignment + 1,
          paired ? assignment : 0,
          depth);
    }

    private int next() throws IOException {
      int value = (int) bits.unsigned(8);
      crc = FlacCrc.crc8(crc, value);
      return value;
    }

    private long codedNumber() throws IOException, FlacDamage {
      int first = next();
      int ones = Integer.numberOfLeadingZeros(~(first << 24));
      if (ones == 0) {
        return first;
      }
      if (ones == 1 || ones == 8) {
        throw new FlacDamage("a frame number is not coded as it must be");
      }
      long value = first & (0x7f >>> ones);
      for (int i = 1; i < ones; i++) {
        int more = next();
        if (more >>> 6 != 2) {
          throw new FlacDamage("a frame number is not coded as it must be");
        }
        value = value << 6 | (more & 0x3f);
      }
      return value;
    }

    private int blockSize(int code) throws IOException, FlacDamage {
      if (code == 0) {
        throw new FlacDamage("a frame header uses reserved values");
      }
      if (code == 1) {
        return 192;
      }
      if (code <= 5) {
        return 144 << code;
      }
      if (code == 6) {
        return next() + 1;
      }
      return code == 7 ? (next() << 8 | next()) + 1 : 1 << code;
    }

    private int rate(int code) throws IOException, FlacDamage {
      return switch (code) {
        case 12 -> next() * 1000;
        case 13 -> next() << 8 | next();
        case 14 -> (next() << 8 | next()) * 10;
        case 15 -> throw new FlacDamage("a frame header uses reserved values");
        default -> RATES[code];
      };
    }
  }
}
