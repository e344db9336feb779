package turnsheet.core.diagnose.motion;

import java.util.List;

/**
 * A line whose rate changes while the capture runs.
 *
 * @param motion how it moves
 * @param startHertz rate at the beginning of the stretch over which it was followed
 * @param middleHertz rate in the middle of that
 * @param endHertz rate at its end
 * @param hertzU expanded uncertainty (k = 2) of the rate in the middle
 * @param bendSeconds change of the squared time of one turn, in s² per s; of a line that wanders
 *     only its trend
 * @param bendU expanded uncertainty (k = 2) of that
 * @param peakPercent amplitude, in percent of the mean speed
 * @param track where it was, in order of time
 */
public record MovingLine(
    Motion motion,
    double startHertz,
    double middleHertz,
    double endHertz,
    double hertzU,
    double bendSeconds,
    double bendU,
    double peakPercent,
    List<Place> track) {

  public MovingLine {
    track = List.copyOf(track);
  }

  /** How a line moves. */
  public enum Motion {
    /** ever faster, as a reel does that runs empty */
    FASTER,
    /** ever slower, as a reel does that fills */
    SLOWER,
    /** to and fro, by no law of a reel */
    WANDERING
  }

  /** Where it was at a time. */
  public record Place(double seconds, double hertz, double peakPercent) {}
}
