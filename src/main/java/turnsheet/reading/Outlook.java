package turnsheet.reading;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/** Where a trend leads to. */
public sealed interface Outlook {

  /** The figure has no limit at this speed setting. */
  record Unlimited() implements Outlook {}

  /** It leads away from the limit. */
  record Away() implements Outlook {}

  /** At the last reading the line lies at the limit or beyond it. */
  record Reached() implements Outlook {}

  /**
   * It meets the limit.
   *
   * @param earliest where the band of 95 % first does
   * @param latest where it last does; null where that lies beyond the horizon
   */
  record Meets(Instant at, Instant earliest, @Nullable Instant latest, Instant horizon)
      implements Outlook {}

  /** It does not meet the limit as far ahead as the readings allow a look. */
  record Beyond(Instant horizon) implements Outlook {}
}
