package turnsheet.share;

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
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.access.Secrets;
import turnsheet.shop.VisitId;

/**
 * The links that open reports without an account: 256 random bits, of which only a hash is kept.
 */
@Component
public final class ShareLinks {

  public static final int SHORTEST_DAYS = 1;
  public static final int USUAL_DAYS = 90;
  public static final int LONGEST_DAYS = 1000;

  private static final int TOKEN_BYTES = 32;

  private final JdbcClient jdbc;
  private final Clock clock;

  public ShareLinks(JdbcClient jdbc, Clock clock) {
    this.jdbc = jdbc;
    this.clock = clock;
  }

  /** A link just made; its token is told once and cannot be found again. */
  public record Made(ShareLink link, String token) {}

  /**
   * Makes a link.
   *
   * @param visit that the report is of
   * @param days how long it opens the report, {@link #SHORTEST_DAYS} to {@link #LONGEST_DAYS}
   */
  public Made make(
      VisitId visit, long reportNumber, boolean showsHistory, String createdBy, int days) {
    if (days < SHORTEST_DAYS || days > LONGEST_DAYS) {
      throw new IllegalArgumentException(days + " days");
    }
    String token = Secrets.random(TOKEN_BYTES);
    Instant now = now();
    ShareLink link =
        new ShareLink(
            ShareLinkId.next(),
            reportNumber,
            showsHistory,
            now,
            createdBy,
            now.plus(Duration.ofDays(days)),
            null,
            0,
            null);
    jdbc.sql(
            """
            insert into share_link (id, token_sha256, visit_id, report_number, shows_history,
              created_at, created_by, expires_at, views)
            values (?, ?, ?, ?, ?, ?, ?, ?, 0)
            """)
        .params(
            link.id().value(),
            Secrets.sha256(token),
            visit.value(),
            reportNumber,
            showsHistory,
            at(now),
            createdBy,
            at(link.expiresAt()))
        .update();
    return new Made(link, token);
  }

  /** All links to a report, newest first. */
  public List<ShareLink> ofReport(long number) {
    return jdbc.sql("select * from share_link where report_number = ? order by created_at desc, id")
        .param(number)
        .query(ShareLinks::link)
        .list();
  }

  public Optional<ShareLink> find(ShareLinkId id) {
    return jdbc.sql("select * from share_link where id = ?")
        .param(id.value())
        .query(ShareLinks::link)
        .optional();
  }

  /** The link of a token, if it opens its report now; the view is counted. */
  public Optional<ShareLink> open(String token) {
    int counted =
        jdbc.sql(
                """
                update share_link set views = views + 1, last_view_at = :now
                where token_sha256 = :hash and report_number is not null
                  and withdrawn_at is null and expires_at > :now
                """)
            .param("now", at(now()))
            .param("hash", Secrets.sha256(token))
            .update();
    return counted == 0 ? Optional.empty() : byToken(token);
  }

  /** The same without counting: what belongs to a view already counted. */
  public Optional<ShareLink> peek(String token) {
    return byToken(token).filter(link -> link.opensAt(now()));
  }

  private Optional<ShareLink> byToken(String token) {
    return jdbc.sql("select * from share_link where token_sha256 = ?")
        .param(Secrets.sha256(token))
        .query(ShareLinks::link)
        .optional();
  }

  /** Ends a link now. */
  public void withdraw(ShareLinkId id) {
    jdbc.sql("update share_link set withdrawn_at = ? where id = ? and withdrawn_at is null")
        .params(at(now()), id.value())
        .update();
  }

  private Instant now() {
    return clock.instant().truncatedTo(ChronoUnit.MICROS);
  }

  private static OffsetDateTime at(Instant instant) {
    return instant.atOffset(ZoneOffset.UTC);
  }

  private static ShareLink link(ResultSet row, int number) throws SQLException {
    return new ShareLink(
        new ShareLinkId(row.getObject("id", UUID.class)),
        row.getLong("report_number"),
        row.getBoolean("shows_history"),
        instant(row, "created_at"),
        row.getString("created_by"),
        instant(row, "expires_at"),
        instantOrNull(row, "withdrawn_at"),
        row.getInt("views"),
        instantOrNull(row, "last_view_at"));
  }

  private static Instant instant(ResultSet row, String column) throws SQLException {
    return row.getObject(column, OffsetDateTime.class).toInstant();
  }

  private static @Nullable Instant instantOrNull(ResultSet row, String column) throws SQLException {
    OffsetDateTime time = row.getObject(column, OffsetDateTime.class);
    return time == null ? null : time.toInstant();
  }
}
