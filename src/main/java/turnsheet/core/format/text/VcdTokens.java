package turnsheet.core.format.text;

import java.io.Closeable;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import turnsheet.core.signal.RejectedException;

/**
 * Splits a value change dump at blanks, in bounded memory.
 *
 * <p>Of a long token only its first {@link #KEPT_BYTES} bytes and its last byte are kept: vectors
 * and strings need no more. A token beyond {@link #MAX_TOKEN_BYTES} is a rejection.
 */
final class VcdTokens implements Closeable {

  static final int KEPT_BYTES = 4096;
  static final long MAX_TOKEN_BYTES = 1 << 20;

  private final InputStream in;
  private final byte[] buffer = new byte[1 << 16];
  private final byte[] token = new byte[KEPT_BYTES];
  private int at;
  private int end;
  private int kept;
  private long length;
  private byte last;
  private boolean terminated;
  private long line = 1;
  private long consumedBytes;
  private long stopBytes = Long.MAX_VALUE;

  VcdTokens(InputStream in) {
    this.in = in;
  }

  /** Moves to the next token; false at the end of the file. */
  boolean next() throws IOException, RejectedException {
    kept = 0;
    length = 0;
    int b = read();
    while (b >= 0 && isBlank(b)) {
      if (b == '\n') {
        line++;
      }
      b = read();
    }
    if (b < 0) {
      return false;
    }
    while (b >= 0 && !isBlank(b)) {
      keep((byte) b);
      b = read();
    }
    terminated = b >= 0;
    if (terminated) {
      // the blank belongs to the next call, which counts lines
      at--;
      consumedBytes--;
    }
    return true;
  }

  /** Skips to the end mark of a section; false where the file ends first. */
  boolean skipSection() throws IOException, RejectedException {
    while (next()) {
      if (is("$end")) {
        return true;
      }
    }
    return false;
  }

  boolean is(String word) {
    if (length != word.length()) {
      return false;
    }
    for (int i = 0; i < kept; i++) {
      if (token[i] != word.charAt(i)) {
        return false;
      }
    }
    return true;
  }

  /** Whether the token from an index on equals an identifier code. */
  boolean tailIs(int from, byte[] code) {
    return length - from == code.length
        && length == kept
        && Arrays.equals(token, from, kept, code, 0, code.length);
  }

  String tail(int from) {
    return new String(token, from, kept - from, StandardCharsets.ISO_8859_1);
  }

  String text() {
    return new String(token, 0, kept, StandardCharsets.UTF_8);
  }

  /** The token, short enough to stand in a sentence. */
  String shown() {
    String text = text();
    return "\"" + (text.length() > 24 ? text.substring(0, 24) + "..." : text) + "\"";
  }

  byte first() {
    return token[0];
  }

  byte at(int index) {
    return token[index];
  }

  byte last() {
    return last;
  }

  long length() {
    return length;
  }

  /** Whether a blank follows; false where the file ends with the token. */
  boolean terminated() {
    return terminated;
  }

  /** Line of the current token, from 1. */
  long line() {
    return line;
  }

  /** Lets the file seem to end after so many more bytes. */
  void stopAfter(long bytes) {
    stopBytes = consumedBytes + bytes;
  }

  /** Takes {@link #stopAfter} back. */
  void goOn() {
    stopBytes = Long.MAX_VALUE;
  }

  /** Whether the end that was seen is the one of {@link #stopAfter}. */
  boolean stopped() {
    return consumedBytes >= stopBytes;
  }

  @Override
  public void close() throws IOException {
    in.close();
  }

  private void keep(byte b) throws RejectedException {
    if (kept < KEPT_BYTES) {
      token[kept++] = b;
    }
    last = b;
    if (++length > MAX_TOKEN_BYTES) {
      throw new RejectedException(
          "lineTooLong",
          "Line " + line + " holds more than 1 MiB without a blank: this is no value change dump.");
    }
  }

  private int read() throws IOException {
    if (consumedBytes >= stopBytes) {
      return -1;
    }
    if (at == end) {
      int count = in.read(buffer, 0, buffer.length);
      if (count <= 0) {
        return -1;
      }
      at = 0;
      end = count;
    }
    consumedBytes++;
    return buffer[at++] & 0xff;
  }

  private static boolean isBlank(int b) {
    return b == ' ' || b == '\n' || b == '\r' || b == '\t' || b == '\f' || b == 0x0b;
  }
}
