package turnsheet.access;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.security.core.userdetails.UserDetails;
import org.springframework.security.core.userdetails.UserDetailsService;
import org.springframework.security.core.userdetails.UsernameNotFoundException;
import org.springframework.security.crypto.password.PasswordEncoder;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;
import turnsheet.web.RefusedRequestException;

/** The accounts of the shop. None is ever deleted, so that old entries keep their names. */
@Service
public class Accounts implements UserDetailsService {

  /** Shortest password that is taken. */
  public static final int PASSWORD_MIN_LENGTH = 10;

  /** Longest, in UTF-8: bcrypt reads no more. */
  public static final int PASSWORD_MAX_BYTES = 72;

  private static final String COLUMNS =
      "select id, sign_in_name, display_name, role, created_at, disabled_at, password_hash"
          + " from account ";

  private final JdbcClient jdbc;
  private final PasswordEncoder encoder;
  private final Clock clock;
  private volatile boolean known;

  Accounts(JdbcClient jdbc, PasswordEncoder encoder, Clock clock) {
    this.jdbc = jdbc;
    this.encoder = encoder;
    this.clock = clock;
  }

  /** Whether the service still waits for its first account. */
  public boolean none() {
    if (!known) {
      known = jdbc.sql("select count(*) from account").query(Integer.class).single() > 0;
    }
    return !known;
  }

  public List<Account> all() {
    return jdbc.sql(COLUMNS + "order by sign_in_name").query(Accounts::account).list();
  }

  public Optional<Account> byId(UUID id) {
    return jdbc.sql(COLUMNS + "where id = :id").param("id", id).query(Accounts::account).optional();
  }

  public Optional<Account> bySignInName(String name) {
    return jdbc.sql(COLUMNS + "where sign_in_name = :name")
        .param("name", normal(name))
        .query(Accounts::account)
        .optional();
  }

  /**
   * Makes an account.
   *
   * @param password null where its holder will choose one at a one-time address; nobody can sign in
   *     with a password before
   * @throws RefusedRequestException where the sign-in name is taken
   */
  @Transactional
  public Account create(
      String signInName, String displayName, Role role, @Nullable String password) {
    if (bySignInName(signInName).isPresent()) {
      throw new RefusedRequestException(
          "signInNameTaken", "There is already an account with this sign-in name; choose another.");
    }
    Account made =
        new Account(
            UUID.randomUUID(), normal(signInName), displayName, role, clock.instant(), null);
    jdbc.sql(
            "insert into account (id, sign_in_name, display_name, role, password_hash, created_at)"
                + " values (:id, :name, :display, :role, :hash, :at)")
        .param("id", made.id())
        .param("name", made.signInName())
        .param("display", displayName)
        .param("role", role.name())
        .param("hash", encoder.encode(password == null ? Secrets.random(32) : password))
        .param("at", made.createdAt().atOffset(ZoneOffset.UTC))
        .update();
    return made;
  }

  @Transactional
  public void setPassword(UUID id, String password) {
    jdbc.sql("update account set password_hash = :hash where id = :id")
        .param("hash", encoder.encode(password))
        .param("id", id)
        .update();
  }

  /**
   * Bars an account, or lets it in again.
   *
   * @throws RefusedRequestException where no owner would be left
   */
  @Transactional
  public void setEnabled(UUID id, boolean enabled) {
    boolean ownerLeft =
        all().stream().anyMatch(a -> a.role() == Role.OWNER && a.enabled() && !a.id().equals(id));
    if (!enabled && !ownerLeft) {
      throw new RefusedRequestException(
          "lastOwner", "This is the only owner who can sign in; make another owner first.");
    }
    jdbc.sql("update account set disabled_at = :at where id = :id")
        .param("at", enabled ? null : clock.instant().atOffset(ZoneOffset.UTC))
        .param("id", id)
        .update();
  }

  @Override
  public UserDetails loadUserByUsername(String name) throws UsernameNotFoundException {
    return jdbc.sql(COLUMNS + "where sign_in_name = :name")
        .param("name", normal(name))
        .query((row, n) -> SignedInUser.of(account(row, n), row.getString("password_hash")))
        .optional()
        .orElseThrow(() -> new UsernameNotFoundException("no such account"));
  }

  private static String normal(String name) {
    return name.strip().toLowerCase(Locale.ROOT);
  }

  private static Account account(ResultSet row, int number) throws SQLException {
    return new Account(
        row.getObject("id", UUID.class),
        row.getString("sign_in_name"),
        row.getString("display_name"),
        Role.valueOf(row.getString("role")),
        row.getTimestamp("created_at").toInstant(),
        instant(row.getTimestamp("disabled_at")));
  }

  static @Nullable Instant instant(@Nullable Timestamp at) {
    return at == null ? null : at.toInstant();
  }
}
