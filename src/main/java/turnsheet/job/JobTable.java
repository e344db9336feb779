package turnsheet.job;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** The rows of the job table and the steps they may take. */
@Repository
class JobTable {

  private static final int LONGEST_MESSAGE = 1000;

  private final JdbcClient jdbc;
  private final Clock clock;

  JobTable(JdbcClient jdbc, Clock clock) {
    this.jdbc = jdbc;
    this.clock = clock;
  }

  void add(JobId id, String name, UUID subject) {
    jdbc.sql(
            "insert into job (id, name, subject, state, progress, message, attempts, created_at)"
                + " values (:id, :name, :subject, 'queued', 0, '', 0, :now)")
        .param("id", id.value())
        .param("name", name)
        .param("subject", subject)
        .param("now", now())
        .update();
  }

  Optional<Job> find(JobId id) {
    return jdbc.sql("select * from job where id = :id")
        .param("id", id.value())
        .query(JobTable::job)
        .optional();
  }

  List<Job> ofSubject(UUID subject) {
    return jdbc.sql("select * from job where subject = :subject order by created_at desc, id")
        .param("subject", subject)
        .query(JobTable::job)
        .list();
  }

  /** Counts one more attempt; false where the job is over already or unknown. */
  boolean begin(JobId id) {
    return jdbc.sql(
                "update job set state = 'running', attempts = attempts + 1, progress = 0,"
                    + " message = '', started_at = :now"
                    + " where id = :id and state in ('queued', 'running')")
            .param("now", now())
            .param("id", id.value())
            .update()
        == 1;
  }

  /** Notes how far it is; false where the job runs no more, as it was called off. */
  boolean progress(JobId id, double fraction, String message) {
    return jdbc.sql(
                "update job set progress = :fraction, message = :message"
                    + " where id = :id and state = 'running'")
            .param("fraction", fraction)
            .param("message", cut(message))
            .param("id", id.value())
            .update()
        == 1;
  }

  /** Calls the job off; false where it is over already. */
  boolean cancel(JobId id) {
    return jdbc.sql(
                "update job set state = 'cancelled', message = '', finished_at = :now"
                    + " where id = :id and state in ('queued', 'running')")
            .param("now", now())
            .param("id", id.value())
            .update()
        == 1;
  }

  void requeue(JobId id, String message) {
    jdbc.sql(
            "update job set state = 'queued', progress = 0, message = :message"
                + " where id = :id and state in ('queued', 'running')")
        .param("message", cut(message))
        .param("id", id.value())
        .update();
  }

  void done(JobId id) {
    jdbc.sql(
            "update job set state = 'done', progress = 1, message = '', finished_at = :now"
                + " where id = :id and state = 'running'")
        .param("now", now())
        .param("id", id.value())
        .update();
  }

  /** Gives the job up; false where it is over already. */
  boolean fail(JobId id, String message) {
    return jdbc.sql(
                "update job set state = 'failed', message = :message, finished_at = :now"
                    + " where id = :id and state in ('queued', 'running')")
            .param("message", cut(message))
            .param("now", now())
            .param("id", id.value())
            .update()
        == 1;
  }

  private OffsetDateTime now() {
    return clock.instant().atOffset(ZoneOffset.UTC);
  }

  private static String cut(String message) {
    return message.length() <= LONGEST_MESSAGE ? message : message.substring(0, LONGEST_MESSAGE);
  }

  private static Job job(ResultSet row, int number) throws SQLException {
    return new Job(
        new JobId(row.getObject("id", UUID.class)),
        row.getString("name"),
        row.getObject("subject", UUID.class),
        JobState.valueOf(row.getString("state").toUpperCase(Locale.ROOT)),
        row.getDouble("progress"),
        row.getString("message"),
        row.getInt("attempts"),
        row.getObject("created_at", OffsetDateTime.class).toInstant(),
        instant(row, "started_at"),
        instant(row, "finished_at"));
  }

  private static @Nullable Instant instant(ResultSet row, String column) throws SQLException {
    OffsetDateTime time = row.getObject(column, OffsetDateTime.class);
    return time == null ? null : time.toInstant();
  }
}
