package turnsheet.access;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.security.SecureRandom;
import java.util.Base64;
import java.util.HexFormat;

/** Unguessable words; only their hashes are stored. */
public final class Secrets {

  private static final SecureRandom RANDOM = new SecureRandom();

  private Secrets() {}

  /** URL-safe base64 of so many random bytes, without padding. */
  public static String random(int bytes) {
    byte[] secret = new byte[bytes];
    RANDOM.nextBytes(secret);
    return Base64.getUrlEncoder().withoutPadding().encodeToString(secret);
  }

  /** SHA-256 in lower-case hexadecimal: enough for a secret that nobody can guess, unsalted. */
  public static String sha256(String secret) {
    try {
      byte[] hash =
          MessageDigest.getInstance("SHA-256").digest(secret.getBytes(StandardCharsets.UTF_8));
      return HexFormat.of().formatHex(hash);
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException(e); // every Java platform has SHA-256
    }
  }
}
