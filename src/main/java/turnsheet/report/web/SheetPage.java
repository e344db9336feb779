package turnsheet.report.web;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A sheet with everything in words, as page, paper and PDF show it.
 *
 * @param paper as CSS names it; empty for a sheet that is not issued
 * @param title of the sheet
 * @param identity line that runs along on every sheet of paper
 * @param logo data address; null where the shop has none
 * @param facts what stands at the head, in order
 * @param pairs compared conditions
 * @param singles conditions without partner
 * @param notes rule, uncertainty, scope and the like, in order
 * @param caution of those who open the machine
 * @param end the mark after which nothing follows
 * @param check code and address of an issued report; null for a sheet that is not issued
 */
public record SheetPage(
    String language,
    String paper,
    String title,
    String identity,
    String shopName,
    List<String> shopAddress,
    @Nullable String logo,
    List<Fact> facts,
    List<Pair> pairs,
    List<Single> singles,
    List<String> notes,
    String caution,
    String end,
    @Nullable Check check) {

  /** A name and what belongs to it, one or several lines. */
  public record Fact(String name, List<String> lines) {}

  /**
   * How the report can be checked.
   *
   * @param sentence with code and address
   * @param code picture of the address as SVG
   */
  public record Check(String sentence, String code) {}

  /**
   * One speed setting before and after.
   *
   * @param sentence what changed, in one sentence
   * @param spectrum drawing of both spectra; empty where a side has none
   */
  public record Pair(
      String setting,
      String kind,
      String sentence,
      List<String> remarks,
      String before,
      String after,
      List<Row> rows,
      String spectrum,
      List<Line> lines,
      List<Recording> recordings) {}

  /**
   * One figure.
   *
   * @param limit bound with its unit; empty where there is none
   * @param origin of the bound; empty with it
   * @param change one of the words improved, worse, small, same
   */
  public record Row(
      String name,
      Cell before,
      Cell after,
      String limit,
      String origin,
      String difference,
      String change) {}

  /**
   * A figure of one condition.
   *
   * @param more spread and worst of several captures; empty for one
   * @param verdict null where there is no limit or no value
   * @param probability of conformity; empty where there is no verdict
   * @param why reason of an undecided verdict; null for others
   */
  public record Cell(
      String shown,
      String more,
      @Nullable String verdict,
      String probability,
      @Nullable String why) {}

  /**
   * One line of the spectra.
   *
   * @param fate one of the words stayed, went, came
   */
  public record Line(String rate, String before, String after, String fate, String part) {}

  /** A reading that has no partner. */
  public record Single(
      String setting,
      String kind,
      String condition,
      List<SingleRow> rows,
      List<Recording> recordings) {}

  /** One figure of a condition without partner. */
  public record SingleRow(String name, Cell cell, String limit, String origin) {}

  /** Where figures come from. */
  public record Recording(String condition, String text, String href) {}
}
