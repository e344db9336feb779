package turnsheet.capture;

import java.sql.Types;
import java.time.ZoneOffset;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.signal.Rejection;
import turnsheet.document.CoreJson;
import turnsheet.job.JobId;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.MediumId;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

/**
 * All captures and the steps that they may take. A step out of a state that does not allow it
 * changes nothing and answers false, whoever was first.
 *
 * <pre>
 * RECOGNISED, REFUSED, MEASURED, FAILED  queue    QUEUED
 * QUEUED                                 measured MEASURED
 * QUEUED                                 refused  REFUSED
 * QUEUED                                 failed   FAILED
 * RECOGNISED, REFUSED, FAILED            looked   RECOGNISED or REFUSED
 * MEASURED                               choose   MEASURED, with another main channel
 * </pre>
 */
@Repository
public class Captures {

  private static final int LONGEST_REFUSAL = 2000;

  private final JdbcClient jdbc;

  Captures(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  public Optional<Capture> find(CaptureId id) {
    return jdbc.sql("select * from capture where id = :id")
        .param("id", id.value())
        .query(CaptureRows::capture)
        .optional();
  }

  /** All captures of a visit, the oldest first. */
  public List<Capture> ofVisit(VisitId visit) {
    return jdbc.sql("select * from capture where visit_id = :visit order by received_at, id")
        .param("visit", visit.value())
        .query(CaptureRows::capture)
        .list();
  }

  /** The newest captures in some states, the newest first, at most so many. */
  public List<Capture> in(Collection<CaptureState> states, int atMost) {
    return jdbc.sql(
            "select * from capture where state in (:states) order by received_at desc, id"
                + " fetch first :atMost rows only")
        .param("states", states.stream().map(CaptureState::word).toList())
        .param("atMost", atMost)
        .query(CaptureRows::capture)
        .list();
  }

  void add(Capture capture) {
    jdbc.sql(
            """
            insert into capture (id, visit_id, speed_setting_id, bench_condition, instrument_id,
              medium_id, file_name, sha256, byte_length, received_at, received_by, state,
              recognition, refusal_code, refusal_message, tone_method,
              setting_proposal)
            values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)
            """)
        .param(1, capture.id().value())
        .param(2, capture.key().visit().value())
        .param(3, capture.key().setting().value())
        .param(4, capture.key().condition())
        .param(5, valueOf(capture.key().instrument(), InstrumentId::value), Types.OTHER)
        .param(6, valueOf(capture.key().medium(), MediumId::value), Types.OTHER)
        .param(7, capture.fileName())
        .param(8, capture.bytes().sha256())
        .param(9, capture.bytes().length())
        .param(10, capture.receivedAt().atOffset(ZoneOffset.UTC))
        .param(11, capture.receivedBy())
        .param(12, capture.state().word())
        .param(13, valueOf(capture.looked(), CoreJson::toJson), Types.VARCHAR)
        .param(14, valueOf(capture.refusal(), Rejection::code), Types.VARCHAR)
        .param(15, valueOf(capture.refusal(), Captures::sentence), Types.VARCHAR)
        .param(16, valueOf(capture.key().toneMethod(), ToneMethod::word), Types.VARCHAR)
        .param(17, valueOf(capture.fit(), SettingFit::word), Types.VARCHAR)
        .update();
  }

  /** Takes a capture away that was never measured. */
  boolean remove(CaptureId id) {
    return jdbc.sql(
                "delete from capture where id = :id and state in ('recognised', 'refused', 'failed')"
                    + " and not exists (select 1 from reading r where r.capture_id = :id)")
            .param("id", id.value())
            .update()
        == 1;
  }

  /** The bench says at which setting and under which condition the recording was made. */
  boolean place(CaptureId id, SpeedSettingId setting, String condition) {
    return jdbc.sql(
                "update capture set speed_setting_id = :setting, bench_condition = :condition,"
                    + " setting_proposal = null"
                    + " where id = :id and state in ('recognised', 'refused', 'failed')")
            .param("setting", setting.value())
            .param("condition", condition)
            .param("id", id.value())
            .update()
        == 1;
  }

  /** Corrects how the tone came onto what was played; no figure depends on it. */
  boolean name(CaptureId id, @Nullable ToneMethod method) {
    return jdbc.sql("update capture set tone_method = ? where id = ?")
            .param(1, valueOf(method, ToneMethod::word), Types.VARCHAR)
            .param(2, id.value())
            .update()
        == 1;
  }

  /** Keeps what another look has shown. */
  boolean noted(CaptureId id, Looker.Result result) {
    return result instanceof Looker.Seen seen
        ? looked(id, seen.looked())
        : lookRefused(id, ((Looker.Unusable) result).why());
  }

  /** Another look, with other options, has shown what the file holds. */
  boolean looked(CaptureId id, Looked looked) {
    return jdbc.sql(
                "update capture set state = 'recognised', recognition = :looked,"
                    + " refusal_code = null, refusal_message = null"
                    + " where id = :id and state in ('recognised', 'refused', 'failed')")
            .param("looked", CoreJson.toJson(looked))
            .param("id", id.value())
            .update()
        == 1;
  }

  /** Another look, with other options, ended in a refusal; what was known before stays. */
  boolean lookRefused(CaptureId id, Rejection why) {
    return refuse(id, "refused", why, "('recognised', 'refused', 'failed')");
  }

  boolean queue(CaptureId id, Looked looked, CaptureChoices choices, JobId job) {
    return jdbc.sql(
                "update capture set state = 'queued', recognition = :looked, choices = :choices,"
                    + " main_channel = :channel, job_id = :job, setting_proposal = null,"
                    + " tone_method = case when :tone then tone_method end,"
                    + " refusal_code = null, refusal_message = null where id = :id"
                    + " and state in ('recognised', 'refused', 'measured', 'failed')")
            .param("looked", CoreJson.toJson(looked))
            .param("choices", CoreJson.toJson(choices))
            .param("channel", choices.settings().channel())
            .param("job", job.value())
            .param("tone", choices.settings().kind() == CaptureKind.TONE)
            .param("id", id.value())
            .update()
        == 1;
  }

  /** The capture has a reading; to be called in the transaction that stores it. */
  public boolean measured(CaptureId id) {
    return jdbc.sql("update capture set state = 'measured' where id = :id and state = 'queued'")
            .param("id", id.value())
            .update()
        == 1;
  }

  /**
   * The capture has a reading, on another channel than the one that was chosen, which gave none; to
   * be called in the transaction that stores it.
   */
  public boolean measuredOn(CaptureId id, Looked looked, CaptureChoices choices) {
    return takeChannel(id, looked, choices, "queued");
  }

  /** Another channel that has been measured stands for the capture from now on. */
  boolean choose(CaptureId id, Looked looked, CaptureChoices choices) {
    return takeChannel(id, looked, choices, "measured");
  }

  private boolean takeChannel(CaptureId id, Looked looked, CaptureChoices choices, String from) {
    return jdbc.sql(
                "update capture set state = 'measured', recognition = :looked, choices = :choices,"
                    + " main_channel = :channel where id = :id and state = :from")
            .param("looked", CoreJson.toJson(looked))
            .param("choices", CoreJson.toJson(choices))
            .param("channel", choices.settings().channel())
            .param("id", id.value())
            .param("from", from)
            .update()
        == 1;
  }

  /** Measuring found that the capture cannot give figures. */
  public boolean refused(CaptureId id, Rejection why) {
    return refuse(id, "refused", why, "('queued')");
  }

  /** The service could not measure the capture, for a reason that is not the capture's. */
  public boolean failed(CaptureId id, String sentence) {
    return refuse(id, "failed", new Rejection("failed", sentence), "('queued')");
  }

  private boolean refuse(CaptureId id, String state, Rejection why, String from) {
    return jdbc.sql(
                "update capture set state = :state, refusal_code = :code,"
                    + " refusal_message = :message where id = :id and state in "
                    + from)
            .param("state", state)
            .param("code", why.code())
            .param("message", sentence(why))
            .param("id", id.value())
            .update()
        == 1;
  }

  private static String sentence(Rejection why) {
    String message = why.message();
    return message.length() <= LONGEST_REFUSAL ? message : message.substring(0, LONGEST_REFUSAL);
  }

  private static <T, V> @Nullable V valueOf(@Nullable T from, Function<T, V> value) {
    return from == null ? null : value.apply(from);
  }
}
