package turnsheet.reading.web;

import java.util.List;

/**
 * What is on the bench.
 *
 * @param summary how many wait, are measured, are outside, are ready
 * @param arrived not measured yet
 * @param working measured, and neither outside nor ready
 * @param today measured since midnight
 * @param empty whether no visit is open
 * @param start what a visit needs and whether it is there
 */
record BenchPage(
    String summary,
    Start start,
    List<Recording> waiting,
    List<Recording> measuring,
    List<Recording> refused,
    List<Stay> outside,
    List<Stay> ready,
    List<Stay> arrived,
    List<Stay> working,
    List<Recording> today,
    boolean empty) {

  /** Which of the things that a visit needs are there. */
  record Start(boolean models, boolean customers, boolean units) {
    public boolean isOver() {
      return models && customers && units;
    }
  }

  /** One capture and where it belongs. */
  record Recording(
      String visitId, String unitName, String setting, String condition, ResultItem item) {}

  /**
   * One open visit.
   *
   * @param latest the last measured capture of each speed setting
   * @param captures how many it has
   * @param next what it waits for
   * @param nextHref where that is done
   */
  record Stay(
      String visitId,
      String unitId,
      String unitName,
      String customerName,
      String opened,
      String complaint,
      int captures,
      String next,
      String nextHref,
      List<Latest> latest) {}

  record Latest(String setting, String condition, ResultItem item) {}
}
