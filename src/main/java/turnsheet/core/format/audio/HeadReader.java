package turnsheet.core.format.audio;

import java.io.Closeable;
import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import turnsheet.core.format.api.ByteSource;

/**
 * Walks through the head of a chunked file and knows at every moment where it stands. Never holds
 * more than the few bytes asked for, never moves past the end.
 */
final class HeadReader implements Closeable {

  private final InputStream in;
  private final long length;
  private long position;

  HeadReader(ByteSource source) throws IOException {
    in = source.open();
    length = source.length();
  }

  long position() {
    return position;
  }

  long remaining() {
    return length - position;
  }

  byte[] bytes(int count) throws IOException {
    byte[] bytes = in.readNBytes((int) Math.min(count, remaining()));
    position += bytes.length;
    if (bytes.length < count) {
      throw new EOFException("end at byte " + position);
    }
    return bytes;
  }

  /** Four characters of a chunk or container name; anything unprintable becomes a question mark. */
  String name() throws IOException {
    return name(bytes(4), 0);
  }

  static String name(byte[] bytes, int at) {
    byte[] four = new byte[4];
    for (int i = 0; i < 4; i++) {
      byte b = bytes[at + i];
      four[i] = b >= ' ' && b <= '~' ? b : (byte) '?';
    }
    return new String(four, StandardCharsets.US_ASCII);
  }

  /** Moves forward; stops at the end of the file where that comes first. */
  void skip(long count) throws IOException {
    long step = Math.min(count, remaining());
    in.skipNBytes(step);
    position += step;
  }

  @Override
  public void close() throws IOException {
    in.close();
  }
}
