package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static turnsheet.core.measure.TraceFiguresTest.value;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/** From the bytes of a file to a reading. */
class MeasurementTest {

  private static ByteSource wav() throws IOException {
    SpeedFunction speed = SpeedFunction.constant(0.0042).plusLine(6.3, 0.08, 0);
    double[] tone = SignalSynth.tone(speed, 3150, 44100, 12, 0.5, 60, 2);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    WavWriter.write(out, 44100, 16, new double[tone.length], tone);
    byte[] bytes = out.toByteArray();
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

  private static Outcome measure(ByteSource source, int channel, Progress progress)
      throws IOException {
    return new Measurement(CaptureFormats.standard())
        .measure(
            source,
            "0".repeat(64),
            ReadOptions.none(),
            MeasureSettings.tone(3150).onChannel(channel),
            progress);
  }

  @Test
  void measuresTheChosenChannelOfAFile() throws IOException {
    List<Double> progress = new ArrayList<>();
    Outcome outcome = measure(wav(), 2, progress::add);
    assertThat(outcome).isInstanceOf(Outcome.Measured.class);
    Reading reading = ((Outcome.Measured) outcome).reading();
    // 16 bits lie 98 dB below full scale: the added noise at 60 dB decides
    assertThat(value(reading.speed().deviationPercent())).isCloseTo(0.42, within(0.001));
    assertThat(reading.source().channel()).isEqualTo(2);
    assertThat(reading.source().sampleRateHz()).isEqualTo(44100.0);
    assertThat(reading.source().durationSeconds()).isCloseTo(12, within(1e-9));
    assertThat(reading.method().version()).isEqualTo(Measurement.METHOD_VERSION);
    assertThat(progress).isSorted().hasSizeGreaterThan(1).last().isEqualTo(1.0);
  }

  @Test
  void silentChannelIsRefused() throws IOException {
    Outcome outcome = measure(wav(), 1, Progress.NONE);
    assertThat(outcome).isInstanceOf(Outcome.Refused.class);
    assertThat(((Outcome.Refused) outcome).rejection().code()).isEqualTo("silent");
  }

  @Test
  void sameBytesGiveTheSameBits() throws IOException {
    assertThat(((Outcome.Measured) measure(wav(), 2, Progress.NONE)).reading())
        .isEqualTo(((Outcome.Measured) measure(wav(), 2, Progress.NONE)).reading());
  }
}
