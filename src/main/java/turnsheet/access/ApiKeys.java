package turnsheet.access;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Keys for programs. A key speaks for its account; the key itself is shown once, never stored. */
@Service
public class ApiKeys {

  /**
   * A key as it is kept.
   *
   * @param lastUsedAt null before its first use; later uses within a minute are not noted
   * @param withdrawnAt null while it works
   */
  public record ApiKey(
      UUID id,
      UUID accountId,
      String signInName,
      String label,
      Instant createdAt,
      @Nullable Instant lastUsedAt,
      @Nullable Instant withdrawnAt) {}

  private static final String PREFIX = "tsk_";
  private static final int KEY_BYTES = 32;
  private static final Duration NOTED_EVERY = Duration.ofMinutes(1);
  private static final String COLUMNS =
      "select k.id, k.account_id, a.sign_in_name, k.label, k.created_at, k.last_used_at,"
          + " k.withdrawn_at from api_key k join account a on a.id = k.account_id ";

  private final JdbcClient jdbc;
  private final Accounts accounts;
  private final Clock clock;

  ApiKeys(JdbcClient jdbc, Accounts accounts, Clock clock) {
    this.jdbc = jdbc;
    this.accounts = accounts;
    this.clock = clock;
  }

  /** Makes a key and returns it, the only time that anyone sees it. */
  @Transactional
  public String make(UUID accountId, String label) {
    String key = PREFIX + Secrets.random(KEY_BYTES);
    jdbc.sql(
            "insert into api_key (id, account_id, label, key_sha256, created_at)"
                + " values (:id, :account, :label, :hash, :at)")
        .param("id", UUID.randomUUID())
        .param("account", accountId)
        .param("label", label)
        .param("hash", Secrets.sha256(key))
        .param("at", now())
        .update();
    return key;
  }

  /** All keys, working ones first. */
  public List<ApiKey> all() {
    return jdbc.sql(COLUMNS + "order by k.withdrawn_at nulls first, k.created_at desc")
        .query(ApiKeys::key)
        .list();
  }

  public Optional<ApiKey> byId(UUID id) {
    return jdbc.sql(COLUMNS + "where k.id = :id").param("id", id).query(ApiKeys::key).optional();
  }

  @Transactional
  public void withdraw(UUID id) {
    jdbc.sql("update api_key set withdrawn_at = :now where id = :id and withdrawn_at is null")
        .param("now", now())
        .param("id", id)
        .update();
  }

  /** Whom a key speaks for; empty for a wrong or withdrawn key and for a disabled account. */
  @Transactional
  public Optional<Account> holder(String secret) {
    if (!secret.startsWith(PREFIX)) {
      return Optional.empty();
    }
    return jdbc.sql(COLUMNS + "where k.key_sha256 = :hash and k.withdrawn_at is null")
        .param("hash", Secrets.sha256(secret))
        .query(ApiKeys::key)
        .optional()
        .map(this::noted)
        .flatMap(key -> accounts.byId(key.accountId()))
        .filter(Account::enabled);
  }

  private ApiKey noted(ApiKey key) {
    Instant last = key.lastUsedAt();
    if (last == null || last.plus(NOTED_EVERY).isBefore(clock.instant())) {
      jdbc.sql("update api_key set last_used_at = :now where id = :id")
          .param("now", now())
          .param("id", key.id())
          .update();
    }
    return key;
  }

  private OffsetDateTime now() {
    return clock.instant().atOffset(ZoneOffset.UTC);
  }

  private static ApiKey key(ResultSet row, int number) throws SQLException {
    return new ApiKey(
        row.getObject("id", UUID.class),
        row.getObject("account_id", UUID.class),
        row.getString("sign_in_name"),
        row.getString("label"),
        row.getTimestamp("created_at").toInstant(),
        Accounts.instant(row.getTimestamp("last_used_at")),
        Accounts.instant(row.getTimestamp("withdrawn_at")));
  }
}
