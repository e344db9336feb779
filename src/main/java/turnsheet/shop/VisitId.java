package turnsheet.shop;

import java.util.UUID;

/** Names one visit. */
public record VisitId(UUID value) {

  /** A name that nothing has yet. */
  public static VisitId next() {
    return new VisitId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
