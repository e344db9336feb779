package turnsheet.core.format.text;

import java.io.Closeable;
import java.io.IOException;
import java.io.InputStream;
import turnsheet.core.signal.RejectedException;

/**
 * Lines of a text file in place in one buffer; ends are LF, CR LF or CR.
 *
 * <p>A line longer than {@link #MAX_LINE_BYTES} is a rejection.
 */
final class Lines implements Closeable {

  static final int MAX_LINE_BYTES = 16 * 1024;

  private final InputStream in;
  private final byte[] buffer = new byte[1 << 16];
  private int at;
  private int filled;
  private int start;
  private int end;
  private long number;
  private boolean endOfFile;
  private boolean terminated;
  private boolean skipLineFeed;

  Lines(InputStream in) {
    this.in = in;
  }

  /** Moves to the next line; false at the end of the file. */
  boolean next() throws IOException, RejectedException {
    if (skipLineFeed) {
      start = at;
      if (at == filled) {
        fill();
      }
      if (at < filled && buffer[at] == '\n') {
        at++;
      }
      skipLineFeed = false;
    }
    start = at;
    int i = at;
    while (true) {
      int limit = filled;
      byte[] bytes = buffer;
      while (i < limit && bytes[i] != '\n' && bytes[i] != '\r') {
        i++;
      }
      if (i - start > MAX_LINE_BYTES) {
        throw new RejectedException(
            "lineTooLong",
            "Line "
                + (number + 1)
                + " is longer than 16 KiB: export a table with one row per line.");
      }
      if (i < limit) {
        end = i;
        at = i + 1;
        terminated = true;
        skipLineFeed = bytes[i] == '\r';
        break;
      }
      int length = i - start;
      if (endOfFile || !fill()) {
        end = start + length;
        at = end;
        terminated = false;
        if (length == 0) {
          return false;
        }
        break;
      }
      i = start + length;
    }
    number++;
    if (number == 1) {
      start = Math.min(end, start + byteOrderMark());
    }
    return true;
  }

  byte[] bytes() {
    return buffer;
  }

  /** Index of the first byte of the line. */
  int start() {
    return start;
  }

  /** Index behind the last byte of the line. */
  int end() {
    return end;
  }

  /** Line number from 1. */
  long number() {
    return number;
  }

  /** Whether the line has an end; false only where the file stops within it. */
  boolean terminated() {
    return terminated;
  }

  @Override
  public void close() throws IOException {
    in.close();
  }

  private int byteOrderMark() {
    boolean marked =
        end - start >= 3
            && buffer[start] == (byte) 0xef
            && buffer[start + 1] == (byte) 0xbb
            && buffer[start + 2] == (byte) 0xbf;
    return marked ? 3 : 0;
  }

  /** Keeps what belongs to the current line, at the front of the buffer, and reads on. */
  private boolean fill() throws IOException {
    if (filled == buffer.length) {
      int kept = filled - start;
      if (start > 0) {
        System.arraycopy(buffer, start, buffer, 0, kept);
      }
      at -= start;
      start = 0;
      filled = kept;
    }
    int count = in.read(buffer, filled, buffer.length - filled);
    if (count <= 0) {
      endOfFile = true;
      return false;
    }
    filled += count;
    return true;
  }
}
