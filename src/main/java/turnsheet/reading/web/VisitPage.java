package turnsheet.reading.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Crumb;

/**
 * One visit as its page shows it.
 *
 * @param closed date; empty while the unit is on the bench
 * @param sensor which one was fitted; null where the old one stayed
 * @param conditions heads of the columns
 * @param measured whether there is anything for a sheet
 * @param next what the visit waits for
 * @param nextHref where that is done; empty once it is closed
 * @param plate whether it has a photograph of the type plate
 * @param usualCondition of what comes in now
 * @param incoming not confirmed yet
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
    List<String> parts,
    @Nullable String sensor,
    List<String> conditions,
    List<Row> rows,
    boolean measured,
    String next,
    String nextHref,
    boolean plate,
    String usualCondition,
    List<Incoming> incoming) {

  public boolean isOpen() {
    return closed.isEmpty();
  }

  /** Whether a line of the incoming recordings can be confirmed. */
  public boolean isConfirmable() {
    return isOpen() && incoming.stream().anyMatch(i -> i.refusal().isEmpty());
  }

  /**
   * A recording that waits to be confirmed, or was refused before it had a place.
   *
   * @param what what was recognised in it
   * @param fit word of {@link turnsheet.capture.SettingFit}; empty where the bench said the setting
   * @param settingId proposed; empty where the bench must choose
   * @param refusal sentence; empty where it can be confirmed
   */
  record Incoming(
      String captureId,
      String fileName,
      String what,
      String fit,
      String settingId,
      String condition,
      String refusal) {}

  /** One speed setting. */
  record Row(String settingId, String label, List<Cell> cells) {}

  /** One speed setting under one condition. */
  record Cell(String condition, List<ResultItem> items) {}
}
