package turnsheet.capture;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.OffsetDateTime;
import java.util.UUID;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.Rejection;
import turnsheet.document.CoreJson;
import turnsheet.job.JobId;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.MediumId;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

/** Captures out of rows of their table. */
final class CaptureRows {

  private CaptureRows() {}

  static Capture capture(ResultSet row, int number) throws SQLException {
    String code = row.getString("refusal_code");
    String fit = row.getString("setting_proposal");
    return new Capture(
        new CaptureId(row.getObject("id", UUID.class)),
        key(row),
        fit == null ? null : SettingFit.ofWord(fit),
        row.getString("file_name"),
        new StoredBytes(row.getString("sha256"), row.getLong("byte_length")),
        row.getObject("received_at", OffsetDateTime.class).toInstant(),
        row.getString("received_by"),
        CaptureState.ofWord(row.getString("state")),
        json(row, "recognition", Looked.class),
        json(row, "choices", CaptureChoices.class),
        code == null ? null : new Rejection(code, row.getString("refusal_message")),
        id(row, "job_id", JobId::new));
  }

  private static CaptureKey key(ResultSet row) throws SQLException {
    return new CaptureKey(
        new VisitId(row.getObject("visit_id", UUID.class)),
        new SpeedSettingId(row.getObject("speed_setting_id", UUID.class)),
        row.getString("bench_condition"),
        id(row, "instrument_id", InstrumentId::new),
        id(row, "medium_id", MediumId::new),
        toneMethod(row));
  }

  private static @Nullable ToneMethod toneMethod(ResultSet row) throws SQLException {
    String word = row.getString("tone_method");
    return word == null ? null : ToneMethod.ofWord(word).orElse(null);
  }

  private static <T> @Nullable T id(ResultSet row, String column, Function<UUID, T> id)
      throws SQLException {
    UUID value = row.getObject(column, UUID.class);
    return value == null ? null : id.apply(value);
  }

  private static <T> @Nullable T json(ResultSet row, String column, Class<T> type)
      throws SQLException {
    String json = row.getString(column);
    return json == null ? null : CoreJson.fromJson(json, type);
  }
}
