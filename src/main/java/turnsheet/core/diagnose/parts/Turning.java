package turnsheet.core.diagnose.parts;

/**
 * A rate with how well it is known. For most parts low and high are equal; a reel and an induction
 * motor have a range in which the rate surely lies.
 *
 * @param lowHertz low end of the range
 * @param highHertz high end of the range
 * @param limit largest relative error, in which the limits of all that it follows from add up
 * @param variance relative; a limit counts as the half width of a rectangle (JCGM 100, 4.3.7) and
 *     the causes as independent
 */
public record Turning(double lowHertz, double highHertz, double limit, double variance, Lock lock) {

  static Turning exact(double hertz, Lock lock) {
    return new Turning(hertz, hertz, 0, 0, lock);
  }

  /** The same made less certain by one more cause. */
  Turning within(double relative) {
    return new Turning(
        lowHertz, highHertz, limit + relative, variance + relative * relative / 3, lock);
  }

  Turning times(double factor) {
    return new Turning(lowHertz * factor, highHertz * factor, limit, variance, lock);
  }

  /** The middle of the range. */
  public double hertz() {
    return (lowHertz + highHertz) / 2;
  }

  /** Largest error beyond the range. */
  public double limitHertz() {
    return limit * highHertz;
  }

  /** Standard uncertainty beyond the range. */
  public double standardHertz() {
    return Math.sqrt(variance) * hertz();
  }

  /** Whether the rate is known to lie in a range only. */
  public boolean isRange() {
    return highHertz > lowHertz;
  }

  /** How far a rate lies above the range, negative below it, zero within. */
  public double distance(double rateHertz) {
    return rateHertz < lowHertz
        ? rateHertz - lowHertz
        : rateHertz > highHertz ? rateHertz - highHertz : 0;
  }
}
