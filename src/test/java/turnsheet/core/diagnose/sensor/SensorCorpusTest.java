package turnsheet.core.diagnose.sensor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import turnsheet.core.diagnose.Waves;
import turnsheet.core.diagnose.mains.MainsMeter;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;

/** A public waveform: pulses of a shaft that runs up from 10 to 50 Hz, 1000 samples a second. */
class SensorCorpusTest {

  private static final CaptureFormats FORMATS = CaptureFormats.standard();
  private static final ReadOptions OPTIONS = ReadOptions.none().withChannel(1);
  private static final MeasureSettings SWEEP = MeasureSettings.tachometer(30, null);

  @Test
  void aSweepIsJudgedByItsShapeAndIsNoSteadyTone() throws Exception {
    SensorHealth health =
        new HealthMeter(new Measurement(FORMATS), sweep(), "ab", OPTIONS, SWEEP)
            .judge(Progress.NONE);

    // its levels are 0 and 1; pulses where the sine exceeds 0.9: acos 0.9 / pi of the period
    assertThat(health.low()).isZero();
    assertThat(health.high()).isEqualTo(1);
    assertThat(health.hysteresis().widestPercent()).isCloseTo(100, within(0.1));
    // a step within one sample is the recorder's, and is said to be
    assertThat(health.riseMicroseconds().value()).isNull();
    assertThat(health.readings()).isNull();
    assertThat(Objects.requireNonNull(health.refusal()).code()).isIn("noTone", "otherTone");
  }

  @Test
  void aSweepHoldsNoMains() {
    assertThatThrownBy(
            () ->
                new MainsMeter(SWEEP, Waves.reading(SWEEP, 10))
                    .measure(() -> FORMATS.openSamples(sweep(), OPTIONS), Progress.NONE))
        .isInstanceOf(RejectedException.class);
  }

  private static ByteSource sweep() throws IOException {
    String folder = System.getProperty("turnsheet.corpus", "");
    Path file = Path.of(folder, "ref-tacho-sweep/test_input.csv");
    assumeTrue(
        !folder.isEmpty() && Files.exists(file), "no public files: say where with -Dcorpus.dir");
    byte[] bytes = Files.readAllBytes(file);
    return new ByteSource() {
      @Override
      public InputStream open() {
        return new ByteArrayInputStream(bytes);
      }

      @Override
      public long length() {
        return bytes.length;
      }
    };
  }
}
