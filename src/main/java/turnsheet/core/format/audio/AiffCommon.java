package turnsheet.core.format.audio;

import java.nio.ByteBuffer;
import java.util.Map;
import turnsheet.core.signal.RejectedException;

/**
 * What the COMM chunk of an AIFF file says about the samples.
 *
 * @param frames announced samples per channel
 */
record AiffCommon(
    String formatName, int channels, long frames, double sampleRateHertz, SampleCode code) {

  /** Fields up to the four characters that name the compression. */
  static final int USEFUL_BYTES = 22;

  private static final int PLAIN_BYTES = 18;

  private static final Map<String, String> COMPRESSED =
      Map.ofEntries(
          Map.entry("alaw", "A-law"),
          Map.entry("ALAW", "A-law"),
          Map.entry("ulaw", "mu-law"),
          Map.entry("ULAW", "mu-law"),
          Map.entry("ima4", "IMA ADPCM"),
          Map.entry("GSM ", "GSM 6.10"),
          Map.entry("MAC3", "MACE 3 to 1"),
          Map.entry("MAC6", "MACE 6 to 1"),
          Map.entry("ACE2", "ACE 2 to 1"),
          Map.entry("ACE8", "ACE 8 to 3"),
          Map.entry("DWVW", "delta with variable word width"),
          Map.entry("G722", "G.722 ADPCM"),
          Map.entry("G726", "G.726 ADPCM"),
          Map.entry("G728", "G.728"),
          Map.entry("QDMC", "QDesign Music"),
          Map.entry("QDM2", "QDesign Music 2"),
          Map.entry("Qclp", "Qualcomm PureVoice"),
          Map.entry(".mp3", "MPEG layer 3 (MP3)"),
          Map.entry("mp4a", "AAC"));

  int frameBytes() {
    return channels * code.bytes();
  }

  static AiffCommon parse(byte[] head, boolean compressionNamed) throws RejectedException {
    if (head.length < (compressionNamed ? USEFUL_BYTES : PLAIN_BYTES)) {
      throw AiffHeader.damaged("its COMM chunk has only " + head.length + " bytes");
    }
    ByteBuffer fields = ByteBuffer.wrap(head);
    int channels = fields.getShort(0) & 0xffff;
    long frames = fields.getInt(2) & 0xffffffffL;
    int bits = fields.getShort(6) & 0xffff;
    double rate = extended(fields.getShort(8), fields.getLong(10));
    String compression = compressionNamed ? HeadReader.name(head, PLAIN_BYTES) : "NONE";
    SampleCode code = code(compression, bits);
    if (channels == 0) {
      throw new RejectedException(
          "noChannels", "The AIFF header announces 0 channels: export the recording again.");
    }
    if (!(rate > 0 && Double.isFinite(rate))) {
      throw new RejectedException(
          "noSampleRate",
          "The AIFF header announces " + rate + " samples per second: export it again.");
    }
    String depth = code.floating() ? 8 * code.bytes() + "-bit float" : bits + "-bit PCM";
    String name = (!compressionNamed ? "AIFF, " : "AIFF-C (" + compression.strip() + "), ") + depth;
    return new AiffCommon(name, channels, frames, rate, code);
  }

  private static SampleCode code(String compression, int bits) throws RejectedException {
    return switch (compression) {
      case "NONE", "twos" -> SampleCode.signed(container(bits), true);
      case "sowt" -> SampleCode.signed(container(bits), false);
      case "in24" -> SampleCode.S24_BIG;
      case "in32" -> SampleCode.S32_BIG;
      case "raw " -> {
        if (bits > 8) {
          throw unsupportedDepth(bits);
        }
        yield SampleCode.U8;
      }
      case "fl32", "FL32" -> SampleCode.F32_BIG;
      case "fl64", "FL64" -> SampleCode.F64_BIG;
      default -> throw refusal(compression);
    };
  }

  private static int container(int bits) throws RejectedException {
    if (bits < 1 || bits > 32) {
      throw unsupportedDepth(bits);
    }
    return (bits + 7) / 8;
  }

  private static RejectedException unsupportedDepth(int bits) {
    return new RejectedException(
        "unsupportedDepth",
        "The AIFF file has integer samples of "
            + bits
            + " bits, which cannot be read: export it with 16, 24 or 32 bits.");
  }

  private static RejectedException refusal(String compression) {
    String codec = COMPRESSED.get(compression);
    if (codec != null) {
      return WaveCode.compressed("AIFF", codec);
    }
    return new RejectedException(
        "unknownEncoding",
        "The AIFF file's samples have the encoding \""
            + compression
            + "\", which cannot be read: export the recording uncompressed.");
  }

  /** 80-bit floating point: sign and exponent of 16 bits, significand of 64 without hidden bit. */
  private static double extended(short signAndExponent, long significand) {
    if (significand == 0) {
      return 0;
    }
    // the lowest bit is given up so that the significand is never taken as negative
    double value =
        Math.scalb((double) (significand >>> 1), (signAndExponent & 0x7fff) - 16383 - 62);
    return signAndExponent < 0 ? -value : value;
  }
}
