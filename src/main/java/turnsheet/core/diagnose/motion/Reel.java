package turnsheet.core.diagnose.motion;

import java.util.Optional;

/**
 * A moving line read as a reel: from its rate follows the radius of the pack, from the bend the
 * thickness of the tape.
 *
 * @param harmonic how many turns of the fluctuation come on one turn of the reel, as spokes or
 *     three feet of a hub give
 * @param emptying whether tape leaves it
 * @param radiusMm of the pack in the middle of the capture: {@code harmonic v / (2 pi f)}
 * @param radiusU expanded uncertainty (k = 2) of that for an exact tape speed
 * @param thicknessUm of the tape: {@code harmonic^2 |bend| v / (4 pi)}, wound without air
 * @param thicknessU expanded uncertainty (k = 2) of that
 */
public record Reel(
    int harmonic,
    boolean emptying,
    double radiusMm,
    double radiusU,
    double thicknessUm,
    double thicknessU) {

  private static final int MOST_HARMONICS = 6;

  /** From the smallest hub of a dictation cassette to the rim of a large reel: common practice. */
  private static final double SMALLEST_MM = 4;

  private static final double LARGEST_MM = 190;

  /** From the tape of the longest cassettes to film: common practice. */
  private static final double THINNEST_UM = 5;

  private static final double THICKEST_UM = 160;

  /**
   * Reads a line so with the fewest turns per turn at which radius and thickness are those of tape.
   *
   * @param tapeMetresPerSecond speed of the tape
   * @return empty where no reel moves so, and for a line that wanders
   */
  public static Optional<Reel> of(MovingLine line, double tapeMetresPerSecond) {
    if (line.motion() == MovingLine.Motion.WANDERING) {
      return Optional.empty();
    }
    double micrometres = 1e6 * tapeMetresPerSecond / (4 * Math.PI);
    for (int n = 1; n <= MOST_HARMONICS; n++) {
      double radius = 1e3 * n * tapeMetresPerSecond / (2 * Math.PI * line.middleHertz());
      double thickness = n * n * Math.abs(line.bendSeconds()) * micrometres;
      double thicknessU = n * n * line.bendU() * micrometres;
      boolean thick = thickness + thicknessU >= THINNEST_UM;
      boolean thin = thickness - thicknessU <= THICKEST_UM;
      if (radius >= SMALLEST_MM && radius <= LARGEST_MM && thick && thin) {
        return Optional.of(
            new Reel(
                n,
                line.bendSeconds() < 0,
                radius,
                radius * line.hertzU() / line.middleHertz(),
                thickness,
                thicknessU));
      }
    }
    return Optional.empty();
  }
}
