package turnsheet.core.synth;

import java.util.List;

/**
 * A speed with a closed form: {@code v(t) = 1 + deviation + slope t + sum of a sin(2 pi f t + phi)}
 * relative to nominal. Its integral, the distance travelled, is closed as well, so that a capture
 * made from it has an exact truth.
 *
 * @param deviation constant part, relative (0.01 is one percent fast)
 * @param slopePerSecond change of the relative speed per second
 * @param lines sinusoidal fluctuation
 */
public record SpeedFunction(double deviation, double slopePerSecond, List<Line> lines) {

  public SpeedFunction {
    lines = List.copyOf(lines);
  }

  /**
   * One sinusoid of the speed.
   *
   * @param rateHertz of the fluctuation
   * @param peak relative to nominal speed
   * @param phaseRadians at time zero
   */
  public record Line(double rateHertz, double peak, double phaseRadians) {}

  /** A constant speed. */
  public static SpeedFunction constant(double deviation) {
    return new SpeedFunction(deviation, 0, List.of());
  }

  /** The same with one more line of a peak given in percent of nominal speed. */
  public SpeedFunction plusLine(double rateHertz, double peakPercent, double phaseRadians) {
    var more = new java.util.ArrayList<>(lines);
    more.add(new Line(rateHertz, peakPercent / 100, phaseRadians));
    return new SpeedFunction(deviation, slopePerSecond, more);
  }

  /** Relative speed at a time, 1 at nominal. */
  public double at(double seconds) {
    double v = 1 + deviation + slopePerSecond * seconds;
    for (Line line : lines) {
      v += line.peak * Math.sin(2 * Math.PI * line.rateHertz * seconds + line.phaseRadians);
    }
    return v;
  }

  /** Distance travelled since time zero, in seconds of nominal speed. */
  public double travelled(double seconds) {
    double x = (1 + deviation) * seconds + slopePerSecond * seconds * seconds / 2;
    for (Line line : lines) {
      double w = 2 * Math.PI * line.rateHertz;
      // sin a - sin b form keeps digits where the plain difference of cosines would lose them
      x +=
          line.peak
              * 2
              * Math.sin(w * seconds / 2)
              * Math.sin(w * seconds / 2 + line.phaseRadians)
              / w;
    }
    return x;
  }

  /** The time at which a distance has been travelled; the speed must stay positive. */
  public double timeOf(double travelled) {
    double t = travelled / (1 + deviation);
    for (int i = 0; i < 50; i++) {
      double step = (travelled(t) - travelled) / at(t);
      t -= step;
      if (Math.abs(step) <= 1e-15 * Math.abs(t) + 1e-18) {
        break;
      }
    }
    return t;
  }
}
