package turnsheet.capture;

import java.time.Clock;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.annotation.Transactional;

/**
 * Captures that sheets and reports leave out: a wrong tape, a knock on the table. They stay where
 * they are with their readings, and what leaves them out says so with the reason.
 */
@Component
public class LeftOut {

  public static final int REASON_LENGTH = 300;

  private final JdbcClient jdbc;
  private final Clock clock;

  LeftOut(JdbcClient jdbc, Clock clock) {
    this.jdbc = jdbc;
    this.clock = clock;
  }

  /** Why a capture is left out; empty where it is not. */
  public Optional<String> reason(CaptureId id) {
    return jdbc.sql("select reason from left_out_capture where capture_id = ?")
        .param(id.value())
        .query(String.class)
        .optional();
  }

  /**
   * Leaves a capture out, or gives another reason.
   *
   * @param reason not blank, at most {@link #REASON_LENGTH} characters
   */
  @Transactional
  public void leave(CaptureId id, String reason, String by) {
    if (reason.isBlank() || reason.length() > REASON_LENGTH) {
      throw new IllegalArgumentException("reason of " + reason.length() + " characters");
    }
    takeIn(id);
    jdbc.sql("insert into left_out_capture values (?, ?, ?, ?)")
        .params(
            id.value(),
            reason,
            clock.instant().truncatedTo(ChronoUnit.MICROS).atOffset(ZoneOffset.UTC),
            by)
        .update();
  }

  /** Takes it in again. */
  @Transactional
  public void takeIn(CaptureId id) {
    jdbc.sql("delete from left_out_capture where capture_id = ?").param(id.value()).update();
  }
}
