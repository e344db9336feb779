package turnsheet.trial;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import turnsheet.capture.CaptureId;
import turnsheet.core.diagnose.filter.TrialResult;
import turnsheet.core.signal.Rejection;
import turnsheet.document.CoreJson;
import turnsheet.job.JobId;

/** All trials. */
@Repository
public class Trials {

  private final JdbcClient jdbc;

  public Trials(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  public Optional<KeptTrial> find(TrialId id) {
    return jdbc.sql("select * from trial where id = ?")
        .param(id.value())
        .query(Trials::trial)
        .optional();
  }

  /** The trials of a capture, the newest first. */
  public List<KeptTrial> ofCapture(CaptureId capture) {
    return jdbc.sql("select * from trial where capture_id = ? order by ordered_at desc, id")
        .param(capture.value())
        .query(Trials::trial)
        .list();
  }

  void add(KeptTrial trial) {
    jdbc.sql(
            """
            insert into trial (id, capture_id, ordered_at, ordered_by, orders, job_id)
            values (?, ?, ?, ?, ?, ?)
            """)
        .param(1, trial.id().value())
        .param(2, trial.capture().value())
        .param(3, trial.orderedAt().atOffset(ZoneOffset.UTC))
        .param(4, trial.orderedBy())
        .param(5, CoreJson.toJson(trial.order()))
        .param(6, trial.job().value())
        .update();
  }

  /** Keeps what came of it; nothing happens where it was removed meanwhile. */
  void found(TrialId id, TrialResult result) {
    jdbc.sql(
            "update trial set result = ?, refusal_code = null, refusal_message = null where id = ?")
        .params(CoreJson.toJson(result), id.value())
        .update();
  }

  /** The recording cannot be used. */
  void refused(TrialId id, Rejection why) {
    jdbc.sql("update trial set refusal_code = ?, refusal_message = ? where id = ?")
        .params(why.code(), why.message(), id.value())
        .update();
  }

  boolean remove(TrialId id) {
    return jdbc.sql("delete from trial where id = ?").param(id.value()).update() == 1;
  }

  private static KeptTrial trial(ResultSet row, int number) throws SQLException {
    String code = row.getString("refusal_code");
    String message = row.getString("refusal_message");
    return new KeptTrial(
        new TrialId(row.getObject("id", UUID.class)),
        new CaptureId(row.getObject("capture_id", UUID.class)),
        row.getObject("ordered_at", OffsetDateTime.class).toInstant(),
        row.getString("ordered_by"),
        CoreJson.fromJson(row.getString("orders"), TrialOrder.class),
        new JobId(row.getObject("job_id", UUID.class)),
        code == null || message == null ? null : new Rejection(code, message),
        result(row.getString("result")));
  }

  private static @Nullable TrialResult result(@Nullable String json) {
    return json == null ? null : CoreJson.fromJson(json, TrialResult.class);
  }
}
