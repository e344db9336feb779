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
 * @param chart null where no reading has the chosen figure
 * @param series names of the drawn conditions in their order
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
    List<VisitRow> visits,
    List<Choice> settings,
    List<Choice> figures,
    @Nullable Drawn chart,
    List<String> series,
    List<PointRow> points,
    String limit) {

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

  record Choice(String value, String text, boolean chosen) {}

  /** One point of the chart. */
  record PointRow(
      String day, String condition, Shown shown, @Nullable String verdict, String readingId) {}
}
