package turnsheet.access;

import java.time.Clock;
import java.time.Duration;
import java.time.ZoneOffset;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Addresses that work once: the token in them is 192 random bits, and only its hash is stored. */
@Service
public class OneTimeAddresses {

  /** What the holder of an address may do with it. */
  public enum Purpose {
    /** Set up the owner's account. */
    FIRST_RUN("/first-run/"),
    /** Sign an existing account in. */
    ENTER("/enter/"),
    /** Choose a password for an existing account, and sign in. */
    PASSWORD("/enter/");

    private final String path;

    Purpose(String path) {
      this.path = path;
    }
  }

  /**
   * An address that can still be used.
   *
   * @param accountId null for the first run
   */
  public record Open(Purpose purpose, @Nullable UUID accountId) {}

  private static final int TOKEN_BYTES = 24;

  private final JdbcClient jdbc;
  private final Clock clock;

  OneTimeAddresses(JdbcClient jdbc, Clock clock) {
    this.jdbc = jdbc;
    this.clock = clock;
  }

  /**
   * Makes an address; earlier ones of the same purpose and account end with it.
   *
   * @param accountId null for the first run
   * @return its path, as {@code /enter/TOKEN}
   */
  @Transactional
  public String issue(Purpose purpose, @Nullable UUID accountId, Duration lifetime) {
    jdbc.sql(
            "delete from one_time_address where purpose = :purpose and "
                + (accountId == null ? "account_id is null" : "account_id = :account"))
        .param("purpose", purpose.name())
        .param("account", accountId)
        .update();
    String token = Secrets.random(TOKEN_BYTES);
    jdbc.sql(
            "insert into one_time_address (token_sha256, purpose, account_id, expires_at)"
                + " values (:hash, :purpose, :account, :expires)")
        .param("hash", Secrets.sha256(token))
        .param("purpose", purpose.name())
        .param("account", accountId)
        .param("expires", clock.instant().plus(lifetime).atOffset(ZoneOffset.UTC))
        .update();
    return purpose.path + token;
  }

  /** What an address opens; empty where it never existed, was used, or has expired. */
  public Optional<Open> look(String token) {
    return jdbc.sql(
            "select purpose, account_id from one_time_address"
                + " where token_sha256 = :hash and used_at is null and expires_at > :now")
        .param("hash", Secrets.sha256(token))
        .param("now", clock.instant().atOffset(ZoneOffset.UTC))
        .query(
            (row, n) ->
                new Open(
                    Purpose.valueOf(row.getString("purpose")),
                    row.getObject("account_id", UUID.class)))
        .optional();
  }

  /** Uses an address up; of two who try at once, one gets empty. */
  @Transactional
  public Optional<Open> use(String token) {
    Optional<Open> open = look(token);
    int used =
        jdbc.sql(
                "update one_time_address set used_at = :now"
                    + " where token_sha256 = :hash and used_at is null and expires_at > :now")
            .param("hash", Secrets.sha256(token))
            .param("now", clock.instant().atOffset(ZoneOffset.UTC))
            .update();
    return used == 1 ? open : Optional.empty();
  }
}
