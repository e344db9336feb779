package turnsheet.core.format.text;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import turnsheet.core.format.api.ByteSource;

/** Byte sources for the tests. */
final class TextSources {

  private TextSources() {}

  static ByteSource of(String text) {
    return of(text.getBytes(StandardCharsets.UTF_8));
  }

  static ByteSource of(byte[] bytes) {
    return source(bytes.length, () -> new ByteArrayInputStream(bytes));
  }

  static ByteSource of(Path file) {
    try {
      return source(Files.size(file), () -> Files.newInputStream(file));
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  /** Hands out one byte a call. */
  static ByteSource trickling(byte[] bytes) {
    return source(
        bytes.length,
        () ->
            new InputStream() {
              private int at;

              @Override
              public int read() {
                return at < bytes.length ? bytes[at++] & 0xff : -1;
              }

              @Override
              public int read(byte[] into, int from, int count) {
                if (at == bytes.length || count == 0) {
                  return count == 0 ? 0 : -1;
                }
                into[from] = bytes[at++];
                return 1;
              }
            });
  }

  /** A beginning, then one byte over and over; nothing of it is held in memory. */
  static ByteSource endless(String beginning, char repeated, long length) {
    byte[] head = beginning.getBytes(StandardCharsets.UTF_8);
    return source(
        length,
        () ->
            new InputStream() {
              private long at;

              @Override
              public int read() {
                if (at >= length) {
                  return -1;
                }
                int b = at < head.length ? head[(int) at] : repeated;
                at++;
                return b;
              }

              @Override
              public int read(byte[] into, int from, int count) {
                if (at >= length) {
                  return -1;
                }
                int n = (int) Math.min(count, length - at);
                for (int i = 0; i < n; i++) {
                  into[from + i] = at + i < head.length ? head[(int) (at + i)] : (byte) repeated;
                }
                at += n;
                return n;
              }
            });
  }

  private interface Opener {
    InputStream open() throws IOException;
  }

  private static ByteSource source(long length, Opener opener) {
    return new ByteSource() {
      @Override
      public InputStream open() throws IOException {
        return opener.open();
      }

      @Override
      public long length() {
        return length;
      }
    };
  }
}
