package turnsheet.demo;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.bench.ClockChecking;
import turnsheet.bench.ClockQuestion;
import turnsheet.bench.KeptFile;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Intake;
import turnsheet.capture.Wish;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MediumId;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.Unit;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;

/** Opens visits in the past and uploads the samples to them, the way of every upload. */
@Component
class DemoBench {

  private static final String BROUGHT_BY = "demo";

  /** What the clock of the invented sound card shows. */
  private static final double CLOCK_PPM = 1.8;

  private final Intake intake;
  private final ClockChecking clocks;
  private final JdbcClient jdbc;
  private final TransactionOperations transactions;
  private final Clock clock;

  DemoBench(
      Intake intake,
      ClockChecking clocks,
      JdbcClient jdbc,
      TransactionOperations transactions,
      Clock clock) {
    this.intake = intake;
    this.clocks = clocks;
    this.jdbc = jdbc;
    this.transactions = transactions;
    this.clock = clock;
  }

  Instant daysAgo(int days) {
    return clock.instant().minus(Duration.ofDays(days));
  }

  VisitId visit(Unit unit, int daysAgo, String complaint, String work) {
    Visits then = visitsAt(daysAgo);
    VisitId opened = then.open(unit.id(), complaint).id();
    then.recordWork(opened, complaint, work);
    return opened;
  }

  void handBack(VisitId visit, int daysAgo) {
    visitsAt(daysAgo).close(visit);
  }

  /** Uploads a sample and confirms it as its truth says; it is measured when its turn comes. */
  void upload(VisitId visit, Setup setup, String condition, String fileName, int daysAgo) {
    SampleUpload sample =
        SampleUploads.all().stream()
            .filter(s -> s.fileName().equals(fileName))
            .findFirst()
            .orElseThrow();
    Capture received = receive(setup.key(visit, condition), fileName, sample.bytes());
    if (received.state() == CaptureState.RECOGNISED) {
      intake.confirm(
          received.id(),
          new Wish(sample.kind(), sample.nominalHz(), null, null, ReadOptions.none()));
    }
    jdbc.sql("update capture set received_at = ? where id = ?")
        .params(daysAgo(daysAgo).atOffset(ZoneOffset.UTC), received.id().value())
        .update();
  }

  void refusedUpload(VisitId visit, Setup setup) {
    receive(
        setup.key(visit, CaptureKey.AS_RECEIVED),
        RefusedUploads.RENAMED_ZIP,
        RefusedUploads.bytes(RefusedUploads.RENAMED_ZIP));
  }

  /**
   * Checks a clock by half a minute of a true 1000 Hz; whether to take it is left to the visitor.
   */
  void checkClock(InstrumentId instrument) {
    int rate = 8000;
    double[] tone =
        SignalSynth.tone(
            SpeedFunction.constant(0), 1000, rate * (1 + CLOCK_PPM * 1e-6), 30, 0.3, 50, 1);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try {
      WavWriter.write(out, rate, 16, tone);
      KeptFile file = clocks.keep("kilohertz.wav", new ByteArrayInputStream(out.toByteArray()));
      clocks.check(
          instrument,
          new ClockQuestion(
              "Invented reference oscillator",
              new ClockError.Reference(1000, 0.05),
              1,
              CaptureKind.TONE,
              null),
          file,
          BROUGHT_BY);
    } catch (IOException e) {
      throw new UncheckedIOException("the demo cannot be stored", e);
    }
  }

  private Visits visitsAt(int daysAgo) {
    return new Visits(jdbc, transactions, Clock.fixed(daysAgo(daysAgo), ZoneOffset.UTC));
  }

  private Capture receive(CaptureKey key, String fileName, byte[] bytes) {
    try {
      return intake.receive(key, fileName, BROUGHT_BY, new ByteArrayInputStream(bytes));
    } catch (IOException e) {
      throw new UncheckedIOException("the demo cannot be stored", e);
    }
  }

  /** How one recording is made. */
  record Setup(
      MachineModel model, String settingLabel, InstrumentId instrument, @Nullable MediumId medium) {

    CaptureKey key(VisitId visit, String condition) {
      SpeedSetting setting =
          model.settings().stream()
              .filter(s -> s.label().equals(settingLabel))
              .findFirst()
              .orElseThrow();
      return new CaptureKey(visit, setting.id(), condition, instrument, medium);
    }
  }
}
