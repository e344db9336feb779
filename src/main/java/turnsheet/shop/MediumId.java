package turnsheet.shop;

import java.util.UUID;

/** Names one reference medium. */
public record MediumId(UUID value) {

  /** A name that nothing has yet. */
  public static MediumId next() {
    return new MediumId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
