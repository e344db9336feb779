package turnsheet.capture;

import java.util.Arrays;
import java.util.Optional;

/**
 * How a played tone came onto what was played. Practice names it beside the figure, because a unit
 * that recorded the tone itself adds its own flutter twice (Handbook for Sound Engineers, chapter
 * on magnetic recording).
 */
public enum ToneMethod {
  /** a tape or record made elsewhere was only replayed */
  REPLAY("replay"),
  /** the unit recorded the tone and replayed its own recording */
  RECORD_REPLAY("recordAndReplay");

  private final String word;

  ToneMethod(String word) {
    this.word = word;
  }

  /** As the database, forms and the REST API say it. */
  public String word() {
    return word;
  }

  public static Optional<ToneMethod> ofWord(String word) {
    return Arrays.stream(values()).filter(m -> m.word.equals(word)).findFirst();
  }
}
