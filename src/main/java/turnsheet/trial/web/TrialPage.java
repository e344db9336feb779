package turnsheet.trial.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Crumb;

/**
 * One trial as its page shows it.
 *
 * @param running what each printed sheet carries at its foot
 * @param underway null where it is over
 * @param refusal why there is no result, in the core's English; null where there is, or may be
 * @param found null where there is no result
 */
record TrialPage(
    String id,
    String captureId,
    List<Crumb> trail,
    String title,
    String running,
    @Nullable Underway underway,
    boolean cancelled,
    @Nullable String refusal,
    @Nullable Found found) {

  record Underway(boolean running, double progress) {}

  record Fact(String name, String text) {}

  /**
   * The result.
   *
   * @param maps one for each kind tried
   * @param chosen row of the sensible candidate; -1 where there is none
   * @param circuit of the candidate that is open; null where it has none
   */
  record Found(
      String sentence,
      List<Fact> facts,
      List<Map> maps,
      List<Row> rows,
      int chosen,
      @Nullable CircuitPart circuit) {}

  record Map(String title, String svg) {}

  /**
   * One candidate.
   *
   * @param open whether its circuit is on the page
   * @param circuit whether it has one
   */
  record Row(
      int number,
      String name,
      boolean chosen,
      boolean open,
      boolean circuit,
      String signal,
      String hum,
      String delay,
      EdgeCells bare,
      EdgeCells compared) {}

  /** Edges with or without the comparator. */
  record EdgeCells(
      String lost,
      String extra,
      String noise,
      String percent,
      String predicted,
      String moved,
      String lowest,
      String highest) {}

  /** The circuit of one candidate. */
  record CircuitPart(
      String title,
      String lead,
      List<String> stages,
      List<StageRow> sections,
      List<PartRow> parts,
      String response,
      List<List<String>> responseRows,
      String opAmp,
      String band) {}

  record StageRow(
      String name,
      String f0,
      String f0Built,
      String f0Band,
      String q,
      String qBuilt,
      String qBand) {}

  record PartRow(String name, String value, String tolerance) {}

  /** All trials of a capture, and the form for another. */
  record Overview(
      String captureId, List<Crumb> trail, String title, boolean fileMissing, List<Kept> kept) {}

  /** One of them. */
  record Kept(String id, String orderedAt, String what, String standing) {}
}
