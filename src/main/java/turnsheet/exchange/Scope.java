package turnsheet.exchange;

import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;

/**
 * How much of the books an export holds.
 *
 * @param id of the unit or the visit; null for everything
 */
public record Scope(Extent extent, @Nullable UUID id) {

  /** From what an export is cut. */
  public enum Extent {
    EVERYTHING,
    UNIT,
    VISIT;

    /** Its word in the document. */
    String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  public Scope {
    if ((id == null) != (extent == Extent.EVERYTHING)) {
      throw new IllegalArgumentException(extent + " of " + id);
    }
  }

  public static Scope everything() {
    return new Scope(Extent.EVERYTHING, null);
  }

  /** A unit with all its visits. */
  public static Scope unit(UUID id) {
    return new Scope(Extent.UNIT, id);
  }

  /** One visit with its unit. */
  public static Scope visit(UUID id) {
    return new Scope(Extent.VISIT, id);
  }
}
