package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.time.Clock;
import java.time.Duration;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.capture.Wish;
import turnsheet.core.measure.Reading;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;
import turnsheet.job.JobState;
import turnsheet.job.Jobs;
import turnsheet.testing.ServiceTest;

/** From the uploaded bytes to the stored reading, through the real job table and engine. */
@ServiceTest
@Timeout(value = 2, unit = TimeUnit.MINUTES)
class MeasureJobTest {

  private static final int RATE_HERTZ = 16_000;

  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Intake intake;
  @Autowired Captures captures;
  @Autowired Jobs jobs;
  @Autowired Readings readings;

  private SampleBench bench;

  @BeforeEach
  void open() {
    bench = new SampleBench(jdbc, transactions, clock);
  }

  @Test
  void confirmedToneBecomesAReadingWithSuspects() throws Exception {
    // the capstan shaft turns 10.0 times a second at nominal speed, 10.037 at +0.37 %
    CaptureId id = confirm(toneWav(SpeedFunction.constant(0.0037).plusLine(10.037, 0.1, 0)));

    assertThat(settled(id)).isEqualTo(CaptureState.MEASURED);
    Reading reading = readings.newestOf(id).orElseThrow().reading();
    Double deviation = reading.speed().deviationPercent().value();
    // closed form; 0.001 percentage points is the bar for clean synthetic captures
    assertThat(deviation).isNotNull().isCloseTo(0.37, within(0.001));
    assertThat(reading.lines().get(0).suspects())
        .extracting(Reading.Suspect::part)
        .contains("capstan shaft");
    assertThat(readings.curve(readings.newestOf(id).orElseThrow().id(), SeriesName.TRACE))
        .isPresent();
  }

  @Test
  void jobRunTwiceLeavesOneReading() throws Exception {
    CaptureId id = confirm(toneWav(SpeedFunction.constant(0.001)));
    assertThat(settled(id)).isEqualTo(CaptureState.MEASURED);

    // as after a process killed between the commit and the end of the job
    jdbc.sql("update capture set state = 'queued' where id = ?").param(id.value()).update();
    transactions.executeWithoutResult(status -> jobs.enqueue(Intake.MEASURE, id.value()));
    assertThat(settled(id)).isEqualTo(CaptureState.MEASURED);
    assertThat(readings.versionsOf(id)).hasSize(1);

    // a job for a capture that waits for nothing does nothing
    transactions.executeWithoutResult(status -> jobs.enqueue(Intake.MEASURE, id.value()));
    await(() -> jobs.ofSubject(id.value()).stream().allMatch(j -> j.state() == JobState.DONE));
    assertThat(readings.versionsOf(id)).hasSize(1);
  }

  private CaptureId confirm(byte[] wav) throws Exception {
    Capture capture =
        intake.receive(
            new CaptureKey(bench.visit.id(), bench.setting, "as received", null, null),
            "tone.wav",
            "technician",
            new ByteArrayInputStream(wav));
    assertThat(capture.state()).as("%s", capture.refusal()).isEqualTo(CaptureState.RECOGNISED);
    return intake.confirm(capture.id(), Wish.none()).id();
  }

  private CaptureState settled(CaptureId id) {
    await(() -> captures.find(id).orElseThrow().state() != CaptureState.QUEUED);
    return captures.find(id).orElseThrow().state();
  }

  private static void await(java.util.function.BooleanSupplier reached) {
    while (!reached.getAsBoolean()) {
      LockSupport.parkNanos(Duration.ofMillis(50).toNanos());
    }
  }

  private static byte[] toneWav(SpeedFunction speed) throws Exception {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    // noise 60 dB down moves the mean far less than the bar of the first test
    WavWriter.write(out, RATE_HERTZ, 24, SignalSynth.tone(speed, 3150, RATE_HERTZ, 12, 0.5, 60, 7));
    return out.toByteArray();
  }
}
