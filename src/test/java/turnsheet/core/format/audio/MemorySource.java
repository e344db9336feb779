package turnsheet.core.format.audio;

import java.io.ByteArrayInputStream;
import java.io.InputStream;
import turnsheet.core.format.api.ByteSource;

/** Bytes of a file that a test has built. */
final class MemorySource implements ByteSource {

  private final byte[] bytes;

  MemorySource(byte[] bytes) {
    this.bytes = bytes.clone();
  }

  @Override
  public InputStream open() {
    return new ByteArrayInputStream(bytes);
  }

  @Override
  public long length() {
    return bytes.length;
  }
}
