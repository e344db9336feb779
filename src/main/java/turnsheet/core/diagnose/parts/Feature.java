package turnsheet.core.diagnose.parts;

/** What a part carries round with it that makes rates beside its turning. */
public sealed interface Feature {

  /** Teeth of a gear or marks of a sensor wheel; a count is exact. */
  record Teeth(int count) implements Feature {

    public Teeth {
      Numbers.positive("teeth", count);
    }
  }

  /** Pole pairs of a motor with a supply of its own. */
  record Poles(int pairs) implements Feature {

    public Poles {
      Numbers.positive("pole pairs", pairs);
    }
  }

  /**
   * A rolling bearing whose inner ring turns with the part and whose outer ring stands.
   *
   * @param balls or rollers in one row
   * @param ballMm diameter of one
   * @param pitchMm diameter of the circle of their middles, larger
   * @param contactDegrees contact angle, from 0 to below 90
   */
  record Balls(int balls, double ballMm, double pitchMm, double contactDegrees) implements Feature {

    public Balls {
      Numbers.positive("balls", balls);
      Numbers.positive("ball, mm", ballMm);
      if (!(pitchMm > ballMm && Double.isFinite(pitchMm))) {
        throw new IllegalArgumentException("pitch " + pitchMm + " mm, ball " + ballMm + " mm");
      }
      if (!(contactDegrees >= 0 && contactDegrees < 90)) {
        throw new IllegalArgumentException("contact angle " + contactDegrees + " degrees");
      }
    }

    /** The share d / D cos(a) of which all four rates are made. */
    double share() {
      return ballMm / pitchMm * Math.cos(Math.toRadians(contactDegrees));
    }
  }
}
