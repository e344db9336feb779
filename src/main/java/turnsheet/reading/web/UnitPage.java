package turnsheet.reading.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Crumb;
import turnsheet.web.Shown;

/**
 * One unit as its page shows it.
 *
 * @param code on its label, in two groups
 * @param note may be empty
 * @param openVisitId the visit that the unit is here for; null where it is not on the bench
 * @param plateVisitId the latest visit with a photograph of the type plate; null where none has
 * @param usualCondition of what comes in now
 */
record UnitPage(
    String id,
    List<Crumb> trail,
    String name,
    String modelId,
    String modelName,
    String serialNumber,
    String code,
    String customerId,
    String customerName,
    String note,
    @Nullable String openVisitId,
    String usualCondition,
    @Nullable String plateVisitId,
    List<VisitRow> visits,
    History history) {

  /** Whether the model has a speed setting that a recording can belong to. */
  public boolean isRecordable() {
    return !history.settings().isEmpty();
  }

  /**
   * One visit.
   *
   * @param closed empty while open
   */
  record VisitRow(
      String id,
      String opened,
      String closed,
      String complaint,
      String workDone,
      List<BenchPage.Latest> latest) {}

  /**
   * The unit over the years at one speed setting.
   *
   * @param settingId the chosen one; empty where the model has none, as its label
   * @param figure name of the chosen one
   * @param svg finished drawing; null where no reading has the chosen figure
   * @param series names of the drawn conditions in their order
   * @param trend a sentence
   * @param trendDrawn whether the drawing has a line with its band
   * @param typical a sentence; empty where nothing can be said
   * @param limit a sentence; empty where there is none
   */
  record History(
      List<Choice> settings,
      List<Choice> figures,
      String settingId,
      String setting,
      String figure,
      @Nullable String svg,
      List<String> series,
      String trend,
      boolean trendDrawn,
      String typical,
      String limit,
      List<PointRow> points,
      List<FigureLine> overview) {

    static History empty(List<Choice> settings, List<Choice> figures) {
      return new History(
          settings, figures, "", "", "", null, List.of(), "", false, "", "", List.of(), List.of());
    }
  }

  record Choice(String value, String text, boolean chosen) {}

  /**
   * One figure in the table of all.
   *
   * @param trend rate per year, or that none is shown
   * @param median of the newest readings of all units of the model; empty with what follows where
   *     none has the figure
   * @param middleHalf from the lower to the upper quartile; empty for few units
   */
  record FigureLine(
      String path,
      String name,
      boolean chosen,
      Shown newest,
      String trend,
      String median,
      String middleHalf,
      String units) {}

  /** One point of the chart. */
  record PointRow(
      String day, String condition, Shown shown, @Nullable String verdict, String readingId) {}
}
