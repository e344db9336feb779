package turnsheet.report;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.shop.FittedPart;

/**
 * What a visit has shown, with everything that page, paper and an issued report need of it: it
 * holds no reference to anything that can change later.
 *
 * @param pairs conditions that can be compared, in the order of the model's speed settings
 * @param singles conditions without a partner, in the same order
 * @param leftOut recordings that enter nothing of this, in the order of their arrival
 */
public record Sheet(
    Letterhead shop,
    Item item,
    Terms terms,
    List<SheetPair> pairs,
    List<SheetSingle> singles,
    List<LeftOut> leftOut) {

  public Sheet {
    pairs = List.copyOf(pairs);
    singles = List.copyOf(singles);
    leftOut = List.copyOf(leftOut);
  }

  /**
   * The shop.
   *
   * @param address lines separated by line feeds; may be empty
   * @param logo picture as data address; null where the shop has none
   */
  public record Letterhead(String name, String address, @Nullable String logo) {}

  /**
   * The unit and its stay.
   *
   * @param closedAt when it was handed back; null while it stays
   * @param parts that were fitted
   * @param sensor which sensor was fitted in place of the old one; may be empty, null where none
   *     was
   */
  public record Item(
      String modelName,
      String serialNumber,
      String customerName,
      String customerContact,
      Instant openedAt,
      @Nullable Instant closedAt,
      String complaint,
      String workDone,
      List<FittedPart> parts,
      @Nullable String sensor) {

    public Item {
      parts = List.copyOf(parts);
    }
  }

  /**
   * By what the figures were judged and compared.
   *
   * @param leastFlutterChangePercent smallest change that matters, in percent of the value before
   * @param leastSpeedChangePercent the same for speed, in percentage points
   */
  public record Terms(
      DecisionRule rule, double leastFlutterChangePercent, double leastSpeedChangePercent) {}

  /** A recording that the bench left out, and why. */
  public record LeftOut(String setting, String condition, String fileName, String reason) {}

  /** Whether there is nothing to show. */
  public boolean isEmpty() {
    return pairs.isEmpty() && singles.isEmpty();
  }
}
