package turnsheet.cli;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import turnsheet.core.format.api.ByteSource;

/** A file as bytes, with their hash. */
final class HashingSource implements ByteSource {

  private final Path file;
  private final long length;

  HashingSource(Path file) throws IOException {
    this.file = file;
    this.length = Files.size(file);
  }

  @Override
  public InputStream open() throws IOException {
    return Files.newInputStream(file);
  }

  @Override
  public long length() {
    return length;
  }

  /** SHA-256 of the bytes in lower-case hexadecimal; reads the file once. */
  String sha256() throws IOException {
    MessageDigest digest;
    try {
      digest = MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
    byte[] block = new byte[1 << 16];
    try (InputStream in = open()) {
      int count;
      while ((count = in.read(block)) > 0) {
        digest.update(block, 0, count);
      }
    }
    return HexFormat.of().formatHex(digest.digest());
  }
}
