package turnsheet.reading;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.UUID;
import turnsheet.shop.SpeedSettingId;

/**
 * The reading that stands for one capture of a visit, with the place it has in the visit.
 *
 * @param condition {@code as received}, {@code after repair} or a free label
 * @param receivedAt when the capture was uploaded
 */
public record VisitReading(
    SpeedSettingId settingId,
    String condition,
    String fileName,
    Instant receivedAt,
    StoredReading stored) {

  static VisitReading of(ResultSet row, int number) throws SQLException {
    return new VisitReading(
        new SpeedSettingId(row.getObject("speed_setting_id", UUID.class)),
        row.getString("bench_condition"),
        row.getString("file_name"),
        row.getObject("received_at", OffsetDateTime.class).toInstant(),
        Readings.stored(row, number));
  }
}
