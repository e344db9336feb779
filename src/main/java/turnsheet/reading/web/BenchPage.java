package turnsheet.reading.web;

import java.util.List;

/**
 * What is on the bench.
 *
 * @param summary how many wait, are measured, are outside, are ready
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
    List<Stay> open) {

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
   */
  record Stay(
      String visitId,
      String unitId,
      String unitName,
      String customerName,
      String opened,
      String complaint,
      int captures,
      List<Latest> latest) {}

  record Latest(String setting, String condition, ResultItem item) {}
}
