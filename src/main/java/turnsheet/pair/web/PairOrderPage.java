package turnsheet.pair.web;

import java.util.List;
import turnsheet.web.Crumb;

/**
 * The form that orders a comparison.
 *
 * @param choices every channel that can be one of the sensors
 * @param original the choice to begin with
 * @param replacement the choice to begin with
 * @param teeth pulses per turn as confirmed; empty where nobody said
 * @param lone whether there is nothing to compare with
 * @param earlier comparisons made before
 */
record PairOrderPage(
    String captureId,
    List<Crumb> trail,
    List<Choice> choices,
    String original,
    String replacement,
    String teeth,
    boolean lone,
    List<Earlier> earlier) {

  /** A channel of a recording. */
  record Choice(String value, String label) {}

  /** A comparison made before. */
  record Earlier(String id, String made, String by) {}
}
