package turnsheet.core.diagnose.motion;

import java.util.Arrays;
import java.util.function.DoubleFunction;

/**
 * Fits a line that follows the law of a reel to a whole capture at once: the strongest sum over the
 * samples turned back by the law, Hann-weighted. Rate and bend hardly disturb each other, as one is
 * odd and the other even about the middle, and are improved in turn by parabolas.
 *
 * <p>Standard uncertainties follow from the noise beside the line by first-order propagation; for
 * an unbent line they are those of D. C. Rife and R. R. Boorstyn, IEEE Trans. Inf. Theory 20
 * (1974), 591-598, but for the window.
 */
final class PackFit {

  private static final int ROUNDS = 12;

  /**
   * Sums over as many parts of the capture are kept for one start: within a part the laws that are
   * tried stray from the start by a tenth of a radian at most, those beside it for the noise by a
   * third.
   */
  private static final int PARTS = 256;

  private static final int BESIDE = 8;

  private final double[] samples;
  private final double rateHertz;
  private final double middle;
  private final double[] weights;
  private final double weightSum;

  /**
   * @param samples percent
   */
  PackFit(double[] samples, double rateHertz) {
    this.samples = samples;
    this.rateHertz = rateHertz;
    this.middle = (samples.length - 1) / 2.0;
    weights = turnsheet.core.dsp.Window.HANN.values(samples.length);
    weightSum = Arrays.stream(weights).sum();
  }

  /**
   * What was found.
   *
   * @param hertzU standard uncertainty of the rate in the middle
   * @param bendU standard uncertainty of the bend
   * @param peakPercent amplitude
   * @param peakU its standard uncertainty
   */
  record Fit(PackLaw law, double hertzU, double bendU, double peakPercent, double peakU) {}

  Fit from(PackLaw start) {
    Sums sums = new Sums(start);
    double seconds = samples.length / rateHertz;
    double cube = Math.pow(start.middleHertz(), 3);
    double hertzStep = 0.4 / seconds;
    double bendStep = 4 / (seconds * seconds * cube);
    PackLaw law = start;
    for (int round = 0; round < ROUNDS; round++) {
      PackLaw now = law;
      law = best(sums, law, hertzStep, s -> new PackLaw(now.middleHertz() + s, now.bendSeconds()));
      PackLaw next = law;
      law = best(sums, law, bendStep, s -> new PackLaw(next.middleHertz(), next.bendSeconds() + s));
      if (round >= 3) {
        hertzStep *= 0.6;
        bendStep *= 0.6;
      }
    }
    double peak = Math.sqrt(sums.power(law));
    double noise = Math.sqrt(noisePower(sums, law, seconds));
    PackLaw found = law;
    double hertzU = noise / peak * spread(t -> 2 * Math.PI * t);
    double bendU =
        noise / peak * spread(t -> Math.PI / 2 * Math.pow(found.middleHertz(), 3) * t * t);
    return new Fit(law, hertzU, bendU, peak, noise / Math.sqrt(2));
  }

  /** The best of three laws a step apart, or the crest of the parabola through them. */
  private PackLaw best(Sums sums, PackLaw law, double step, DoubleFunction<PackLaw> moved) {
    double here = sums.power(law);
    double low = sums.power(moved.apply(-step));
    double high = sums.power(moved.apply(step));
    double bend = low - 2 * here + high;
    double shift = bend < 0 ? 0.5 * (low - high) / bend : low > high ? -1 : 1;
    PackLaw crest = moved.apply(step * Math.max(-1, Math.min(1, shift)));
    double best = Math.max(Math.max(low, high), here);
    if (sums.power(crest) >= best) {
      return crest;
    }
    return here == best ? law : moved.apply(low == best ? -step : step);
  }

  /** The weighted samples turned back by one law, summed part by part. */
  private final class Sums {
    private final PackLaw start;
    private final double[] re = new double[PARTS];
    private final double[] im = new double[PARTS];

    Sums(PackLaw start) {
      this.start = start;
      for (int i = 0; start.holds(middle / rateHertz) && i < samples.length; i++) {
        double angle = 2 * Math.PI * start.turns((i - middle) / rateHertz);
        double x = samples[i] * weights[i];
        int part = (int) ((long) i * PARTS / samples.length);
        re[part] += x * Math.cos(angle);
        im[part] -= x * Math.sin(angle);
      }
    }

    /** Squared amplitude of what follows a law near the start, in squared percent; 0 for none. */
    double power(PackLaw law) {
      if (law.middleHertz() <= 0 || !law.holds(middle / rateHertz)) {
        return 0;
      }
      double sumRe = 0;
      double sumIm = 0;
      for (int p = 0; p < PARTS; p++) {
        double t = ((p + 0.5) / PARTS * samples.length - 0.5 - middle) / rateHertz;
        double angle = 2 * Math.PI * (law.turns(t) - start.turns(t));
        double c = Math.cos(angle);
        double s = Math.sin(angle);
        sumRe += re[p] * c + im[p] * s;
        sumIm += im[p] * c - re[p] * s;
      }
      double scale = 2 / weightSum;
      return scale * scale * (sumRe * sumRe + sumIm * sumIm);
    }
  }

  /** Mean squared amplitude that noise alone shows, from the median beside the line. */
  private static double noisePower(Sums sums, PackLaw law, double seconds) {
    double[] beside = new double[2 * BESIDE];
    for (int i = 0; i < BESIDE; i++) {
      double off = (3 + 1.5 * i) / seconds;
      beside[2 * i] = sums.power(new PackLaw(law.middleHertz() + off, law.bendSeconds()));
      beside[2 * i + 1] =
          sums.power(new PackLaw(Math.max(0, law.middleHertz() - off), law.bendSeconds()));
    }
    double[] known = Arrays.stream(beside).filter(p -> p > 0).sorted().toArray();
    return known.length == 0 ? 0 : known[known.length / 2] / Math.log(2);
  }

  /**
   * Standard uncertainty of a parameter for noise as large as the line.
   *
   * @param phase change of the phase with the parameter, in radians, at a time
   */
  private double spread(java.util.function.DoubleUnaryOperator phase) {
    double mean = 0;
    for (int i = 0; i < weights.length; i++) {
      mean += weights[i] * phase.applyAsDouble((i - middle) / rateHertz) / weightSum;
    }
    double curvature = 0;
    double noise = 0;
    double squares = 0;
    for (int i = 0; i < weights.length; i++) {
      double g = phase.applyAsDouble((i - middle) / rateHertz) - mean;
      curvature += weights[i] * g * g / weightSum;
      noise += weights[i] * weights[i] * g * g;
      squares += weights[i] * weights[i];
    }
    return Math.sqrt(noise / squares / 2) / curvature;
  }
}
