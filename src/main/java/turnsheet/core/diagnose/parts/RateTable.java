package turnsheet.core.diagnose.parts;

import java.util.ArrayList;
import java.util.List;

/**
 * All rates at which the parts of a machine can leave lines.
 *
 * <p>A part that turns: its rate and three harmonics. Teeth and poles: their rate, twice that, and
 * two side lines to each side at the turning rate. A rolling bearing with a turning inner ring, n
 * balls of diameter d on a pitch circle D at a contact angle a, x = d / D cos(a), shaft rate f:
 * cage f/2 (1 - x), outer race n f/2 (1 - x), inner race n f/2 (1 + x), ball D f / (2 d) (1 - x^2)
 * (kinematics of rolling without sliding, as in any textbook of machine diagnosis); side lines of
 * the inner race at the shaft's rate, of the ball at the cage's. Real balls slide a little, so that
 * the rates are one to two percent off these (Randall and Antoni, Mechanical Systems and Signal
 * Processing 25, 2011, quoted from memory).
 */
public final class RateTable {

  private static final int HARMONICS = 4;
  private static final int TOOTH_HARMONICS = 2;
  private static final int RACE_HARMONICS = 3;
  private static final int SIDE_LINES = 2;
  private static final double SLIDING = 0.02;

  private static final MachinePart HUM =
      new MachinePart("mains hum", PartKind.MAINS, new Drive.Supply(1, 0, 0), null, null);

  private final List<ExpectedRate> rates = new ArrayList<>();

  private RateTable() {}

  /** The rates of all parts, in the order of the parts; hum last. */
  public static List<ExpectedRate> of(List<MachinePart> parts, Running running) {
    RateTable table = new RateTable();
    Kinematics kinematics = new Kinematics(parts, running);
    for (MachinePart part : parts) {
      kinematics.of(part).ifPresent(turning -> table.add(part, turning, kinematics));
    }
    boolean motorOnMains = parts.stream().anyMatch(p -> p.drive() instanceof Drive.Supply);
    if (!motorOnMains) {
      table.harmonics(HUM, Cause.HUM, kinematics.mains(), HARMONICS);
    }
    return List.copyOf(table.rates);
  }

  private void add(MachinePart part, Turning turning, Kinematics kinematics) {
    harmonics(part, Cause.TURN, turning, HARMONICS);
    if (part.drive() instanceof Drive.Supply) {
      harmonics(part, Cause.SUPPLY, kinematics.mains(), HARMONICS);
    }
    if (part.feature() instanceof Feature.Teeth teeth) {
      counted(part, Cause.TEETH, turning, teeth.count());
    } else if (part.feature() instanceof Feature.Poles poles) {
      counted(part, Cause.POLES, turning, poles.pairs());
    } else if (part.feature() instanceof Feature.Balls balls) {
      bearing(part, balls, turning);
    }
  }

  private void harmonics(MachinePart part, Cause cause, Turning own, int highest) {
    for (int h = 1; h <= highest; h++) {
      rates.add(ExpectedRate.harmonic(part, cause, h, own));
    }
  }

  /** A count is exact, so that carrier and side lines are whole multiples of one turning rate. */
  private void counted(MachinePart part, Cause cause, Turning turning, int count) {
    for (int h = 1; h <= TOOTH_HARMONICS; h++) {
      rates.add(ExpectedRate.harmonic(part, cause, h, turning.times(count)));
      for (int n = 1; n <= SIDE_LINES; n++) {
        if (h * count - n > HARMONICS) {
          rates.add(side(part, cause, h, -n, turning.times(h * count - n)));
        }
        rates.add(side(part, cause, h, n, turning.times(h * count + n)));
      }
    }
  }

  private void bearing(MachinePart part, Feature.Balls balls, Turning turning) {
    double x = balls.share();
    // ball and pitch diameter each within the tolerance
    double dx =
        2
            * x
            * (part.tolerancePercent() == null
                ? Kinematics.USUAL_TOLERANCE
                : part.tolerancePercent() / 100);
    double n = balls.balls();
    Turning cage = turning.times((1 - x) / 2).within(dx / (1 - x)).within(SLIDING);
    Turning outer = cage.times(n);
    Turning inner = turning.times(n * (1 + x) / 2).within(dx / (1 + x)).within(SLIDING);
    Turning ball =
        turning
            .times((1 - x * x) * balls.pitchMm() / (2 * balls.ballMm()))
            .within(dx / x * (1 + x * x) / (1 - x * x))
            .within(SLIDING);
    harmonics(part, Cause.CAGE, cage, 2);
    harmonics(part, Cause.OUTER_RACE, outer, RACE_HARMONICS);
    modulated(part, Cause.INNER_RACE, inner, turning, RACE_HARMONICS);
    modulated(part, Cause.BALL, ball, cage, 2);
  }

  private void modulated(
      MachinePart part, Cause cause, Turning carrier, Turning modulator, int highest) {
    for (int h = 1; h <= highest; h++) {
      Turning own = carrier.times(h);
      rates.add(ExpectedRate.harmonic(part, cause, h, carrier));
      for (int n = -SIDE_LINES; n <= SIDE_LINES; n++) {
        double low = own.lowHertz() + n * modulator.lowHertz();
        if (n != 0 && low > 0) {
          double high = own.highHertz() + n * modulator.highHertz();
          // the carrier's own error, absolute, is by far the larger of the two
          double scale = own.hertz() / ((low + high) / 2);
          Turning rate =
              new Turning(
                  low, high, own.limit() * scale, own.variance() * scale * scale, own.lock());
          rates.add(side(part, cause, h, n, rate));
        }
      }
    }
  }

  private static ExpectedRate side(
      MachinePart part, Cause cause, int harmonic, int n, Turning rate) {
    return new ExpectedRate(part, cause, harmonic, n, rate, 1 / (2.0 * harmonic * Math.abs(n)));
  }
}
