package turnsheet.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.time.Duration;
import java.util.concurrent.locks.LockSupport;
import java.util.function.BooleanSupplier;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.capture.Wish;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;
import turnsheet.core.synth.WheelSynth;
import turnsheet.reading.SampleBench;

/** Captures that go the whole way from their bytes to a closer look. */
public final class LookedAt {

  /** Hum in the tone: a tenth of it at 50.02 Hz and a third of that at its third harmonic. */
  public static final double HUM_HERTZ = 50.02;

  private static final int RATE_HERTZ = 16_000;
  private static final double SECONDS = 20;

  private final SampleBench bench;
  private final Intake intake;
  private final Captures captures;
  private final Evidence evidence;

  public LookedAt(SampleBench bench, Intake intake, Captures captures, Evidence evidence) {
    this.bench = bench;
    this.intake = intake;
    this.captures = captures;
    this.evidence = evidence;
  }

  /** A test tone 0.12 % fast with hum. */
  public static byte[] tone() throws Exception {
    double[] samples =
        SignalSynth.tone(
            SpeedFunction.constant(0.0012).plusLine(4, 0.0005, 0),
            3150,
            RATE_HERTZ,
            SECONDS,
            0.5,
            60,
            7);
    return wav(withHum(samples, 0.05));
  }

  /** The waveform of a tachometer at 800 pulses per second, 0.12 % fast, with hum. */
  public static byte[] tachometer() throws Exception {
    double[] samples =
        SignalSynth.pulses(
            SpeedFunction.constant(0.0012).plusLine(4, 0.0005, 0),
            800,
            RATE_HERTZ,
            SECONDS,
            0.5,
            1.5,
            0.001,
            7);
    return wav(withHum(samples, 0.05));
  }

  /** The waveform of a wheel of 60 places, 2 of them without a tooth, and tooth 17 bent. */
  public static byte[] wheel() throws Exception {
    double[] rises =
        WheelSynth.uneven(60, 0.003, 4)
            .without(58, 59)
            .late(16, -0.1)
            .risingEdges(
                SpeedFunction.constant(0.0012).plusLine(4, 0.0005, 0), 800, SECONDS, 0, 0, 7);
    return wav(WheelSynth.waveform(rises, 1 / 800.0, RATE_HERTZ, SECONDS, 0.5, 0.001, 7));
  }

  /** Sends, confirms and waits for the measurement. */
  public CaptureId measured(byte[] wav) throws Exception {
    CaptureId id = intake.confirm(recognised(wav), Wish.none()).id();
    await(() -> captures.find(id).orElseThrow().state() != CaptureState.QUEUED);
    assertThat(captures.find(id).orElseThrow().state()).isEqualTo(CaptureState.MEASURED);
    return id;
  }

  /** Sends only. */
  public CaptureId recognised(byte[] wav) throws Exception {
    Capture capture =
        intake.receive(
            new CaptureKey(bench.visit.id(), bench.setting, "as received", null, null),
            "tacho.wav",
            "technician",
            new ByteArrayInputStream(wav));
    assertThat(capture.state()).as("%s", capture.refusal()).isEqualTo(CaptureState.RECOGNISED);
    return capture.id();
  }

  /** Waits until no closer look is under way. */
  public void awaitLook(CaptureId id) {
    await(() -> evidence.job(id).orElseThrow().state().isOver());
  }

  private static double[] withHum(double[] samples, double amplitude) {
    for (int i = 0; i < samples.length; i++) {
      double turns = HUM_HERTZ * i / RATE_HERTZ;
      samples[i] +=
          amplitude * (Math.sin(2 * Math.PI * turns) + Math.sin(6 * Math.PI * turns + 1) / 3);
    }
    return samples;
  }

  private static byte[] wav(double[] samples) throws Exception {
    var bytes = new ByteArrayOutputStream();
    WavWriter.write(bytes, RATE_HERTZ, 16, samples);
    return bytes.toByteArray();
  }

  /** Waits until that is so. */
  public static void await(BooleanSupplier reached) {
    while (!reached.getAsBoolean()) {
      LockSupport.parkNanos(Duration.ofMillis(30).toNanos());
    }
  }
}
