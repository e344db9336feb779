package turnsheet.shop;

import java.util.UUID;

/** Names one machine model. */
public record ModelId(UUID value) {

  /** A name that nothing has yet. */
  public static ModelId next() {
    return new ModelId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
