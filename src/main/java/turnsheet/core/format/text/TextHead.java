package turnsheet.core.format.text;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.signal.RejectedException;

/** The first whole lines of a text file. */
final class TextHead implements ByteSource {

  static final int BYTES = 256 * 1024;

  private final byte[] bytes;
  private final boolean wholeFile;

  private TextHead(byte[] bytes, boolean wholeFile) {
    this.bytes = bytes;
    this.wholeFile = wholeFile;
  }

  static TextHead of(ByteSource source) throws IOException, RejectedException {
    byte[] read;
    try (InputStream in = source.open()) {
      read = in.readNBytes(BYTES + 1);
    }
    if (TextBytes.isUtf16(read)) {
      throw new RejectedException(
          "encoding", "The text is written in UTF-16: save it as UTF-8 and upload it again.");
    }
    requireShortLines(read);
    boolean whole = read.length <= BYTES;
    return new TextHead(whole ? read : Arrays.copyOf(read, lastLineEnd(read)), whole);
  }

  @Override
  public InputStream open() {
    return new ByteArrayInputStream(bytes);
  }

  @Override
  public long length() {
    return bytes.length;
  }

  boolean wholeFile() {
    return wholeFile;
  }

  /** UTF-8 where the bytes are that, else Latin-1; without byte order mark. */
  String text() {
    int from = TextBytes.hasUtf8Mark(bytes) ? 3 : 0;
    ByteBuffer content = ByteBuffer.wrap(bytes, from, bytes.length - from);
    try {
      return StandardCharsets.UTF_8.newDecoder().decode(content).toString();
    } catch (CharacterCodingException e) {
      return new String(bytes, from, bytes.length - from, StandardCharsets.ISO_8859_1);
    }
  }

  /** Whether the text opens like a document or data of another kind, not like a table. */
  boolean looksLikeMarkupOrJson() {
    int at = TextBytes.firstInk(bytes);
    if (at >= bytes.length) {
      return false;
    }
    int next = at + 1;
    while (next < bytes.length && bytes[next] <= ' ' && bytes[next] >= 0) {
      next++;
    }
    char after = next < bytes.length ? (char) (bytes[next] & 0xff) : ' ';
    return switch (bytes[at]) {
      case '{' -> true;
      case '<' -> after == '!' || after == '?' || Character.isLetter(after);
      case '[' -> "[]{\"-".indexOf(after) >= 0 || Character.isDigit(after);
      default -> false;
    };
  }

  /** Length up to and with the last line end; everything where there is none. */
  private static int lastLineEnd(byte[] read) {
    for (int i = BYTES; i > 0; i--) {
      if (read[i - 1] == '\n' || (read[i - 1] == '\r' && read[i] != '\n')) {
        return i;
      }
    }
    return BYTES;
  }

  private static void requireShortLines(byte[] read) throws IOException, RejectedException {
    try (Lines lines = new Lines(new ByteArrayInputStream(read))) {
      while (lines.next()) {
        // the lines complain of themselves
      }
    }
  }
}
