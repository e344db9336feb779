package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/** Clocks with a known error, from the bytes of a file to parts per million. */
class ClockErrorTest {

  private static final SpeedFunction STEADY = SpeedFunction.constant(0);

  /** Rounding to 24 bits, and the core's own arithmetic over a quarter of a minute. */
  private static final double ARITHMETIC_PPM = 1e-3;

  /** A true 1000 Hz, sampled by a clock that gives 48000 samples in what it takes for a second. */
  private static byte[] tone(double clockPpm, double seconds, double snrDb) throws IOException {
    double[] samples =
        SignalSynth.tone(STEADY, 1000, 48000 * (1 + clockPpm * 1e-6), seconds, 0.3, snrDb, 5);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    WavWriter.write(out, 48000, 24, samples);
    return out.toByteArray();
  }

  private static Reading read(byte[] bytes, MeasureSettings settings) throws IOException {
    ByteSource source =
        new ByteSource() {
          @Override
          public InputStream open() {
            return new ByteArrayInputStream(bytes);
          }

          @Override
          public long length() {
            return bytes.length;
          }
        };
    Outcome outcome =
        new Measurement(CaptureFormats.standard())
            .measure(source, "0".repeat(64), ReadOptions.none(), settings, Progress.NONE);
    assertThat(outcome).isInstanceOf(Outcome.Measured.class);
    return ((Outcome.Measured) outcome).reading();
  }

  private static Reading read(byte[] bytes, CaptureKind kind, double hertz) throws IOException {
    return read(bytes, ClockError.settings(kind, 1, hertz));
  }

  private static ClockError found(byte[] bytes, double referencePpm) throws IOException {
    return ClockError.of(
        read(bytes, CaptureKind.TONE, 1000), new ClockError.Reference(1000, referencePpm), 0);
  }

  @Test
  void aFastClockReadsTooLowAndHasAPositiveError() throws IOException {
    ClockError error = found(tone(37, 15, Double.POSITIVE_INFINITY), 0.02);
    // 1000 / 1.000037
    assertThat(error.measuredHz()).isCloseTo(999.963001369, within(1e-6));
    assertThat(error.ppm()).isCloseTo(37, within(ARITHMETIC_PPM));
    assertThat(error.expandedUncertaintyPpm()).isBetween(0.02, 0.025);
  }

  @Test
  void aSlowClockHasANegativeErrorNoiseOrNot() throws IOException {
    ClockError error = found(tone(-37, 30, 40), 0.02);
    assertThat(error.expandedUncertaintyPpm()).isBetween(0.02, 1.0);
    assertThat(error.ppm()).isCloseTo(-37, within(error.expandedUncertaintyPpm()));
  }

  /** What is found must make the core read the reference. */
  @Test
  void theErrorFoundCorrectsTheReading() throws IOException {
    byte[] bytes = tone(250, 15, Double.POSITIVE_INFINITY);
    double ppm = found(bytes, 1).ppm();
    Reading.Speed speed =
        read(bytes, new MeasureSettings(CaptureKind.TONE, 1, 1000, 1, null, 0, ppm, 0)).speed();
    assertThat(TraceFiguresTest.value(speed.deviationPercent()))
        .isCloseTo(0, within(1e-4 * ARITHMETIC_PPM));
  }

  /** A fast timer counts more microseconds than went by. */
  @Test
  void edgesOfAFastTimerHaveTheSameSign() throws IOException {
    StringBuilder list = new StringBuilder("time_us\n");
    for (int k = 0; k <= 20_000; k++) {
      list.append(String.format(Locale.ROOT, "%.3f%n", k * 1000.0 * (1 + 37e-6)));
    }
    Reading reading =
        read(list.toString().getBytes(StandardCharsets.UTF_8), CaptureKind.EDGES, 1000);
    ClockError error = ClockError.of(reading, new ClockError.Reference(1000, 0.02), 0);
    // times are printed to a nanosecond, and the period of the mean is 20 s
    assertThat(error.ppm()).isCloseTo(37, within(error.expandedUncertaintyPpm()));
    assertThat(error.expandedUncertaintyPpm()).isLessThan(0.1);
  }

  /** JCGM 100:2008, 5.1.2: halves of 3 and 4 at k = 2 with no noise to speak of make 5. */
  @Test
  void joinsReferenceAndAllowance() throws IOException {
    Reading reading = read(tone(0, 15, Double.POSITIVE_INFINITY), CaptureKind.TONE, 1000);
    ClockError error = ClockError.of(reading, new ClockError.Reference(1000, 3), 2 * Math.sqrt(3));
    assertThat(error.expandedUncertaintyPpm()).isCloseTo(5, within(1e-4));
  }

  @Test
  void aShortNoisyRecordingSaysSo() throws IOException {
    double brief = found(tone(10, 4, 40), 0.02).recordingPpm();
    double longer = found(tone(10, 40, 40), 0.02).recordingPpm();
    // white noise of phase falls with the length to the power 1.5; read from few bins, it scatters
    assertThat(brief).isGreaterThan(5 * longer);
  }

  /** Twenty noises: about one in twenty may lie outside, and three would be odd. */
  @Test
  void theNoiseStatedCoversTheNoiseThereIs() throws IOException {
    int outside = 0;
    for (int seed = 0; seed < 20; seed++) {
      double[] samples = SignalSynth.tone(STEADY, 1000, 8000 * 1.000037, 5, 0.3, 30, seed);
      ByteArrayOutputStream out = new ByteArrayOutputStream();
      WavWriter.write(out, 8000, 24, samples);
      ClockError error = found(out.toByteArray(), 1e-6);
      outside += Math.abs(error.ppm() - 37) > error.expandedUncertaintyPpm() ? 1 : 0;
    }
    assertThat(outside).isLessThanOrEqualTo(2);
  }

  @Test
  void takesNoReadingThatKnewAClock() throws IOException {
    Reading reading = read(tone(0, 15, 60), CaptureKind.TONE, 1000);
    assertThatThrownBy(() -> ClockError.of(reading, new ClockError.Reference(1001, 1), 0))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
