package turnsheet.reading;

import static java.util.Objects.requireNonNull;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.time.Clock;
import java.time.Duration;
import java.util.List;
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
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.ChannelMeasurement;
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
  @Autowired CaptureChannels channels;

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

  @Test
  void bothChannelsOfAStereoRecordingAreKept() throws Exception {
    CaptureId id = confirm(stereoWav(tone(0.0037, 7), tone(0.0012, 8)));
    assertThat(settled(id)).isEqualTo(CaptureState.MEASURED);

    List<ChannelStanding> standings = channels.of(id);
    assertThat(standings).extracting(ChannelStanding::main).containsExactly(true, false);
    assertThat(standings)
        .extracting(s -> requireNonNull(s.reading()).reading().source().channel())
        .containsExactly(1, 2);
    // closed form; 0.001 percentage points is the bar for clean synthetic captures
    assertThat(deviation(standings.get(0))).isCloseTo(0.37, within(0.001));
    assertThat(deviation(standings.get(1))).isCloseTo(0.12, within(0.001));
    assertThat(jobs.ofSubject(id.value())).hasSize(1);

    // the other channel stands for the recording without another job
    ReadingId second = requireNonNull(standings.get(1).reading()).id();
    Capture chosen =
        intake.confirm(id, new Wish(null, null, null, null, ReadOptions.none().withChannel(2)));
    assertThat(chosen.state()).isEqualTo(CaptureState.MEASURED);
    assertThat(readings.newestOf(id)).map(StoredReading::id).hasValue(second);
    assertThat(jobs.ofSubject(id.value())).hasSize(1);
    assertThat(readings.versionsOf(id)).hasSize(2);

    // another nominal rate is another measurement
    Capture again =
        intake.confirm(id, new Wish(null, 3149.0, null, null, ReadOptions.none().withChannel(1)));
    assertThat(again.state()).isEqualTo(CaptureState.QUEUED);
    assertThat(settled(id)).isEqualTo(CaptureState.MEASURED);
    assertThat(readings.versionsOf(id)).hasSize(4);
  }

  @Test
  void aSilentChannelIsToldAndIsNoFailure() throws Exception {
    double[] silence = new double[12 * RATE_HERTZ];
    CaptureId id = confirm(stereoWav(tone(0.0037, 7), silence));
    assertThat(settled(id)).isEqualTo(CaptureState.MEASURED);

    assertThat(readings.newestOf(id).orElseThrow().reading().source().channel()).isEqualTo(1);
    assertThat(channels.of(id))
        .extracting(s -> s.refusal() == null ? "measured" : s.refusal().code())
        .containsExactly("measured", "silent");
  }

  @Test
  void whereTheMainChannelIsSilentTheOtherStandsForTheRecordingAndSaysSo() throws Exception {
    double[] silence = new double[12 * RATE_HERTZ];
    CaptureId id = confirm(stereoWav(silence, tone(0.0037, 7)));
    assertThat(settled(id)).isEqualTo(CaptureState.MEASURED);

    assertThat(readings.newestOf(id).orElseThrow().reading().source().channel()).isEqualTo(2);
    Capture capture = captures.find(id).orElseThrow();
    assertThat(requireNonNull(capture.choices()).settings().channel()).isEqualTo(2);
    assertThat(requireNonNull(capture.looked()).recognised().channel()).isEqualTo(2);
    assertThat(requireNonNull(capture.looked()).recognised().guesses())
        .filteredOn(g -> g.subject().equals("channel"))
        .singleElement()
        .satisfies(
            g ->
                assertThat(g.taken())
                    .startsWith("channel 2, as channel 1 could not be measured (The "));
  }

  @Test
  void whereNoChannelHasASignalTheRecordingIsRefused() throws Exception {
    CaptureId id = confirm(stereoWav(new double[12 * RATE_HERTZ], new double[12 * RATE_HERTZ]));
    assertThat(settled(id)).isEqualTo(CaptureState.REFUSED);
    assertThat(requireNonNull(captures.find(id).orElseThrow().refusal()).code())
        .isEqualTo("silent");
    assertThat(readings.versionsOf(id)).isEmpty();
  }

  @Test
  void progressNamesEachChannel() {
    assertThat(
            ChannelWords.each(
                List.of(
                    new ChannelMeasurement.Share(2, 0.415), new ChannelMeasurement.Share(1, 1))))
        .isEqualTo("Is being measured, channel 2: 41 %, channel 1: 100 %.");
  }

  private static double deviation(ChannelStanding standing) {
    Double value = requireNonNull(standing.reading()).reading().speed().deviationPercent().value();
    return requireNonNull(value);
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

  private static double[] tone(double deviation, long seed) {
    return SignalSynth.tone(SpeedFunction.constant(deviation), 3150, RATE_HERTZ, 12, 0.5, 60, seed);
  }

  private static byte[] stereoWav(double[] left, double[] right) throws Exception {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    WavWriter.write(out, RATE_HERTZ, 24, left, right);
    return out.toByteArray();
  }

  private static byte[] toneWav(SpeedFunction speed) throws Exception {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    // noise 60 dB down moves the mean far less than the bar of the first test
    WavWriter.write(out, RATE_HERTZ, 24, SignalSynth.tone(speed, 3150, RATE_HERTZ, 12, 0.5, 60, 7));
    return out.toByteArray();
  }
}
