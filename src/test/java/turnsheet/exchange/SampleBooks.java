package turnsheet.exchange;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.sql.Types;
import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.List;
import java.util.UUID;
import javax.imageio.ImageIO;
import org.springframework.context.annotation.AnnotationConfigApplicationContext;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.jdbc.datasource.DataSourceTransactionManager;
import org.springframework.security.crypto.factory.PasswordEncoderFactories;
import org.springframework.security.crypto.password.PasswordEncoder;
import org.springframework.transaction.PlatformTransactionManager;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.access.Accounts;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.access.ShopProfiles;
import turnsheet.bench.ClockChecks;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.capture.Looked;
import turnsheet.capture.StoredBytes;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.document.CoreJson;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.report.Sheet;
import turnsheet.shop.Customers;
import turnsheet.shop.Instruments;
import turnsheet.shop.MachineModels;
import turnsheet.shop.Media;
import turnsheet.shop.Unit;
import turnsheet.shop.Units;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.testing.Database;

/** Books with something of every kind in them, and texts that are easily spoilt. */
final class SampleBooks {

  static final String ODD = "=1+1; \"quoted\", 'and'\r\nÄ µ \uD83C\uDF9B / </script> \\ \t end";

  /** One for all books; what lies in it is known by its digest. */
  static final CaptureStore STORE = ExportOn.store();

  private SampleBooks() {}

  /** The parts that an export and an import are made of, on a database. */
  static AnnotationConfigApplicationContext service(Database database) {
    return service(database, STORE);
  }

  static AnnotationConfigApplicationContext service(Database database, CaptureStore store) {
    AnnotationConfigApplicationContext context = new AnnotationConfigApplicationContext();
    context.registerBean(JdbcClient.class, database::jdbc);
    context.registerBean(
        PlatformTransactionManager.class,
        () -> new DataSourceTransactionManager(database.dataSource()));
    context.registerBean(TransactionTemplate.class, database::transactions);
    context.registerBean(Clock.class, Clock::systemUTC);
    context.registerBean(
        PasswordEncoder.class, PasswordEncoderFactories::createDelegatingPasswordEncoder);
    context.register(Books.class, FigureRows.class, Export.class, Import.class);
    context.registerBean(CaptureStore.class, () -> store);
    context.register(Pictures.class, ShopProfiles.class);
    context.register(Places.class, Checks.class, AuditTrail.class, CurrentUser.class);
    context.register(Accounts.class, ClockChecks.class, Captures.class, Readings.class);
    context.register(Customers.class, Instruments.class, Media.class, MachineModels.class);
    context.register(Units.class, Visits.class, Reports.class);
    context.refresh();
    return context;
  }

