package turnsheet.core.diagnose.wheel;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.RejectedException;

/**
 * How many places a turn has, and how that is known.
 *
 * @param repeatsAfter edges after which the pattern repeats where that is another number that does
 *     not contradict; null otherwise
 */
record Repetition(int places, WheelFinding.Origin origin, @Nullable Integer repeatsAfter) {

  /** More would not be drawn nor paid for. */
  static final int MOST = 4096;

  /** How much better another number must fit than the one stated; see {@link TeethFinder}. */
  private static final double CONTRADICTS = 14;

  static Repetition of(EdgeTrain train, @Nullable Integer stated, Marks.@Nullable Mark mark)
      throws RejectedException {
    if (mark != null) {
      boolean agrees = stated != null && stated == mark.places();
      return new Repetition(
          mark.places(), agrees ? WheelFinding.Origin.STATED : WheelFinding.Origin.MARK, null);
    }
    TeethFinder finder = new TeethFinder(train);
    int found = finder.find();
    if (stated == null || (stated < 2 && found > 0)) {
      if (found == 0) {
        throw new RejectedException(
            "teethUnknown",
            "No repetition from turn to turn was found in the pulses: state how many come per turn,"
                + " and look closer again.");
      }
      return new Repetition(found, WheelFinding.Origin.REPETITION, null);
    }
    if (stated < 2) {
      throw new RejectedException(
          "oneTooth",
          "With one pulse per turn every period is a whole turn, so nothing repeats within it: the"
              + " wheel cannot be seen.");
    }
    if (stated > MOST) {
      throw new RejectedException(
          "manyTeeth",
          String.format(
              Locale.ROOT, "%d pulses per turn are more than the %d looked at.", stated, MOST));
    }
    boolean kin = found > 0 && (found % stated == 0 || stated % found == 0);
    if (found > 0 && !kin && finder.weight(found) > weight(finder, stated) + CONTRADICTS) {
      return new Repetition(found, WheelFinding.Origin.REPETITION, null);
    }
    return new Repetition(
        stated, WheelFinding.Origin.STATED, kin && found != stated ? found : null);
  }

  private static double weight(TeethFinder finder, int places) {
    return finder.canTell(places) ? finder.weight(places) : 0;
  }
}
