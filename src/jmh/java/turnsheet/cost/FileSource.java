package turnsheet.cost;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import turnsheet.core.format.api.ByteSource;

/** A file as a capture's bytes. */
record FileSource(Path file, long length) implements ByteSource {

  static FileSource of(Path file) throws IOException {
    return new FileSource(file, Files.size(file));
  }

  @Override
  public InputStream open() throws IOException {
    return Files.newInputStream(file);
  }
}
