package turnsheet.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Reading;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;
import turnsheet.document.ReadingDocument;

class MeasureCommandTest {

  @TempDir private Path folder;

  private final ByteArrayOutputStream out = new ByteArrayOutputStream();
  private final ByteArrayOutputStream err = new ByteArrayOutputStream();

  @Test
  void measuresATachometerWaveformAsJson() throws IOException {
    Path file = tachometer();
    assertThat(run(file.toString(), "--pulses-per-second", "800", "--teeth", "60", "--json"))
        .isZero();
    Reading reading = ReadingDocument.fromJson(out.toString(StandardCharsets.UTF_8));
    assertThat(reading.source().kind()).isEqualTo(CaptureKind.TACHOMETER);
    assertThat(reading.source().channel()).isEqualTo(1);
    assertThat(reading.source().sha256()).matches("[0-9a-f]{64}");
    // closed-form bar for a clean capture
    assertThat(Objects.requireNonNull(reading.speed().deviationPercent().value()))
        .isCloseTo(0.5, within(0.001));
    assertThat(Objects.requireNonNull(Objects.requireNonNull(reading.edges()).wheel()).teeth())
        .isEqualTo(60);
    assertThat(err.toString(StandardCharsets.UTF_8)).isEmpty();
  }

  @Test
  void printsATableForPeople() throws IOException {
    assertThat(run(tachometer().toString(), "--pulses-per-second", "800")).isZero();
    // 100 ppm half width of an unchecked clock, rectangular, k = 2: 0.0116 %
    assertThat(out.toString(StandardCharsets.UTF_8))
        .containsPattern("speed deviation +0\\.500 \\+/- 0\\.012 %")
        .containsPattern("edges +40\\d\\d, 0 missing, 0 extra")
        .contains("k = 2");
  }

  @Test
  void refusesAChannelThatIsNotThere() throws IOException {
    String file = tachometer().toString();
    assertThat(run(file, "--pulses-per-second", "800", "--channel", "2")).isEqualTo(3);
    assertThat(err.toString(StandardCharsets.UTF_8)).isNotBlank().doesNotContain("Exception");
  }

  @Test
  void rejectsWithTheSentenceOnTheErrorStream() throws IOException {
    Path file = Files.write(folder.resolve("empty.wav"), new byte[0]);
    assertThat(run(file.toString(), "--tone-hz", "3150")).isEqualTo(MeasureCommand.REJECTED);
    assertThat(err.toString(StandardCharsets.UTF_8)).startsWith("The file is empty");
    assertThat(out.size()).isZero();
    err.reset();
    assertThat(run(tachometer().toString(), "--pulses-per-second", "1600")).isEqualTo(3);
    assertThat(err.toString(StandardCharsets.UTF_8)).contains("804");
  }

  @Test
  void explainsItselfOnWrongUsage() throws IOException {
    String file = tachometer().toString();
    usage("No file");
    usage("Give either", file);
    usage("Give either", file, "--tone-hz", "3150", "--pulses-per-second", "800");
    usage("takes a positive number", file, "--tone-hz", "high");
    usage("takes a positive number", file, "--tone-hz", "-1");
    usage("takes a value", file, "--tone-hz");
    usage("takes a whole number", file, "--pulses-per-second", "800", "--teeth", "0");
    usage("--teeth goes with", file, "--tone-hz", "3150", "--teeth", "120");
    usage("no option --loud", file, "--tone-hz", "3150", "--loud");
    usage("One file at a time", file, file, "--tone-hz", "3150");
    assertThat(run(folder.resolve("absent.wav").toString(), "--tone-hz", "3150")).isEqualTo(2);
  }

  private void usage(String sentence, String... args) {
    err.reset();
    assertThat(run(args)).isEqualTo(MeasureCommand.WRONG_USAGE);
    assertThat(err.toString(StandardCharsets.UTF_8)).contains(sentence).contains("usage: measure");
    assertThat(out.size()).isZero();
  }

  private int run(String... args) {
    return MeasureCommand.run(
        args,
        new PrintStream(out, true, StandardCharsets.UTF_8),
        new PrintStream(err, true, StandardCharsets.UTF_8));
  }

  /** 5 s at 48 kHz: 804 pulses a second, 0.5 % fast. */
  private Path tachometer() throws IOException {
    Path file = folder.resolve("tachometer.wav");
    double[] samples =
        SignalSynth.tone(
            SpeedFunction.constant(0.005), 800, 48000, 5, 0.5, Double.POSITIVE_INFINITY, 1);
    try (OutputStream bytes = Files.newOutputStream(file)) {
      WavWriter.write(bytes, 48000, 16, samples);
    }
    return file;
  }
}
