package turnsheet.core.format;

import java.nio.charset.StandardCharsets;
import java.util.List;
import turnsheet.core.signal.RejectedException;

/**
 * Kinds of files that are often taken for a capture and tell by their first bytes what they are.
 * They are refused by name before any format looks at them.
 */
final class ForeignContent {

  private static final String UNPACK =
      "unpack it and upload the recording inside (a spreadsheet: save the sheet as CSV).";
  private static final String NO_RECORDING = "upload the recording itself.";
  private static final String EXPORT_SAMPLES =
      "compression changes what is to be measured; record or export it as WAV.";
  private static final String OTHER_CONTAINER = "export it as WAV.";

  private static final List<Mark> MARKS =
      List.of(
          archive("PK\3\4", "a zip archive"),
          archive("PK\5\6", "an empty zip archive"),
          archive("\u001f\u008b", "a gzip archive"),
          archive("BZh", "a bzip2 archive"),
          archive("7z\u00bc\u00af", "a 7z archive"),
          archive("\u00fd7zXZ", "an xz archive"),
          archive("Rar!", "a RAR archive"),
          archive("(\u00b5/\u00fd", "a zstd archive"),
          archive("\u00d0\u00cf\u0011\u00e0", "an office document of the older kind"),
          new Mark(0, "\u00ff\u00d8\u00ff", "notACapture", "a JPEG picture", NO_RECORDING),
          new Mark(0, "\u0089PNG", "notACapture", "a PNG picture", NO_RECORDING),
          new Mark(0, "GIF8", "notACapture", "a GIF picture", NO_RECORDING),
          new Mark(0, "%PDF", "notACapture", "a PDF document", NO_RECORDING),
          new Mark(0, "\u007fELF", "notACapture", "a program", NO_RECORDING),
          new Mark(0, "SQLite format", "notACapture", "a database", NO_RECORDING),
          compressed(0, "OggS", "Ogg audio"),
          compressed(4, "ftyp", "MP4 or M4A audio"),
          compressed(0, "\u001aE\u00df\u00a3", "Matroska or WebM"),
          compressed(0, "0&\u00b2u", "Windows Media audio"),
          compressed(0, "wvpk", "WavPack audio"),
          compressed(0, "MAC ", "Monkey's Audio"),
          compressed(0, "#!AMR", "AMR speech audio"),
          compressed(0, "\u00ff\u00fb", "MP3 audio"),
          compressed(0, "\u00ff\u00fa", "MP3 audio"),
          compressed(0, "\u00ff\u00f3", "MP3 audio"),
          compressed(0, "\u00ff\u00f2", "MP3 audio"),
          compressed(0, "\u00ff\u00e3", "MP3 audio"),
          compressed(0, "\u00ff\u00e2", "MP3 audio"),
          compressed(0, "\u00ff\u00fd", "MPEG layer 2 audio"),
          compressed(0, "\u00ff\u00fc", "MPEG layer 2 audio"),
          compressed(0, "\u00ff\u00f1", "raw AAC audio"),
          headless("\u00ff\u00f8"),
          headless("\u00ff\u00f9"),
          new Mark(0, "riff.\u0091", "unsupportedContainer", "Wave64 audio", OTHER_CONTAINER),
          new Mark(0, "caff", "unsupportedContainer", "CAF audio", OTHER_CONTAINER),
          new Mark(0, ".snd", "unsupportedContainer", "AU audio", OTHER_CONTAINER));

  private ForeignContent() {}

  /** Refuses what is known to be something else. */
  static void refuse(byte[] head) throws RejectedException {
    for (Mark mark : MARKS) {
      if (mark.matches(head)) {
        throw new RejectedException(
            mark.code, "The file is " + mark.kind + ", whatever its name says: " + mark.advice);
      }
    }
  }

  private static Mark archive(String bytes, String kind) {
    return new Mark(0, bytes, "notACapture", kind, UNPACK);
  }

  private static Mark compressed(int at, String bytes, String kind) {
    return new Mark(at, bytes, "compressedAudio", kind, EXPORT_SAMPLES);
  }

  private static Mark headless(String bytes) {
    return new Mark(
        0,
        bytes,
        "unsupportedContainer",
        "a raw FLAC or AAC stream without the header that describes it",
        OTHER_CONTAINER);
  }

  /** Bytes, written as characters up to 255, at a place of the head. */
  private record Mark(int at, String bytes, String code, String kind, String advice) {

    boolean matches(byte[] head) {
      return head.length >= at + bytes.length()
          && new String(head, at, bytes.length(), StandardCharsets.ISO_8859_1).equals(bytes);
    }
  }
}
