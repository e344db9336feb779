package turnsheet.core.dsp;

/** The angle of a point in the plane, the same bits on every machine. */
public final class Angle {

  private static final double SMALL = 0.125;

  private Angle() {}

  /**
   * What {@link StrictMath#atan2} gives, within two units of the last place: small angles, the rule
   * where a phase is followed, by the power series of the arc tangent, whose first term left out is
   * below 1e-18 of the angle.
   *
   * @return radians, from -pi to pi
   */
  public static double of(double y, double x) {
    if (!(Math.abs(y) <= SMALL * x) || x == 0) {
      return StrictMath.atan2(y, x);
    }
    double t = y / x;
    double s = t * t;
    double high = 1.0 / 9 + s * (-1.0 / 11 + s * (1.0 / 13 + s * (-1.0 / 15 + s * (1.0 / 17))));
    double low = s * (-1.0 / 3 + s * (1.0 / 5 + s * (-1.0 / 7 + s * high)));
    return t + t * low;
  }
}
