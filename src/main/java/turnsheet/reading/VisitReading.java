package turnsheet.reading;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.ToneMethod;
import turnsheet.shop.SpeedSettingId;

/**
 * The reading that stands for one capture of a visit, with the place it has in the visit.
 *
 * @param condition {@code as received}, {@code after repair} or a free label
 * @param receivedAt when the capture was uploaded
 * @param instrument that recorded it; null where nobody said
 * @param medium that was played; null where nobody said
 * @param method how the tone came onto it; null for what was not played, or where nobody said
 * @param leftOut why sheets and reports leave the capture out; null where they do not
 */
public record VisitReading(
    SpeedSettingId settingId,
    String condition,
    String fileName,
    Instant receivedAt,
    @Nullable String instrument,
    @Nullable String medium,
    @Nullable ToneMethod method,
    @Nullable String leftOut,
    StoredReading stored) {

  static VisitReading of(ResultSet row, int number) throws SQLException {
    return new VisitReading(
        new SpeedSettingId(row.getObject("speed_setting_id", UUID.class)),
        row.getString("bench_condition"),
        row.getString("file_name"),
        row.getObject("received_at", OffsetDateTime.class).toInstant(),
        row.getString("instrument_name"),
        row.getString("medium_name"),
        CapturePlaces.method(row),
        row.getString("left_out"),
        Readings.stored(row, number));
  }
}
