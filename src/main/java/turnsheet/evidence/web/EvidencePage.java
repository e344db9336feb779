package turnsheet.evidence.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Crumb;

/**
 * What a closer look at a capture showed, as its page shows it.
 *
 * @param channel the one shown, counted from 1
 * @param channels all that were measured
 * @param failed why the latest look was given up; null where it was not
 * @param notes what the visitor must know before reading on
 * @param looked whether there is anything to show
 */
record EvidencePage(
    String captureId,
    List<Crumb> trail,
    String title,
    String sentence,
    int channel,
    List<Integer> channels,
    boolean synchronous,
    @Nullable Underway underway,
    @Nullable String failed,
    List<String> notes,
    boolean looked,
    boolean fileMissing,
    List<Part> parts,
    List<String> kinds,
    List<Row> holdings) {

  /** A look that is under way. */
  record Underway(boolean running, double progress) {}

  /**
   * One section.
   *
   * @param content null where there is nothing to show
   * @param refusal why there is nothing; null where it was not looked for yet, and where there is
   */
  record Part(
      String name,
      String title,
      String what,
      String template,
      @Nullable Object content,
      @Nullable String refusal) {}

  /** One kind of evidence and which kinds of capture can hold it. */
  record Row(String title, String what, List<Boolean> held) {}
}
