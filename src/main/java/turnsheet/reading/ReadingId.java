package turnsheet.reading;

import java.util.UUID;

/** Names one reading. */
public record ReadingId(UUID value) {

  /** A name that nothing has yet. */
  public static ReadingId next() {
    return new ReadingId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
