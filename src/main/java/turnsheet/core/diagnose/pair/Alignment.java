package turnsheet.core.diagnose.pair;

import turnsheet.core.measure.Figure;

/**
 * How two recordings of the same minute lie to each other.
 *
 * @param offsetSeconds of the second recording's zero in the first one's time
 * @param clockDifferencePpm how much faster the second recording's clock runs, in parts per million
 * @param likeness height of the correlation's peak over its scatter
 */
public record Alignment(Figure offsetSeconds, Figure clockDifferencePpm, double likeness) {

  /** A straight line from one recording's time to the other's. */
  record Clock(double offsetSeconds, double ratio) {
    static final Clock SAME = new Clock(0, 1);

    /** A moment of the second recording in the first one's time. */
    double first(double secondSeconds) {
      return offsetSeconds + ratio * secondSeconds;
    }

    /** A moment of the first recording in the second one's time. */
    double second(double firstSeconds) {
      return (firstSeconds - offsetSeconds) / ratio;
    }
  }
}
