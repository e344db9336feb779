package turnsheet.core.diagnose.parts;

import org.jspecify.annotations.Nullable;

/**
 * How the machine ran while the capture was made.
 *
 * @param tapeMmPerS nominal tape speed; null where the setting is a turning rate
 * @param turnsPerSecond nominal rotation; null where the setting is a tape speed
 * @param deviationPercent mean speed found, relative to nominal
 * @param deviationLimitPercent half width of that
 * @param mainsHertz frequency of the mains
 * @param mainsLimitHertz half width of that
 */
public record Running(
    @Nullable Double tapeMmPerS,
    @Nullable Double turnsPerSecond,
    double deviationPercent,
    double deviationLimitPercent,
    double mainsHertz,
    double mainsLimitHertz) {

  /**
   * How far the mains strays where it was not measured; a large interconnected grid seldom goes
   * further (common practice, no source).
   */
  public static final double USUAL_MAINS_LIMIT_HERTZ = 0.2;

  public Running {
    Numbers.positive("mains, Hz", mainsHertz);
    if (!(deviationPercent > -100 && Double.isFinite(deviationPercent))) {
      throw new IllegalArgumentException("deviation " + deviationPercent + " %");
    }
    if (!(deviationLimitPercent >= 0 && mainsLimitHertz >= 0)) {
      throw new IllegalArgumentException(
          "within " + deviationLimitPercent + " %, " + mainsLimitHertz + " Hz");
    }
  }

  /** At nominal speed, on mains of exactly that frequency. */
  public static Running nominal(
      @Nullable Double tapeMmPerS, @Nullable Double turnsPerSecond, double mainsHertz) {
    return new Running(tapeMmPerS, turnsPerSecond, 0, 0, mainsHertz, 0);
  }

  double speedFactor() {
    return 1 + deviationPercent / 100;
  }
}
