package turnsheet.bench;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import turnsheet.capture.StoredBytes;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;
import turnsheet.core.signal.Warning;
import turnsheet.document.CoreJson;
import turnsheet.shop.InstrumentId;

/** All checks of clocks. Checks are added and once taken, never changed otherwise. */
@Repository
public class ClockChecks {

  private static final int LONGEST_WARNINGS = 20_000;

  private final JdbcClient jdbc;

  ClockChecks(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  public Optional<ClockCheck> find(ClockCheckId id) {
    return jdbc.sql("select * from clock_check where id = ?")
        .param(id.value())
        .query(ClockChecks::check)
        .optional();
  }

  /** All checks of an instrument, the newest first. */
  public List<ClockCheck> ofInstrument(InstrumentId instrument) {
    return jdbc.sql("select * from clock_check where instrument_id = ? order by made_at desc, id")
        .param(instrument.value())
        .query(ClockChecks::check)
        .list();
  }

  void add(ClockCheck check) {
    jdbc.sql(
            """
            insert into clock_check (id, instrument_id, made_at, made_by, source, reference_hz,
              reference_expanded_uncertainty_ppm, file_name, sha256, byte_length, format, kind,
              channel, sample_rate_hz, duration_seconds, method_version, measured_hz, recording_ppm,
              error_ppm, expanded_uncertainty_ppm, keeping_ppm, warnings)
            values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)
            """)
        .param(1, check.id().value())
        .param(2, check.instrument().value())
        .param(3, check.madeAt().atOffset(ZoneOffset.UTC))
        .param(4, check.madeBy())
        .param(5, check.against().source())
        .param(6, check.against().reference().hertz())
        .param(7, check.against().reference().expandedUncertaintyPpm())
        .param(8, check.recording().file().name())
        .param(9, check.recording().file().bytes().sha256())
        .param(10, check.recording().file().bytes().length())
        .param(11, check.recording().format())
        .param(12, check.recording().kind().name())
        .param(13, check.recording().channel())
        .param(14, check.recording().sampleRateHz(), Types.DOUBLE)
        .param(15, check.recording().durationSeconds())
        .param(16, check.found().methodVersion())
        .param(17, check.found().measuredHz())
        .param(18, check.found().recordingPpm())
        .param(19, check.found().errorPpm())
        .param(20, check.found().expandedUncertaintyPpm())
        .param(21, check.found().keepingPpm())
        .param(22, json(check.found().warnings()))
        .update();
  }

  /** Notes that a check went into the record; false where it had before, and nothing changes. */
  boolean take(ClockCheckId id, ClockCheck.Taken taken) {
    return jdbc.sql(
                """
                update clock_check set taken_at = ?, taken_by = ?, before_error_ppm = ?,
                  before_expanded_uncertainty_ppm = ?, before_checked_on = ?
                where id = ? and taken_at is null
                """)
            .param(1, taken.at().atOffset(ZoneOffset.UTC))
            .param(2, taken.by())
            .param(3, taken.before().errorPpm())
            .param(4, taken.before().expandedUncertaintyPpm(), Types.DOUBLE)
            .param(5, taken.before().checkedOn(), Types.DATE)
            .param(6, id.value())
            .update()
        == 1;
  }

  /** As many of them as the column holds; a file that gives more is told of by the first. */
  private static String json(List<Warning> warnings) {
    for (int count = warnings.size(); ; count--) {
      String json = CoreJson.toJson(warnings.subList(0, count));
      if (json.length() <= LONGEST_WARNINGS) {
        return json;
      }
    }
  }

  private static ClockCheck check(ResultSet row, int number) throws SQLException {
    return new ClockCheck(
        new ClockCheckId(row.getObject("id", UUID.class)),
        new InstrumentId(row.getObject("instrument_id", UUID.class)),
        row.getObject("made_at", OffsetDateTime.class).toInstant(),
        row.getString("made_by"),
        new ClockCheck.Against(
            row.getString("source"),
            new ClockError.Reference(
                row.getDouble("reference_hz"),
                row.getDouble("reference_expanded_uncertainty_ppm"))),
        new ClockCheck.Recording(
            new KeptFile(
                row.getString("file_name"),
                new StoredBytes(row.getString("sha256"), row.getLong("byte_length"))),
            row.getString("format"),
            CaptureKind.valueOf(row.getString("kind")),
            row.getInt("channel"),
            doubleOrNull(row, "sample_rate_hz"),
            row.getDouble("duration_seconds")),
        new ClockCheck.Found(
            row.getString("method_version"),
            row.getDouble("measured_hz"),
            row.getDouble("recording_ppm"),
            row.getDouble("error_ppm"),
            row.getDouble("expanded_uncertainty_ppm"),
            row.getDouble("keeping_ppm"),
            List.of(CoreJson.fromJson(row.getString("warnings"), Warning[].class))),
        taken(row));
  }

  private static ClockCheck.@Nullable Taken taken(ResultSet row) throws SQLException {
    OffsetDateTime at = row.getObject("taken_at", OffsetDateTime.class);
    if (at == null) {
      return null;
    }
    return new ClockCheck.Taken(
        at.toInstant(),
        row.getString("taken_by"),
        new ClockCheck.Before(
            row.getDouble("before_error_ppm"),
            doubleOrNull(row, "before_expanded_uncertainty_ppm"),
            row.getObject("before_checked_on", LocalDate.class)));
  }

  private static @Nullable Double doubleOrNull(ResultSet row, String column) throws SQLException {
    double value = row.getDouble(column);
    return row.wasNull() ? null : value;
  }
}
