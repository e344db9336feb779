package turnsheet.core.diagnose.mains;

import java.util.ArrayList;
import java.util.List;

/**
 * Looks for a fundamental within one percent of 50 or 60 Hz whose harmonics stand out together: the
 * sum over the harmonics of log(1 + power over noise) decides, so that several lines at multiples
 * of one frequency outweigh a single strong one.
 *
 * <p>The frequency is the mean of the harmonics' own, each divided by its order and weighted by its
 * information: order squared times power over noise.
 */
final class HumFinder {

  /** EN 50160: within 1 % for 99.5 % of a year (interconnected supply), from memory. */
  static final double REACH = 0.01;

  static final int MOST_ORDERS = 10;

  /** Noise alone passes this with a chance of 6e-6 for one bin. */
  static final double STANDS_OUT = 12;

  private static final double NOISE_TO_HERTZ = 12;

  /**
   * Mains that wander spread their higher harmonics over many bins, whose crests then lie apart.
   */
  private static final double WANDER_HERTZ = 0.03;

  /** Parts that turn at half, a third or a quarter of a line's rate have lines between its own. */
  private static final double[] BETWEEN = {1 / 2.0, 1 / 3.0, 2 / 3.0, 1 / 4.0, 3 / 4.0};

  private final HumSpectrum spectrum;
  private final Hidden hidden;

  HumFinder(HumSpectrum spectrum, Hidden hidden) {
    this.spectrum = spectrum;
    this.hidden = hidden;
  }

  /** Where hum cannot be told from the signal itself. */
  @FunctionalInterface
  interface Hidden {
    boolean at(double hertz);
  }

  /**
   * One harmonic that stands out.
   *
   * @param overNoise its power over that of the noise around it
   */
  record Line(int order, double hertz, double power, double overNoise) {

    /** Information about the fundamental, up to a common factor. */
    double weight() {
      return order * (double) order * overNoise;
    }
  }

  /**
   * What was found about one nominal frequency.
   *
   * @param joint see the class
   */
  record Found(double hertz, List<Line> lines, double joint) {

    /**
     * Standard uncertainty that the noise leaves.
     *
     * <p>Source: D. C. Rife and R. R. Boorstyn, IEEE Trans. Inf. Theory 20 (1974), 591-598, bound
     * for one sine of peak A in noise of one-sided density S over a time T: var f = 12 S / ((2
     * pi)^2 A^2 T^3), value from memory; the Hann window takes 28.1 in place of 12 (worked out: the
     * ratio of the integral of w^2 t^2 to the squared one of w t^2); harmonics add their
     * information.
     */
    double noiseHertz(double seconds) {
      double weights = lines.stream().mapToDouble(Line::weight).sum();
      // a Hann spectrum's noise power is 3 S / T in this scale, so A^2/S = 3 / T times overNoise
      return Math.sqrt(28.1 / (3 * 4 * Math.PI * Math.PI * weights)) / seconds;
    }
  }

  /** Harmonics about a nominal frequency; no lines where none stands out. */
  Found about(double nominalHertz, double topHertz) {
    return near(nominalHertz, REACH * nominalHertz, orders(nominalHertz, topHertz), WANDER_HERTZ);
  }

  /** Orders of the harmonics that would not hide in the signal. */
  List<Integer> orders(double nominalHertz, double topHertz) {
    List<Integer> orders = new ArrayList<>();
    for (int k = 1; k <= MOST_ORDERS && k * nominalHertz * (1 + REACH) < topHertz; k++) {
      if (!hidden.at(k * nominalHertz)) {
        orders.add(k);
      }
    }
    return orders;
  }

  /**
   * Harmonics of given orders whose fundamental lies within a reach.
   *
   * @param apartHertz how far apart the fundamentals may lie that they tell, beside their noise
   */
  Found near(double aboutHertz, double reachHertz, List<Integer> orders, double apartHertz) {
    double[] noise = new double[MOST_ORDERS + 1];
    int highest = 1;
    for (int k : orders) {
      double inner = k * reachHertz + 4 / spectrum.seconds();
      noise[k] = spectrum.noise(k * aboutHertz, inner, inner + NOISE_TO_HERTZ);
      highest = k;
    }
    double step = 1 / (8 * highest * spectrum.seconds());
    double best = aboutHertz;
    double joint = 0;
    for (double f = aboutHertz - reachHertz; f <= aboutHertz + reachHertz; f += step) {
      double sum = 0;
      for (int k : orders) {
        sum += Math.log1p(spectrum.power(k * f) / noise[k]);
      }
      if (sum > joint) {
        joint = sum;
        best = f;
      }
    }
    List<Line> lines = new ArrayList<>();
    for (int k : orders) {
      HumSpectrum.Peak peak = spectrum.peak(k * best, 0.8 / spectrum.seconds());
      if (peak.power() > STANDS_OUT * noise[k]) {
        lines.add(new Line(k, peak.hertz(), peak.power(), peak.power() / noise[k]));
      }
    }
    List<Line> agreeing = agreeing(lines, apartHertz);
    return new Found(mean(agreeing), agreeing, joint);
  }

  /** Whether lines between the harmonics show that it is a turning part. */
  boolean turns(double hertz) {
    for (int k = 0; k < 4; k++) {
      for (double share : BETWEEN) {
        double between = (k + share) * hertz;
        double noise = spectrum.noise(between, 4 / spectrum.seconds(), NOISE_TO_HERTZ);
        if (between > 5
            && !hidden.at(between)
            && spectrum.peak(between, 1 / spectrum.seconds()).power() > 2 * STANDS_OUT * noise) {
          return true;
        }
      }
    }
    return false;
  }

  /** Without those that lie elsewhere than the others say, by more than their noise. */
  private List<Line> agreeing(List<Line> lines, double apartHertz) {
    List<Line> kept = new ArrayList<>(lines);
    while (kept.size() > 1) {
      double middle = median(kept);
      Line worst = kept.get(0);
      double most = 0;
      for (Line line : kept) {
        double own = new Found(0, List.of(line), 0).noiseHertz(spectrum.seconds());
        double allowed = 5 * own + 0.1 / (line.order() * spectrum.seconds()) + apartHertz;
        double off = Math.abs(line.hertz() / line.order() - middle) / allowed;
        if (off > most) {
          most = off;
          worst = line;
        }
      }
      if (most <= 1) {
        break;
      }
      kept.remove(worst);
    }
    return List.copyOf(kept);
  }

  /** By weight, so that a weak line does not speak as loud as a strong one. */
  private static double median(List<Line> lines) {
    List<Line> sorted =
        lines.stream()
            .sorted((a, b) -> Double.compare(a.hertz() / a.order(), b.hertz() / b.order()))
            .toList();
    double half = lines.stream().mapToDouble(l -> Math.log1p(l.weight())).sum() / 2;
    double sum = 0;
    for (Line line : sorted) {
      sum += Math.log1p(line.weight());
      if (sum >= half) {
        return line.hertz() / line.order();
      }
    }
    return Double.NaN;
  }

  private static double mean(List<Line> lines) {
    double sum = 0;
    double weights = 0;
    for (Line line : lines) {
      sum += line.weight() * line.hertz() / line.order();
      weights += line.weight();
    }
    return weights == 0 ? Double.NaN : sum / weights;
  }
}