  /** Two units with a past; the visit returned is the open one of the first. */
  static SampleBench fill(Database database) {
    JdbcClient jdbc = database.jdbc();
    SampleBench bench = new SampleBench(jdbc, database.transactions(), Clock.systemUTC());
    UUID instrument = UUID.randomUUID();
    jdbc.sql("insert into bench_instrument values (?, ?, 12.5, 0.30000000000000004, ?, '')")
        .params(instrument, "Sound card " + ODD, LocalDate.of(2026, 2, 28))
        .update();
    UUID medium = UUID.randomUUID();
    jdbc.sql("insert into reference_medium values (?, 'Test tape', null, 0.1, 1e-7, ?)")
        .params(medium, ODD)
        .update();
    clockCheck(jdbc, instrument);
    Unit second = bench.anotherUnit("0043 " + ODD);
    VisitId past = bench.pastVisit(second, Instant.parse("2024-05-06T07:08:09.123456Z"));
    jdbc.sql("update visit set sensor_replaced = true, sensor_note = ?, complaint = ? where id = ?")
        .params("optical, 64 slots", ODD, past.value())
        .update();
    jdbc.sql("insert into fitted_part values (?, 0, 'belt', 2), (?, 1, 'idler', null)")
        .params(past.value(), past.value())
        .update();
    Readings readings = new Readings(jdbc, database.transactions(), Clock.systemUTC());
    CaptureId capture = bench.capture("as received", "measured");
    measured(jdbc, capture, instrument, medium);
    readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());
    readings.add(capture, SampleReadings.tone(0.39, 2), SampleReadings.series());
    CaptureId old = bench.capture(past, "after repair", "measured", Instant.EPOCH);
    measured(jdbc, old, instrument, medium);
    readings.add(old, SampleReadings.tone(0.02), SampleReadings.series());
    bench.capture("after repair", "refused");
    jdbc.sql("insert into refused_channel values (?, 3, 'silent', 'The channel is silent.')")
        .param(capture.value())
        .update();
    shop(jdbc);
    photograph(jdbc, past);
    jdbc.sql("insert into left_out_capture values (?, ?, ?, 'A')")
        .params(old.value(), ODD, Instant.EPOCH.atOffset(ZoneOffset.UTC))
        .update();
    Report first = report(database, past, null);
    report(database, past, first.number());
    return bench;
  }

  /** The shop as its first run and its owner left it; the rules are there from the beginning. */
  static void shop(JdbcClient jdbc) {
    jdbc.sql("insert into shop_rules values (1, 'GUARDED', 10, 0.02)").update();
    jdbc.sql("insert into shop_profile values (1, ?, ?, 'IN_PER_S', 60, 'LETTER', 'de')")
        .params("Shop " + ODD, "1 Invented Lane\nNowhere")
        .update();
    jdbc.sql("insert into shop_logo values (1, 'image/png', ?)").param(picture("png")).update();
  }

  private static void photograph(JdbcClient jdbc, VisitId visit) {
    try {
      StoredBytes bytes = STORE.receive(new ByteArrayInputStream(picture("jpeg")));
      jdbc.sql("insert into plate_photo values (?, ?, ?, 8, 6, ?, 'B')")
          .params(
              visit.value(), bytes.sha256(), bytes.length(), Instant.EPOCH.atOffset(ZoneOffset.UTC))
          .update();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** 8 x 6 pixels. */
  static byte[] picture(String format) {
    try {
      ByteArrayOutputStream out = new ByteArrayOutputStream();
      ImageIO.write(new BufferedImage(8, 6, BufferedImage.TYPE_INT_RGB), format, out);
      return out.toByteArray();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static void measured(JdbcClient jdbc, CaptureId id, UUID instrument, UUID medium) {
    Looked looked =
        new Looked(
            ReadOptions.none(),
            new Recognised(
                "WAV, 16-bit PCM",
                Contents.WAVEFORM,
                48_000.0,
                192_000L,
                List.of(
                    new Recognised.Channel("left", null), new Recognised.Channel("right", null)),
                1,
                List.of(),
                List.of()),
            null);
    jdbc.sql(
            """
            update capture set instrument_id = ?, medium_id = ?, tone_method = 'replay',
              recognition = ?, choices = ? where id = ?
            """)
        .param(1, instrument)
        .param(2, medium)
        .param(3, CoreJson.toJson(looked))
        .param(
            4,
            CoreJson.toJson(new CaptureChoices(ReadOptions.none(), MeasureSettings.tone(3150))),
            Types.VARCHAR)
        .param(5, id.value())
        .update();
  }

  private static void clockCheck(JdbcClient jdbc, UUID instrument) {
    jdbc.sql(
            """
            insert into clock_check (id, instrument_id, made_at, made_by, source, reference_hz,
              reference_expanded_uncertainty_ppm, file_name, sha256, byte_length, format, kind,
              channel, sample_rate_hz, duration_seconds, method_version, measured_hz, recording_ppm,
              error_ppm, expanded_uncertainty_ppm, keeping_ppm, warnings)
            values (?, ?, ?, 'owner', 'frequency standard', 1000, 0.01, 'clock.wav', ?, 96044,
              'WAV, 16-bit PCM', 'TONE', 1, 48000, 60.5, '1', 999.9875, 0.02, 12.5, 0.3, 0.2,
              '[{"code":"shortCapture","message":"Record longer."}]')
            """)
        .params(
            UUID.randomUUID(),
            instrument,
            Instant.parse("2026-02-28T09:00:00.5Z").atOffset(ZoneOffset.UTC),
            "cd".repeat(32))
        .update();
  }

  private static Report report(
      Database database, VisitId visit, @org.jspecify.annotations.Nullable Long revises) {
    Instant at = Instant.parse("2026-03-02T10:00:00.000001Z");
    return new Reports(database.jdbc(), database.transactions())
        .add(
            visit,
            number ->
                new Report.Content(
                    new Issue(number, at, "en", "A4", "A", "B", ODD, "", revises, "misprint"),
                    new Sheet(
                        new Sheet.Letterhead("Shop", "", null),
                        new Sheet.Item(
                            "Model", "0043", "A. Customer", "", at, null, "", "", List.of(), ""),
                        new Sheet.Terms(DecisionRule.GUARDED, 10, 0.02),
                        List.of(),
                        List.of(),
                        List.of())),
            report -> report.contentJson().getBytes(StandardCharsets.UTF_8));
  }
}
