package turnsheet.shop;

import java.util.UUID;

/** Names one customer. */
public record CustomerId(UUID value) {

  /** A name that nothing has yet. */
  public static CustomerId next() {
    return new CustomerId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
