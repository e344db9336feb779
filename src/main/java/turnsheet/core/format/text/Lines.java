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

  /**
   * Moves to the next line where that is nothing but an unsigned decimal number and its end, all of
   * it in the buffer and exact in binary: the rule in long lists. Otherwise nothing is moved, and
   * {@link #next} is to be used. The first line, which may begin with a mark, is left to it too.
   *
   * @return the number; NaN where nothing was moved
   */
  double nextPlain(byte mark) {
    if (skipLineFeed || number == 0) {
      return Double.NaN;
    }
    byte[] bytes = buffer;
    int limit = filled;
    int i = at;
    long mantissa = 0;
    int point = -1;
    while (i < limit) {
      int digit = bytes[i] - '0';
      if (digit >= 0 && digit <= 9) {
        mantissa = mantissa * 10 + digit;
      } else if (bytes[i] == mark && point < 0) {
        point = i;
      } else {
        break;
      }
      i++;
    }
    int digits = i - at - (point < 0 ? 0 : 1);
    if (i == limit || bytes[i] != '\n' || digits == 0 || digits > Decimals.EXACT_DIGITS) {
      return Double.NaN;
    }
    start = at;
    end = i;
    at = i + 1;
    number++;
    terminated = true;
    return Decimals.exact(mantissa, point < 0 ? 0 : i - 1 - point);
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
