package turnsheet.evidence.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Shown;

/**
 * What the section about the sensor's signal shows.
 *
 * @param smallest the sentence that matters; null where the two readings could not be made
 * @param refusal why not; null otherwise
 * @param edgeNoise whether noise over slope explains the noise of the edges; empty where unknown
 * @param hysteresis the room for a comparator in a sentence
 * @param riding what rides on the pulses
 * @param top how far the band reaches; empty without readings
 * @param readings both readings, figure by figure; empty where they could not be made
 */
record HealthPage(
    @Nullable String smallest,
    @Nullable String refusal,
    String edgeNoise,
    String hysteresis,
    List<Fact> facts,
    Picture pulse,
    List<Riding> riding,
    String top,
    List<Both> readings,
    List<Line> lines) {

  /** One figure; {@code why} says what is missing of it. */
  record Fact(String name, Shown shown) {}

  /** One line beside the pulses. */
  record Riding(
      String cause,
      String rate,
      String level,
      String relative,
      String falseRate,
      String falsePeak) {}

  /** One figure in both readings. */
  record Both(String name, Shown edges, Shown band) {}

  /** One line of the speed in both readings. */
  record Line(
      String rate, String edges, String band, String difference, String predicted, String who) {}
}
