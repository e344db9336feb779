package turnsheet.reading.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Shown;

/**
 * What a reading shows over time, and for the ear.
 *
 * @param sentence what moves, or that nothing does
 * @param svg the map; null where the capture is too short for one
 * @param window what the map's darkness and width of time mean
 * @param lines that move
 * @param sound what can be listened to; null where the fluctuation was not kept
 */
record MotionPage(
    String sentence, @Nullable String svg, String window, List<Line> lines, @Nullable Sound sound) {

  /** A line that moves. */
  record Line(Shown start, Shown middle, Shown end, Shown peak, String how, String about) {}

  /**
   * The player.
   *
   * @param address of the sound
   * @param explained what is heard
   * @param bands the whole and each line, to choose from
   * @param factors how much faster, to choose from
   */
  record Sound(String address, String explained, List<ChoiceOf> bands, List<ChoiceOf> factors) {}

  /** One of several. */
  record ChoiceOf(String value, String text, boolean chosen) {}
}
