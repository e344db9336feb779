package turnsheet.core.format.api;

import java.io.IOException;
import java.io.InputStream;

/** Bytes of a capture that can be read from the start as often as needed. */
public interface ByteSource {

  /** Opens the bytes at their start; the caller closes. Not buffered. */
  InputStream open() throws IOException;

  /** How many bytes there are. */
  long length();
}
