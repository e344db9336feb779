package turnsheet.shop;

import java.util.UUID;

/** Names one bench instrument. */
public record InstrumentId(UUID value) {

  /** A name that nothing has yet. */
  public static InstrumentId next() {
    return new InstrumentId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
