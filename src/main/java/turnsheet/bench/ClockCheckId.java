package turnsheet.bench;

import java.util.UUID;

/** Names one check of a clock. */
public record ClockCheckId(UUID value) {

  /** A name that nothing has yet. */
  public static ClockCheckId next() {
    return new ClockCheckId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
