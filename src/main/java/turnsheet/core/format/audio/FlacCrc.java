package turnsheet.core.format.audio;

/**
 * Check sums of FLAC: polynomials x^8+x^2+x+1 and x^16+x^15+x^2+1. Source: RFC 9639, 9.1.8, 9.3.
 */
final class FlacCrc {

  private static final int[] TABLE_8 = table(8, 0x07);
  private static final int[] TABLE_16 = table(16, 0x8005);

  private FlacCrc() {}

  private static int[] table(int width, int polynomial) {
    int[] table = new int[256];
    for (int i = 0; i < 256; i++) {
      int value = i << (width - 8);
      for (int bit = 0; bit < 8; bit++) {
        boolean carry = (value >>> (width - 1) & 1) == 1;
        value = (value << 1 ^ (carry ? polynomial : 0)) & ((1 << width) - 1);
      }
      table[i] = value;
    }
    return table;
  }

  static int crc8(int crc, int nextByte) {
    return TABLE_8[crc ^ nextByte];
  }

  static int crc16(int crc, byte[] bytes, int from, int to) {
    int value = crc;
    for (int i = from; i < to; i++) {
      value = (value << 8 & 0xffff) ^ TABLE_16[value >>> 8 ^ (bytes[i] & 0xff)];
    }
    return value;
  }
}
