package turnsheet.core.format.audio;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Arrays;
import turnsheet.core.signal.RejectedException;

/**
 * What a WAVE format chunk says about the samples, checked against itself.
 *
 * <p>Source: Microsoft, "WAVEFORMATEX" and "WAVEFORMATEXTENSIBLE" structures: samples of 1 to 8
 * bits are unsigned, wider ones signed, both left-justified in whole bytes.
 *
 * @param validBits bits of a sample that carry signal
 * @param containerBytes bytes that a sample takes
 */
record WaveFormatChunk(
    boolean floating,
    boolean bigEndian,
    int channels,
    long sampleRateHertz,
    int frameBytes,
    int validBits,
    int containerBytes) {

  /** More of the chunk is of no use: WAVEFORMATEXTENSIBLE takes 40 bytes. */
  static final int USEFUL_BYTES = 40;

  /**
   * Tail of the sub-format GUIDs that wrap a plain encoding number, as a little-endian file has it.
   */
  private static final byte[] GUID_TAIL_LITTLE = {
    0, 0, 0, 0, 0x10, 0, (byte) 0x80, 0, 0, (byte) 0xaa, 0, 0x38, (byte) 0x9b, 0x71
  };

  private static final byte[] GUID_TAIL_BIG = {
    0, 0, 0, 0x10, (byte) 0x80, 0, 0, (byte) 0xaa, 0, 0x38, (byte) 0x9b, 0x71
  };

  /**
   * Reads the chunk.
   *
   * @param head first bytes of the content, at most {@link #USEFUL_BYTES}
   * @param size announced size of the whole chunk
   */
  static WaveFormatChunk parse(byte[] head, long size, boolean bigEndian) throws RejectedException {
    if (head.length < 16) {
      throw damaged("the format chunk has " + size + " bytes, at least 16 are needed");
    }
    ByteBuffer fields =
        ByteBuffer.wrap(head).order(bigEndian ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN);
    int code = fields.getShort(0) & 0xffff;
    int channels = fields.getShort(2) & 0xffff;
    long rate = fields.getInt(4) & 0xffffffffL;
    int frameBytes = fields.getShort(12) & 0xffff;
    int bits = fields.getShort(14) & 0xffff;
    int validBits = bits;
    if (code == WaveCode.EXTENSIBLE) {
      requireExtension(fields, size);
      validBits = fields.getShort(18) & 0xffff;
      code = subFormat(head, bigEndian);
      // zero is what some writers leave where the whole container is meant
      validBits = validBits == 0 ? bits : validBits;
    }
    if (code != WaveCode.PCM && code != WaveCode.FLOAT) {
      throw WaveCode.refusal(code);
    }
    if (channels == 0) {
      throw new RejectedException(
          "noChannels", "The WAV header announces 0 channels: export the recording again.");
    }
    if (rate == 0) {
      throw new RejectedException(
          "noSampleRate", "The WAV header announces 0 samples per second: export it again.");
    }
    boolean floating = code == WaveCode.FLOAT;
    int container = container(floating, channels, frameBytes, bits, validBits);
    return new WaveFormatChunk(
        floating, bigEndian, channels, rate, frameBytes, Math.min(bits, validBits), container);
  }

  private static void requireExtension(ByteBuffer fields, long size) throws RejectedException {
    if (fields.capacity() < USEFUL_BYTES) {
      throw damaged(
          "the extensible format chunk has " + size + " bytes, " + USEFUL_BYTES + " are needed");
    }
    int extension = fields.getShort(16) & 0xffff;
    if (extension < 22 || 18 + extension > size) {
      throw damaged(
          "the format chunk of "
              + size
              + " bytes announces an extension of "
              + extension
              + " bytes");
    }
  }

  private static int subFormat(byte[] head, boolean bigEndian) throws RejectedException {
    if (Arrays.equals(head, 26, 40, GUID_TAIL_LITTLE, 0, 14)) {
      return (head[25] & 0xff) << 8 | (head[24] & 0xff);
    }
    if (bigEndian
        && (head[24] | head[25]) == 0
        && Arrays.equals(head, 28, 40, GUID_TAIL_BIG, 0, 12)) {
      return (head[26] & 0xff) << 8 | (head[27] & 0xff);
    }
    throw new RejectedException(
        "unknownEncoding",
        "The WAV file's samples have a sub-format that cannot be read: export the recording as"
            + " WAV with PCM or floating-point samples.");
  }

  private static int container(
      boolean floating, int channels, int frameBytes, int bits, int validBits)
      throws RejectedException {
    int least = (bits + 7) / 8;
    boolean supported =
        floating ? bits == 32 || bits == 64 : bits >= 1 && bits <= 32 && validBits >= 1;
    if (!supported) {
      throw new RejectedException(
          "unsupportedDepth",
          "The WAV file has "
              + (floating ? "floating-point" : "integer")
              + " samples of "
              + bits
              + " bits, which cannot be read: export it with 16, 24 or 32 bits.");
    }
    if (validBits > bits) {
      throw damaged(validBits + " valid bits are announced for samples of " + bits + " bits");
    }
    // 24 bits in four bytes is what several recorders write without the extensible header
    boolean padded = !floating && bits > 16 && bits <= 24 && frameBytes == 4 * channels;
    if (frameBytes != least * channels && !padded) {
      throw new RejectedException(
          "blockAlign",
          "The WAV header contradicts itself: "
              + channels
              + (channels == 1 ? " channel of " : " channels of ")
              + bits
              + " bits cannot take "
              + frameBytes
              + " bytes a frame: export the recording again.");
    }
    return padded ? 4 : least;
  }

  private static RejectedException damaged(String what) {
    return new RejectedException(
        "damagedHeader", "The WAV header is damaged: " + what + ". Export the recording again.");
  }

  SampleCode code() {
    if (floating) {
      return SampleCode.floating(containerBytes, bigEndian);
    }
    return containerBytes == 1 ? SampleCode.U8 : SampleCode.signed(containerBytes, bigEndian);
  }

  /** Whether a whole byte of each sample is unused, so that its place must be looked at. */
  boolean mayBeLowAligned() {
    return !floating && containerBytes == 4 && validBits == 24;
  }

  String depthName() {
    return validBits + (floating ? "-bit float" : "-bit PCM");
  }
}
