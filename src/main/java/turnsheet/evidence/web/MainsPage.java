package turnsheet.evidence.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Shown;

/**
 * What the mains section shows.
 *
 * @param sentence the answer
 * @param clock what of the uncertainty is the recorder's clock, and what to do about it
 * @param captureId, channel where the form leads
 * @param synchronous whether the visitor says so
 * @param split null where the motor is not said to be synchronous
 * @param frequency null where there are too few stretches to draw
 */
record MainsPage(
    String sentence,
    String clock,
    String captureId,
    int channel,
    boolean synchronous,
    @Nullable Split split,
    @Nullable Picture frequency,
    Shown wander,
    List<Row> harmonics) {

  /** The speed error in its two parts. */
  record Split(String sentence, Shown deviation, Shown supply, Shown rest) {}

  /** One harmonic. */
  record Row(String order, String rate, String level, String overNoise) {}
}
