package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.UUID;
import org.jspecify.annotations.Nullable;

/** Between columns and values, the same way on both databases. */
final class Columns {

  private Columns() {}

  static UUID uuid(ResultSet row, String column) throws SQLException {
    return row.getObject(column, UUID.class);
  }

  static Instant instant(ResultSet row, String column) throws SQLException {
    return row.getObject(column, OffsetDateTime.class).toInstant();
  }

  static @Nullable Instant instantOrNull(ResultSet row, String column) throws SQLException {
    OffsetDateTime time = row.getObject(column, OffsetDateTime.class);
    return time == null ? null : time.toInstant();
  }

  static @Nullable Double doubleOrNull(ResultSet row, String column) throws SQLException {
    double value = row.getDouble(column);
    return row.wasNull() ? null : value;
  }

  static @Nullable Integer intOrNull(ResultSet row, String column) throws SQLException {
    int value = row.getInt(column);
    return row.wasNull() ? null : value;
  }

  static @Nullable Long longOrNull(ResultSet row, String column) throws SQLException {
    long value = row.getLong(column);
    return row.wasNull() ? null : value;
  }

  static OffsetDateTime time(Instant instant) {
    return instant.atOffset(ZoneOffset.UTC);
  }

  /** Columns keep microseconds; what is kept in memory must be equal to what is read back. */
  static Instant kept(Instant instant) {
    return instant.truncatedTo(ChronoUnit.MICROS);
  }
}
