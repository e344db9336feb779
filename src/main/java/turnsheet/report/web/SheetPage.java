package turnsheet.report.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Shown;

/**
 * A sheet with everything in words, as page, print and share link show it.
 *
 * @param closed day of handing back; empty while the unit is on the bench
 * @param rule the decision rule in one sentence
 */
public record SheetPage(
    String shopName,
    List<String> shopAddress,
    String modelName,
    String serialNumber,
    String customerName,
    String opened,
    String closed,
    String complaint,
    String workDone,
    String madeOn,
    List<Pair> pairs,
    List<Single> singles,
    String rule) {

  /** Whether any figure on the sheet is held against a limit. */
  public boolean judged() {
    return pairs.stream().flatMap(p -> p.rows().stream()).anyMatch(r -> !r.limit().isEmpty())
        || singles.stream().flatMap(s -> s.rows().stream()).anyMatch(r -> !r.limit().isEmpty());
  }

  /**
   * One speed setting before and after.
   *
   * @param sentence what changed, in one sentence
   * @param spectrum drawing of both spectra
   */
  public record Pair(
      String setting,
      String kind,
      String sentence,
      List<String> cautions,
      Side before,
      Side after,
      List<Row> rows,
      String spectrum) {}

  /** Where one column of figures comes from. */
  public record Side(String day, String fileName, String shortHash, String method, String href) {}

  /**
   * One figure.
   *
   * @param limit bound with its unit; empty where there is none
   * @param origin of the bound; empty with it
   * @param change one of the words improved, worse, same
   */
  public record Row(
      String name,
      Shown before,
      @Nullable String verdictBefore,
      Shown after,
      @Nullable String verdictAfter,
      String limit,
      String origin,
      Shown difference,
      String change) {}

  /** A reading that has no partner. */
  public record Single(
      String setting, String kind, String condition, Side side, List<SingleRow> rows) {}

  /** One figure of a reading without partner. */
  public record SingleRow(
      String name, Shown shown, String limit, String origin, @Nullable String verdict) {}
}
