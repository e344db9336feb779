package turnsheet.exchange;

import java.nio.charset.StandardCharsets;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.Base64;
import java.util.Objects;
import java.util.UUID;
import org.jspecify.annotations.Nullable;

/** What a member holds, in a column and in the document. */
enum MemberType {
  /** an id: 36 characters, lower case */
  ID(Types.OTHER, "an id"),
  TEXT(Types.VARCHAR, "a text"),
  /** a text whose bytes the column keeps in UTF-8 */
  CONTENT(Types.BINARY, "a text"),
  WHOLE(Types.BIGINT, "a whole number"),
  DECIMAL(Types.DOUBLE, "a number"),
  FLAG(Types.BOOLEAN, "true or false"),
  /** an instant, ISO 8601 in UTC, to the microsecond */
  TIME(Types.TIMESTAMP_WITH_TIMEZONE, "an instant in UTC"),
  /** a day, ISO 8601 */
  DAY(Types.DATE, "a day"),
  /** JSON within the document, text in the column */
  DOCUMENT(Types.VARCHAR, "an object or a list"),
  /** bytes in the column, base 64 (RFC 4648, with padding) in the document and between the two */
  BYTES(Types.BINARY, "bytes in base 64"),
  /** the same, but of a file of the store and in no column */
  STORED(Types.NULL, "bytes in base 64");

  private final int sqlType;
  private final String words;

  MemberType(int sqlType, String words) {
    this.sqlType = sqlType;
    this.words = words;
  }

  int sqlType() {
    return sqlType;
  }

  /** What it is, for people. */
  String words() {
    return words;
  }

  @Nullable Object fromRow(ResultSet row, String column) throws SQLException {
    Object value =
        switch (this) {
          case ID -> row.getObject(column, UUID.class);
          case TEXT, DOCUMENT -> row.getString(column);
          case CONTENT, BYTES -> row.getBytes(column);
          case STORED -> throw new IllegalStateException("no column holds " + column);
          case WHOLE -> row.getLong(column);
          case DECIMAL -> row.getDouble(column);
          case FLAG -> row.getBoolean(column);
          case TIME -> row.getObject(column, OffsetDateTime.class);
          case DAY -> row.getObject(column, LocalDate.class);
        };
    if (value == null || row.wasNull()) {
      return null;
    }
    return switch (this) {
      case CONTENT -> new String((byte[]) value, StandardCharsets.UTF_8);
      case BYTES -> Base64.getEncoder().encodeToString((byte[]) value);
      case TIME -> ((OffsetDateTime) value).toInstant();
      case DOCUMENT -> JsonTree.canonical((String) value);
      default -> value;
    };
  }

  Object toColumn(Object value) {
    return switch (this) {
      case CONTENT -> ((String) value).getBytes(StandardCharsets.UTF_8);
      case BYTES -> Base64.getDecoder().decode((String) value);
      case TIME -> ((Instant) value).atOffset(ZoneOffset.UTC);
      default -> value;
    };
  }

  /** The value as it stands in the document. */
  Object toJson(Object value) {
    return switch (this) {
      case WHOLE, DECIMAL -> new JsonTree.Num(value.toString());
      case FLAG -> value;
      case DOCUMENT -> Objects.requireNonNull(JsonTree.parse((String) value));
      default -> value.toString();
    };
  }

  /**
   * Reads what stands in a document.
   *
   * @throws IllegalArgumentException if it is something else
   */
  Object fromJson(Object json) {
    try {
      return switch (this) {
        case ID -> id((String) json);
        case TEXT, CONTENT -> text((String) json);
        case WHOLE -> Long.valueOf(((JsonTree.Num) json).digits());
        case DECIMAL -> finite(Double.parseDouble(((JsonTree.Num) json).digits()));
        case FLAG -> (Boolean) json;
        case TIME -> instant((String) json);
        case DAY -> LocalDate.parse((String) json);
        case DOCUMENT -> document(json);
        case BYTES, STORED -> base64((String) json);
      };
    } catch (ClassCastException | DateTimeException e) {
      throw new IllegalArgumentException("not " + words, e);
    }
  }

  private static UUID id(String text) {
    UUID id = UUID.fromString(text);
    if (!id.toString().equals(text)) {
      throw new IllegalArgumentException("not an id");
    }
    return id;
  }

  /** PostgreSQL keeps no NUL, and half a character cannot be written in UTF-8. */
  private static String text(String text) {
    if (text.indexOf(0) >= 0 || !StandardCharsets.UTF_8.newEncoder().canEncode(text)) {
      throw new IllegalArgumentException("characters that no text has");
    }
    return text;
  }

  private static Double finite(double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException("too large a number");
    }
    return value;
  }

  /** Years of four digits: what the service itself ever wrote, and every column takes. */
  private static Instant instant(String text) {
    Instant instant = Instant.parse(text).truncatedTo(ChronoUnit.MICROS);
    int year = instant.atOffset(ZoneOffset.UTC).getYear();
    if (year < 1000 || year > 9999) {
      throw new IllegalArgumentException("a time in the year " + year);
    }
    return instant;
  }

  private static String base64(String text) {
    if (!Base64.getEncoder().encodeToString(Base64.getDecoder().decode(text)).equals(text)) {
      throw new IllegalArgumentException("not as an export writes it");
    }
    return text;
  }

  private static String document(Object json) {
    if (!(json instanceof java.util.Map) && !(json instanceof java.util.List)) {
      throw new IllegalArgumentException("not an object or a list");
    }
    return JsonTree.write(json);
  }
}
