package turnsheet.core.diagnose.motion;

/**
 * How fast a reel turns while tape runs at an even speed. The tape that has passed adds to the area
 * of the pack, so the square of its radius, and with it the square of the time of one turn, changes
 * evenly: {@code 1/f(t)^2 = 1/f0^2 + bend t}, with {@code r = v / (2 pi f)} and {@code bend = +-4
 * pi d / v} for tape of thickness d at speed v (elementary geometry; the tape is wound without
 * air).
 *
 * @param middleHertz rate at time 0, the middle of the capture
 * @param bendSeconds change of the squared time of one turn per second: positive where the reel
 *     fills and turns ever slower
 */
record PackLaw(double middleHertz, double bendSeconds) {

  double hertz(double seconds) {
    return 1 / Math.sqrt(squaredTurn(seconds));
  }

  /** Turns made since time 0, negative before: the integral of {@link #hertz}. */
  double turns(double seconds) {
    return 2 * seconds / (Math.sqrt(squaredTurn(seconds)) + 1 / middleHertz);
  }

  /** Whether the reel neither empties nor stands still within so many seconds of the middle. */
  boolean holds(double seconds) {
    return squaredTurn(seconds) > 0 && squaredTurn(-seconds) > 0;
  }

  private double squaredTurn(double seconds) {
    return 1 / (middleHertz * middleHertz) + bendSeconds * seconds;
  }
}
