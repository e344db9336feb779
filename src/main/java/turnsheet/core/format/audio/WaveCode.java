package turnsheet.core.format.audio;

import java.util.Locale;
import java.util.Map;
import turnsheet.core.signal.RejectedException;

/**
 * Names of the encodings that a WAVE format chunk may announce.
 *
 * <p>Source: WAVE format registry, RFC 2361, appendix A.
 */
final class WaveCode {

  static final int PCM = 0x0001;
  static final int FLOAT = 0x0003;
  static final int EXTENSIBLE = 0xFFFE;

  private static final Map<Integer, String> COMPRESSED =
      Map.ofEntries(
          Map.entry(0x0002, "Microsoft ADPCM"),
          Map.entry(0x0006, "A-law"),
          Map.entry(0x0007, "mu-law"),
          Map.entry(0x0011, "IMA ADPCM"),
          Map.entry(0x0016, "G.723 ADPCM"),
          Map.entry(0x0031, "GSM 6.10"),
          Map.entry(0x0040, "G.721 ADPCM"),
          Map.entry(0x0050, "MPEG audio"),
          Map.entry(0x0055, "MPEG layer 3 (MP3)"),
          Map.entry(0x0064, "G.726 ADPCM"),
          Map.entry(0x0069, "IMA ADPCM of a games console"),
          Map.entry(0x00FF, "AAC"),
          Map.entry(0x0160, "Windows Media Audio 1"),
          Map.entry(0x0161, "Windows Media Audio 2"),
          Map.entry(0x0162, "Windows Media Audio Professional"),
          Map.entry(0x0163, "Windows Media Audio Lossless"),
          Map.entry(0x2000, "AC-3"),
          Map.entry(0x2001, "DTS"),
          Map.entry(0x674F, "Ogg Vorbis"),
          Map.entry(0xF1AC, "FLAC inside WAV"));

  private WaveCode() {}

  static RejectedException refusal(int code) {
    String name = COMPRESSED.get(code);
    if (name != null) {
      return compressed("WAV", name);
    }
    return new RejectedException(
        "unknownEncoding",
        String.format(
            Locale.ROOT,
            "The WAV file's samples have the encoding number 0x%04X, which cannot be read: export"
                + " the recording as WAV with PCM or floating-point samples.",
            code));
  }

  static RejectedException compressed(String container, String codec) {
    return new RejectedException(
        "compressedAudio",
        "The "
            + container
            + " file holds compressed audio ("
            + codec
            + "), and compression changes what is to be measured: record or export it"
            + " uncompressed, as WAV with PCM samples.");
  }
}
