package turnsheet.pair;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import turnsheet.access.Secrets;
import turnsheet.capture.CaptureId;
import turnsheet.document.CoreJson;

/** All comparisons of sensors, and the links that open them: of a token only a hash is kept. */
@Repository
public class PairStore {

  private static final int TOKEN_BYTES = 32;

  private final JdbcClient jdbc;
  private final Clock clock;

  public PairStore(JdbcClient jdbc, Clock clock) {
    this.jdbc = jdbc;
    this.clock = clock;
  }

  /** Keeps an order. */
  public UUID add(PairOrder order, String madeBy) {
    UUID id = UUID.randomUUID();
    jdbc.sql(
            """
            insert into sensor_pair (id, capture_id, made_at, made_by, ordered)
            values (?, ?, ?, ?, ?)
            """)
        .params(id, order.original().capture(), at(now()), madeBy, CoreJson.toJson(order))
        .update();
    return id;
  }

  /** Keeps what came of an order; a sheet that is there already stays. */
  public void finish(UUID id, PairSheet sheet) {
    jdbc.sql("update sensor_pair set document = ? where id = ? and document is null")
        .params(sheet.toJson(), id)
        .update();
  }

  public Optional<StoredPair> find(UUID id) {
    return jdbc.sql("select * from sensor_pair where id = ?")
        .param(id)
        .query(PairStore::stored)
        .optional();
  }

  /** Those whose original stands in a capture, the newest first. */
  public List<StoredPair> ofCapture(CaptureId capture) {
    return jdbc.sql("select * from sensor_pair where capture_id = ? order by made_at desc, id")
        .param(capture.value())
        .query(PairStore::stored)
        .list();
  }

  /** Makes a link; its token is told once. */
  public String share(UUID id, String madeBy, int days) {
    String token = Secrets.random(TOKEN_BYTES);
    jdbc.sql(
            """
            insert into sensor_pair_link (token_sha256, pair_id, created_at, created_by, expires_at)
            values (?, ?, ?, ?, ?)
            """)
        .params(Secrets.sha256(token), id, at(now()), madeBy, at(now().plus(Duration.ofDays(days))))
        .update();
    return token;
  }

  /** What a token opens now. */
  public Optional<StoredPair> shared(String token) {
    return jdbc.sql(
            """
            select p.* from sensor_pair p join sensor_pair_link l on l.pair_id = p.id
            where l.token_sha256 = ? and l.withdrawn_at is null and l.expires_at > ?
            """)
        .params(Secrets.sha256(token), at(now()))
        .query(PairStore::stored)
        .optional();
  }

  /** How many links open a comparison now. */
  public int openLinks(UUID id) {
    return jdbc.sql(
            """
            select count(*) from sensor_pair_link
            where pair_id = ? and withdrawn_at is null and expires_at > ?
            """)
        .params(id, at(now()))
        .query(Integer.class)
        .single();
  }

  /** Ends all links to a comparison now. */
  public void withdraw(UUID id) {
    jdbc.sql(
            "update sensor_pair_link set withdrawn_at = ? where pair_id = ? and withdrawn_at is null")
        .params(at(now()), id)
        .update();
  }

  private Instant now() {
    return clock.instant().truncatedTo(ChronoUnit.MICROS);
  }

  private static OffsetDateTime at(Instant instant) {
    return instant.atOffset(ZoneOffset.UTC);
  }

  private static StoredPair stored(ResultSet row, int number) throws SQLException {
    String document = row.getString("document");
    return new StoredPair(
        row.getObject("id", UUID.class),
        new CaptureId(row.getObject("capture_id", UUID.class)),
        row.getObject("made_at", OffsetDateTime.class).toInstant(),
        row.getString("made_by"),
        CoreJson.fromJson(row.getString("ordered"), PairOrder.class),
        document == null ? null : PairSheet.fromJson(document));
  }
}
