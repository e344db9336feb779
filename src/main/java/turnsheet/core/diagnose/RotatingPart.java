package turnsheet.core.diagnose;

/**
 * A part that turns, at the speed setting of the capture.
 *
 * @param name as the bench calls it
 * @param rateHertz turns per second
 */
public record RotatingPart(String name, double rateHertz) {

  public RotatingPart {
    if (!(rateHertz > 0 && Double.isFinite(rateHertz))) {
      throw new IllegalArgumentException(name + " at " + rateHertz + " Hz");
    }
  }

  /**
   * The part on a unit that runs fast or slow as a whole.
   *
   * @param percent mean speed deviation of the capture
   */
  public RotatingPart atDeviation(double percent) {
    return new RotatingPart(name, rateHertz * (1 + percent / 100));
  }
}
