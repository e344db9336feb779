package turnsheet.reading.web;

import java.util.List;
import turnsheet.web.Crumb;

/**
 * One visit as its page shows it.
 *
 * @param closed date; empty while the unit is on the bench
 * @param conditions heads of the columns
 * @param comparable whether two conditions are measured at one speed setting
 */
record VisitPage(
    String id,
    List<Crumb> trail,
    String unitId,
    String unitName,
    String customerId,
    String customerName,
    String modelId,
    String opened,
    String closed,
    String complaint,
    String workDone,
    List<String> conditions,
    List<Row> rows,
    boolean comparable) {

  public boolean isOpen() {
    return closed.isEmpty();
  }

  /** One speed setting. */
  record Row(String settingId, String label, List<Cell> cells) {}

  /** One speed setting under one condition. */
  record Cell(String condition, List<ResultItem> items) {}
}
