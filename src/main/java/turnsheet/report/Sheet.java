package turnsheet.report;

import java.time.Instant;
import java.util.List;
import turnsheet.access.ShopProfiles.ShopProfile;
import turnsheet.shop.VisitSummary;

/**
 * What a visit has shown: before against after at each speed setting.
 *
 * @param shop letterhead
 * @param madeAt when this sheet was put together
 * @param pairs in the order of the model's speed settings
 * @param singles readings without a partner, in the same order
 */
public record Sheet(
    ShopProfile shop,
    VisitSummary visit,
    Instant madeAt,
    List<SheetPair> pairs,
    List<SheetSingle> singles) {

  public Sheet {
    pairs = List.copyOf(pairs);
    singles = List.copyOf(singles);
  }

  /** Whether there is anything to show. */
  public boolean isEmpty() {
    return pairs.isEmpty() && singles.isEmpty();
  }
}
