package turnsheet.access;

import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Who did what, when: entries are added, never changed. */
@Service
public class AuditTrail {

  /**
   * One entry.
   *
   * @param action a message key, as {@code access.audit.keyMade}
   * @param subject what it was done to, for people
   */
  public record Entry(Instant at, String signInName, String action, String subject) {}

  private static final int SUBJECT_MAX_LENGTH = 400;

  private final JdbcClient jdbc;
  private final CurrentUser user;
  private final Clock clock;

  AuditTrail(JdbcClient jdbc, CurrentUser user, Clock clock) {
    this.jdbc = jdbc;
    this.user = user;
    this.clock = clock;
  }

  /**
   * Adds an entry under the name of the signed-in person, in the transaction at hand.
   *
   * @param action a message key of at most 60 characters
   * @param subject cut at 400 characters
   */
  @Transactional
  public void record(String action, String subject) {
    record(user.signInName(), action, subject);
  }

  @Transactional
  void record(String signInName, String action, String subject) {
    jdbc.sql(
            "insert into audit_entry (happened_at, account_name, action, subject)"
                + " values (:at, :name, :action, :subject)")
        .param("at", clock.instant().atOffset(ZoneOffset.UTC))
        .param("name", signInName)
        .param("action", action)
        .param("subject", subject.substring(0, Math.min(subject.length(), SUBJECT_MAX_LENGTH)))
        .update();
  }

  /** The latest entries, newest first. */
  public List<Entry> latest(int count) {
    return jdbc.sql(
            "select happened_at, account_name, action, subject from audit_entry"
                + " order by id desc fetch first "
                + count
                + " rows only")
        .query(
            (row, n) ->
                new Entry(
                    row.getTimestamp("happened_at").toInstant(),
                    row.getString("account_name"),
                    row.getString("action"),
                    row.getString("subject")))
        .list();
  }
}
