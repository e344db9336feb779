package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;

import com.zaxxer.hikari.HikariDataSource;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.UUID;
import org.flywaydb.core.Flyway;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.capture.CaptureChoices;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.document.CoreJson;
import turnsheet.document.ReadingDocument;
import turnsheet.testing.Database;

/** Captures and readings from before channels were kept beside each other learn theirs. */
class ChannelMigrationTest {

  @ParameterizedTest
  @EnumSource(Database.class)
  void earlierRowsLearnTheirChannel(Database database) {
    try (HikariDataSource data = new HikariDataSource()) {
      data.setJdbcUrl(database.newUrl());
      data.setUsername(database.user());
      data.setPassword("");
      Flyway.configure().dataSource(data).target("2").load().migrate();
      JdbcClient jdbc = JdbcClient.create(data);
      UUID measured = capture(jdbc, CoreJson.toJson(choices(12)));
      UUID waiting = capture(jdbc, null);
      reading(jdbc, measured, ReadingDocument.toJson(SampleReadings.tone(0.37, 12)));
      reading(jdbc, measured, ReadingDocument.toJson(SampleReadings.tone(0.37, 1)));

      Flyway.configure().dataSource(data).load().migrate();

      assertThat(channelOf(jdbc, measured)).isEqualTo(12);
      assertThat(channelOf(jdbc, waiting)).isEqualTo(1);
      assertThat(
              jdbc.sql("select channel from reading order by channel").query(Integer.class).list())
          .containsExactly(1, 12);
    }
  }

  private static CaptureChoices choices(int channel) {
    return new CaptureChoices(ReadOptions.none(), MeasureSettings.tone(3150)).onChannel(channel);
  }

  private static int channelOf(JdbcClient jdbc, UUID capture) {
    return jdbc.sql("select main_channel from capture where id = ?")
        .param(capture)
        .query(Integer.class)
        .single();
  }

  private static UUID capture(JdbcClient jdbc, @Nullable String choices) {
    UUID model = UUID.randomUUID();
    jdbc.sql("insert into machine_model (id, name, note) values (?, ?, '')")
        .params(model, model.toString())
        .update();
    UUID setting = UUID.randomUUID();
    jdbc.sql(
            """
            insert into speed_setting (id, model_id, position, label, speed_unit, nominal_speed)
            values (?, ?, 1, '19', 'CM_PER_S', 19.05)
            """)
        .params(setting, model)
        .update();
    UUID customer = UUID.randomUUID();
    jdbc.sql("insert into customer values (?, 'Somebody', '', ?)")
        .params(customer, Instant.EPOCH.atOffset(ZoneOffset.UTC))
        .update();
    UUID unit = UUID.randomUUID();
    jdbc.sql("insert into unit values (?, ?, ?, '1', '', ?)")
        .params(unit, model, customer, Instant.EPOCH.atOffset(ZoneOffset.UTC))
        .update();
    UUID visit = UUID.randomUUID();
    jdbc.sql(
            "insert into visit (id, unit_id, opened_at, complaint, work_done)"
                + " values (?, ?, ?, '', '')")
        .params(visit, unit, Instant.EPOCH.atOffset(ZoneOffset.UTC))
        .update();
    UUID capture = UUID.randomUUID();
    jdbc.sql(
            """
            insert into capture (id, visit_id, speed_setting_id, bench_condition, file_name, sha256,
              byte_length, received_at, received_by, state, choices)
            values (?, ?, ?, 'as received', 'a.wav', ?, 1, ?, 'somebody', 'measured', ?)
            """)
        .param(1, capture)
        .param(2, visit)
        .param(3, setting)
        .param(4, "0".repeat(64))
        .param(5, Instant.EPOCH.atOffset(ZoneOffset.UTC))
        .param(6, choices, java.sql.Types.VARCHAR)
        .update();
    return capture;
  }

  private static void reading(JdbcClient jdbc, UUID capture, String document) {
    jdbc.sql("insert into reading values (?, ?, '1', ?, ?)")
        .params(UUID.randomUUID(), capture, Instant.EPOCH.atOffset(ZoneOffset.UTC), document)
        .update();
  }
}
