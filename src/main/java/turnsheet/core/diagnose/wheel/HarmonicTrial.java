package turnsheet.core.diagnose.wheel;

import java.util.Arrays;

/**
 * Whether one harmonic of the turn belongs to the wheel or to the speed, from how it behaves in
 * blocks of the capture.
 *
 * <p>What is cut into the wheel stays the same in angle. A speed variation whose rate is fixed in
 * time slips against the turn when the speed drifts; one that a torque makes, which repeats with
 * the turn and works on an inertia, falls with the square of the speed. Each law is fitted together
 * with a constant; where the better one improves the fit beyond chance, the constant is the
 * wheel's. A kinematic error of the same shaft, such as an eccentric gear on it, stays the same in
 * angle as well: no recording of this wheel can tell it from the wheel.
 */
final class HarmonicTrial {

  private static final int MOST_BLOCKS = 48;
  private static final int FEWEST_BLOCKS = 6;
  private static final int TURNS_A_BLOCK = 3;
  private static final int MOST_RATES = 400;

  /** Improvement of the fit, as an F ratio, that chance does not reach among 400 rates. */
  private static final double BEYOND_CHANCE = 25;

  private final int order;
  private final int places;
  private final int blocks;
  private final double[][] seen;
  private final double[] rateHertz;
  private final double[] seconds;
  private final double[] angle;
  private final double spanSeconds;

  private double wheelRe;
  private double wheelIm;
  private double wheelNoise;
  private double motion;
  private Standing standing = Standing.OPEN;

  /**
   * Tries.
   *
   * @param re coefficient of the whole capture, in periods
   * @param noise mean square of its noise
   */
  HarmonicTrial(
      EdgeTrain train,
      Deviations deviations,
      Numbering numbering,
      int order,
      double re,
      double im,
      double noise) {
    this.order = order;
    wheelRe = re;
    wheelIm = im;
    wheelNoise = noise;
    places = numbering.places();
    int turns = deviations.size() / places;
    blocks = Math.min(MOST_BLOCKS, turns / TURNS_A_BLOCK);
    seen = new double[blocks][2];
    rateHertz = new double[blocks];
    seconds = new double[blocks];
    angle = new double[blocks];
    int first = deviations.from();
    spanSeconds = train.seconds()[first + deviations.size() - 1] - train.seconds()[first];
    if (blocks >= FEWEST_BLOCKS) {
      for (int b = 0; b < blocks; b++) {
        gather(train, deviations, numbering, b, turns);
      }
      judge();
    }
  }

  private void gather(
      EdgeTrain train, Deviations deviations, Numbering numbering, int b, int turns) {
    int from = (int) ((long) turns * b / blocks) * places;
    int to = (int) ((long) turns * (b + 1) / blocks) * places;
    int counted = 0;
    for (int i = from; i < to; i++) {
      int place = numbering.place(i + deviations.from());
      if (place >= 0) {
        seen[b][0] += deviations.periods(i) * Math.cos(turned(place));
        seen[b][1] -= deviations.periods(i) * Math.sin(turned(place));
        counted++;
      }
    }
    seen[b][0] /= Math.max(1, counted);
    seen[b][1] /= Math.max(1, counted);
    double[] t = train.seconds();
    int first = deviations.from() + from;
    int last = deviations.from() + to - 1;
    rateHertz[b] = order * (last - first) / (t[last] - t[first]) / places;
    int middle = (first + last) / 2;
    seconds[b] = t[middle];
    angle[b] = turned(Math.max(0, numbering.place(middle)));
  }

  private double turned(int place) {
    return 2 * Math.PI * ((long) order * place % places) / places;
  }

  private void judge() {
    TwoPartFit torque = new TwoPartFit(seen, torqueLaw());
    TwoPartFit best = torque;
    double low = Arrays.stream(rateHertz).min().orElse(0) - 4 / spanSeconds;
    double high = Arrays.stream(rateHertz).max().orElse(0) + 4 / spanSeconds;
    double step = Math.max(0.2 / spanSeconds, (high - low) / MOST_RATES);
    for (double rate = low; rate <= high; rate += step) {
      TwoPartFit fit = new TwoPartFit(seen, lawOfRate(rate));
      if (fit.separate() && (!best.separate() || fit.rest < best.rest)) {
        best = fit;
      }
    }
    double rest = TwoPartFit.constant(seen).rest;
    double improved = (rest - best.rest) * (blocks - 2);
    if (best.separate()
        && improved > BEYOND_CHANCE * best.rest
        && best.motion() > 4 * best.motionScatter()) {
      standing = Standing.MOTION;
      wheelRe = best.constantRe;
      wheelIm = best.constantIm;
      wheelNoise = best.constantNoise();
      motion = best.motion();
    } else if (torque.separate()
        && 5 * torque.motionScatter() < Math.hypot(wheelRe, wheelIm)
        && torque.motion() < 3 * torque.motionScatter()) {
      standing = Standing.WHEEL;
    }
  }

  private double[][] torqueLaw() {
    double mean = Arrays.stream(rateHertz).average().orElse(1);
    double[][] law = new double[blocks][2];
    for (int b = 0; b < blocks; b++) {
      law[b][0] = mean * mean / (rateHertz[b] * rateHertz[b]);
    }
    return law;
  }

  private double[][] lawOfRate(double hertz) {
    double[][] law = new double[blocks][2];
    for (int b = 0; b < blocks; b++) {
      double phase = 2 * Math.PI * hertz * seconds[b] - angle[b];
      law[b][0] = Math.cos(phase);
      law[b][1] = Math.sin(phase);
    }
    return law;
  }

  Standing standing() {
    return standing;
  }

  /** Coefficient of the wheel's own part, in periods. */
  double wheelRe() {
    return wheelRe;
  }

  double wheelIm() {
    return wheelIm;
  }

  double wheelNoise() {
    return wheelNoise;
  }

  /** Size of the coefficient of the true speed variation, in periods; 0 where none was told. */
  double motion() {
    return motion;
  }
}
