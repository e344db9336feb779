package turnsheet.demo;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Random;
import java.util.zip.CRC32;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import turnsheet.core.synth.WavWriter;

/** The samples of the folder that must be refused, each with a sentence that says why. */
final class RefusedUploads {

  /** A compressed folder that somebody renamed: it must be refused. */
  static final String RENAMED_ZIP = "renamed-zip.wav";

  /** A recording without a signal: it must be refused. */
  static final String SILENCE = "silence.wav";

  static final List<String> ALL = List.of(RENAMED_ZIP, SILENCE);

  static byte[] bytes(String name) {
    var out = new java.io.ByteArrayOutputStream();
    try {
      if (name.equals(SILENCE)) {
        WavWriter.write(out, 8000, 16, new double[8000 * 5]);
      } else {
        zip(out);
      }
    } catch (IOException e) {
      throw new java.io.UncheckedIOException("a write to memory failed", e);
    }
    return out.toByteArray();
  }

  private RefusedUploads() {}

  /** Stored, not deflated, with a fixed time, so that the bytes do not depend on the platform. */
  private static void zip(OutputStream out) throws IOException {
    byte[] noise = new byte[4000];
    new Random(23).nextBytes(noise);
    byte[] content =
        new String(noise, StandardCharsets.ISO_8859_1).getBytes(StandardCharsets.UTF_8);
    var crc = new CRC32();
    crc.update(content);
    try (var zip = new ZipOutputStream(out)) {
      var entry = new ZipEntry("recording.bin");
      entry.setMethod(ZipEntry.STORED);
      entry.setSize(content.length);
      entry.setCrc(crc.getValue());
      entry.setTimeLocal(java.time.LocalDateTime.of(2020, 1, 1, 0, 0));
      zip.putNextEntry(entry);
      zip.write(content);
      zip.closeEntry();
    }
  }
}
