package turnsheet.core.format.audio;

import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/**
 * MD5 of the samples as FLAC defines it: interleaved, little-endian, in as many whole bytes as the
 * depth takes.
 *
 * <p>Source: RFC 9639, section 8.2.
 */
final class FlacDigest {

  private final String expected;
  private final int bytesPerSample;
  private final MessageDigest digest;
  private byte[] bytes = new byte[0];

  FlacDigest(FlacHeader header) {
    expected = header.md5();
    bytesPerSample = (header.bits() + 7) / 8;
    try {
      digest = MessageDigest.getInstance("MD5");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has MD5", e);
    }
  }

  void add(long[][] block, int count) {
    if (expected.equals(FlacHeader.NO_MD5)) {
      return;
    }
    int frameBytes = bytesPerSample * block.length;
    if (bytes.length < count * frameBytes) {
      bytes = new byte[count * frameBytes];
    }
    for (int c = 0; c < block.length; c++) {
      long[] samples = block[c];
      for (int i = 0, at = c * bytesPerSample; i < count; i++, at += frameBytes) {
        long sample = samples[i];
        for (int b = 0; b < bytesPerSample; b++) {
          bytes[at + b] = (byte) (sample >> (8 * b));
        }
      }
    }
    digest.update(bytes, 0, count * frameBytes);
  }

  /** Whether the samples added are those of the header, or the header does not tell. */
  boolean matches() {
    return expected.equals(FlacHeader.NO_MD5)
        || expected.equals(HexFormat.of().formatHex(digest.digest()));
  }
}
