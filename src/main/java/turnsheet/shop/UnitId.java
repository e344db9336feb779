package turnsheet.shop;

import java.util.UUID;

/** Names one unit. */
public record UnitId(UUID value) {

  /** A name that nothing has yet. */
  public static UnitId next() {
    return new UnitId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
