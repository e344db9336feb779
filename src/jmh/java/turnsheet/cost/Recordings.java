package turnsheet.cost;

import java.io.BufferedOutputStream;
import java.io.BufferedWriter;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Locale;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/**
 * Captures of known content, made once under {@code target/bench} and kept. A unit 0.4 % fast with
 * wow at 0.5 Hz, flutter at 10 and 63 Hz and noise at -70 dB: all lines turn whole times in a
 * minute, so that a long recording is the same minute again and again without a seam.
 */
final class Recordings {

  static final double TONE_HERTZ = 3150;
  static final double PULSES_PER_SECOND = 1600;

  private static final Path FOLDER = Path.of("target", "bench");
  private static final int HEAD_BYTES = 44;
  private static final int LOOP_SECONDS = 60;
  private static final SpeedFunction SPEED =
      SpeedFunction.constant(0.004)
          .plusLine(0.5, 0.1, 0.3)
          .plusLine(10, 0.05, 1)
          .plusLine(63, 0.03, 2);

  private Recordings() {}

  /** A 24-bit WAV file of the tone, every channel the same; RF64 where it is too long for RIFF. */
  static Path tone(int minutes, int rateHertz, int channels) {
    String name =
        String.format(Locale.ROOT, "tone-%dmin-%dHz-%dch.wav", minutes, rateHertz, channels);
    return made(
        name,
        out -> {
          byte[] minute = minute(rateHertz, channels);
          out.write(head(minute, minutes));
          for (int i = 0; i < minutes; i++) {
            out.write(minute, HEAD_BYTES, minute.length - HEAD_BYTES);
          }
        });
  }

  /** A minute of a tachometer's rounded pulses with hum and noise, 24 bits. */
  static Path tachometer(int rateHertz) {
    return made(
        "tachometer-" + rateHertz + "Hz.wav",
        out -> {
          double[] samples =
              SignalSynth.pulses(
                  SPEED, PULSES_PER_SECOND, rateHertz, LOOP_SECONDS, 0.4, 2, 1e-3, 1);
          for (int i = 0; i < samples.length; i++) {
            samples[i] += 0.05 * Math.sin(2 * Math.PI * 50 * i / rateHertz);
          }
          WavWriter.write(out, rateHertz, 24, samples);
        });
  }

  /** A list of edge times, one in a line, in seconds with ten decimals. */
  static Path edges(int minutes) {
    return made(
        "edges-" + minutes + "min.csv",
        out -> {
          try (BufferedWriter text =
              new BufferedWriter(new java.io.OutputStreamWriter(out, StandardCharsets.US_ASCII))) {
            double[] times =
                SignalSynth.risingEdges(SPEED, PULSES_PER_SECOND, 60.0 * minutes, 1e-7, 1);
            text.write("time_s\n");
            for (double t : times) {
              text.write(decimal(t));
              text.write('\n');
            }
          }
        });
  }

  private static String decimal(double seconds) {
    long units = Math.round(seconds * 1e10);
    String digits = String.format(Locale.ROOT, "%011d", Math.max(0, units));
    int point = digits.length() - 10;
    return digits.substring(0, point) + '.' + digits.substring(point);
  }

  private static byte[] minute(int rateHertz, int channels) throws IOException {
    double[] samples = SignalSynth.tone(SPEED, TONE_HERTZ, rateHertz, LOOP_SECONDS, 0.5, 70, 1);
    double[][] all = new double[channels][];
    java.util.Arrays.fill(all, samples);
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    WavWriter.write(bytes, rateHertz, 24, all);
    return bytes.toByteArray();
  }

  /** The minute's own head with the length of the whole. */
  private static byte[] head(byte[] minute, int minutes) {
    long dataBytes = (long) minutes * (minute.length - HEAD_BYTES);
    if (dataBytes + 36 < 0xffffffffL) {
      ByteBuffer head = ByteBuffer.allocate(HEAD_BYTES).order(ByteOrder.LITTLE_ENDIAN);
      head.put(minute, 0, HEAD_BYTES);
      head.putInt(4, (int) (36 + dataBytes));
      head.putInt(40, (int) dataBytes);
      return head.array();
    }
    // EBU Tech 3306: the 64-bit sizes stand in a chunk of their own, the old fields are all ones
    ByteBuffer head = ByteBuffer.allocate(HEAD_BYTES + 36).order(ByteOrder.LITTLE_ENDIAN);
    head.put("RF64".getBytes(StandardCharsets.US_ASCII)).putInt(-1);
    head.put("WAVEds64".getBytes(StandardCharsets.US_ASCII)).putInt(28);
    head.putLong(72 + dataBytes).putLong(dataBytes).putLong(0).putInt(0);
    head.put(minute, 12, HEAD_BYTES - 16).putInt(-1);
    return head.array();
  }

  @FunctionalInterface
  private interface Content {
    void writeTo(OutputStream out) throws IOException;
  }

  private static Path made(String name, Content content) {
    Path file = FOLDER.resolve(name);
    if (Files.exists(file)) {
      return file;
    }
    try {
      Files.createDirectories(FOLDER);
      Path part = FOLDER.resolve(name + ".part");
      try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(part), 1 << 16)) {
        content.writeTo(out);
      }
      return Files.move(part, file, StandardCopyOption.ATOMIC_MOVE);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
