package turnsheet.capture;

import java.io.IOException;
import java.io.InputStream;

/** A sender that has gone. */
final class BrokenStream extends InputStream {

  @Override
  public int read() throws IOException {
    throw new IOException("gone");
  }

  @Override
  public int read(byte[] into, int from, int count) throws IOException {
    throw new IOException("gone");
  }
}
