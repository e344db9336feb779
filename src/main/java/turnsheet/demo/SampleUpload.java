package turnsheet.demo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.synth.SpeedFunction;

/**
 * One file of the sample folder: an invented machine's recording with a known truth.
 *
 * @param fileName name in the folder
 * @param about one sentence on what it stands for
 * @param kind what it is a recording of
 * @param nominalHz tone or pulse rate at nominal speed
 * @param durationSeconds length
 * @param speed the speed that it was made from
 * @param content writes the bytes
 */
record SampleUpload(
    String fileName,
    String about,
    CaptureKind kind,
    double nominalHz,
    double durationSeconds,
    SpeedFunction speed,
    Content content) {

  /** Writes the bytes of a sample; the same each time. */
  @FunctionalInterface
  interface Content {
    void writeTo(OutputStream out) throws IOException;
  }

  byte[] bytes() {
    var out = new ByteArrayOutputStream();
    try {
      content.writeTo(out);
    } catch (IOException e) {
      throw new java.io.UncheckedIOException("a write to memory failed", e);
    }
    return out.toByteArray();
  }

  SpeedTruth truth() {
    return SpeedTruth.of(speed, durationSeconds);
  }
}
