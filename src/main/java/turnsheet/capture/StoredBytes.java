package turnsheet.capture;

import java.util.regex.Pattern;

/**
 * Bytes that lie in the store.
 *
 * @param sha256 their digest in 64 lower case hexadecimal digits; their name in the store
 * @param length how many there are
 */
public record StoredBytes(String sha256, long length) {

  private static final Pattern DIGEST = Pattern.compile("[0-9a-f]{64}");

  public StoredBytes {
    if (!DIGEST.matcher(sha256).matches() || length < 0) {
      throw new IllegalArgumentException(sha256 + ", " + length + " bytes");
    }
  }
}
