package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;

import com.zaxxer.hikari.HikariDataSource;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.UUID;
import org.flywaydb.core.Flyway;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;
import turnsheet.document.ReadingDocument;
import turnsheet.shop.InstrumentId;
import turnsheet.testing.Database;

/** Readings from before floors stood with the figures get theirs from their documents. */
class FloorMigrationTest {

  @ParameterizedTest
  @EnumSource(Database.class)
  void earlierReadingsGetTheirFloor(Database database) {
    try (HikariDataSource data = new HikariDataSource()) {
      data.setJdbcUrl(database.newUrl());
      data.setUsername(database.user());
      data.setPassword("");
      Flyway.configure().dataSource(data).target("3").load().migrate();
      JdbcClient jdbc = JdbcClient.create(data);
      UUID instrument = UUID.randomUUID();
      capture(jdbc, instrument);
      reading(jdbc, 2, SampleReadings.tone(0.37));
      reading(jdbc, 1, withFloor(SampleReadings.tone(0.1), Figure.of(1.5e-5, 1e-6)));
      reading(jdbc, 3, withFloor(SampleReadings.tone(0.2), Figure.absent("no noise found")));

      Flyway.configure().dataSource(data).load().migrate();

      assertThat(
              jdbc.sql("select amount from reading_figure where figure = ? order by amount")
                  .param(Floors.PATH)
                  .query(Double.class)
                  .list())
          .containsExactly(1.5e-5, 0.004);
      // the newest reading of a capture stands for it
      assertThat(new Floors(jdbc).ofInstrument(new InstrumentId(instrument))).isEmpty();
    }
  }

  private static Reading withFloor(Reading reading, Figure floor) {
    Reading.Signal signal = reading.signal();
    return new Reading(
        reading.source(),
        reading.method(),
        reading.speed(),
        reading.flutter(),
        reading.lines(),
        reading.edges(),
        new Reading.Signal(
            signal.snrDb(), signal.mains(), signal.clippedSamples(), signal.dropouts(), floor),
        reading.warnings());
  }

  private static void capture(JdbcClient jdbc, UUID instrument) {
    UUID id = new UUID(0, 1);
    var then = Instant.EPOCH.atOffset(ZoneOffset.UTC);
    jdbc.sql("insert into machine_model (id, name, note) values (?, 'Deck', '')")
        .param(id)
        .update();
    jdbc.sql(
            """
            insert into speed_setting (id, model_id, position, label, speed_unit, nominal_speed)
            values (?, ?, 1, '19', 'CM_PER_S', 19.05)
            """)
        .params(id, id)
        .update();
    jdbc.sql("insert into customer values (?, 'Somebody', '', ?)").params(id, then).update();
    jdbc.sql("insert into unit values (?, ?, ?, '1', '', ?)").params(id, id, id, then).update();
    jdbc.sql(
            "insert into visit (id, unit_id, opened_at, complaint, work_done)"
                + " values (?, ?, ?, '', '')")
        .params(id, id, then)
        .update();
    jdbc.sql("insert into bench_instrument values (?, 'Card', 0, null, null, '')")
        .param(instrument)
        .update();
    jdbc.sql(
            """
            insert into capture (id, visit_id, speed_setting_id, instrument_id, bench_condition,
              file_name, sha256, byte_length, received_at, received_by, state)
            values (?, ?, ?, ?, 'as received', 'a.wav', ?, 1, ?, 'somebody', 'measured')
            """)
        .params(id, id, id, instrument, "0".repeat(64), then)
        .update();
  }

  private static void reading(JdbcClient jdbc, int second, Reading reading) {
    jdbc.sql("insert into reading values (?, ?, '1', ?, ?, 1)")
        .params(
            UUID.randomUUID(),
            new UUID(0, 1),
            Instant.ofEpochSecond(second).atOffset(ZoneOffset.UTC),
            ReadingDocument.toJson(reading))
        .update();
  }
}
