package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/**
 * Finds the components of a spectrum that stand out of the noise around them.
 *
 * <p>A peak is a line where it is the highest within a main lobe and its power exceeds the mean
 * noise power around it (from the median of the bins beside it) by a factor that pure noise passes
 * less often than once in about twenty captures. The factor follows from the chi-square law of an
 * averaged spectrum by the cube-root approximation of E. B. Wilson and M. M. Hilferty, Proc. Natl.
 * Acad. Sci. 17 (1931), 684-688.
 */
final class LineFinder {

  private static final int MOST_LINES = 12;
  private static final double SMALLEST_PEAK_PERCENT = 0.0002;

  /** Below this share of the strongest line, window side lobes and rounding can look like lines. */
  private static final double SMALLEST_SHARE = 1e-3;

  /** One-sided normal deviate of about 1e-6 per bin: some 1e4 bins give 0.01 to 0.05 in all. */
  private static final double NORMAL_DEVIATE = 4.8;

  private static final int NEIGHBOUR_BINS = 60;

  private LineFinder() {}

  /**
   * A line.
   *
   * @param noisePercent standard deviation that the noise lends to the peak
   */
  record Found(double rateHertz, double peakPercent, double noisePercent) {}

  /** The strongest lines up to a frequency, strongest first. */
  static List<Found> find(SpeedSpectrum spectrum, double toHertz) {
    int lobe = spectrum.lobeBins();
    int last = Math.min(spectrum.size() - 2, (int) Math.ceil(toHertz / spectrum.stepHertz()));
    double strongest = 0;
    for (int k = lobe; k <= last; k++) {
      strongest = Math.max(strongest, spectrum.power(k));
    }
    double least =
        Math.max(
            SMALLEST_PEAK_PERCENT * SMALLEST_PEAK_PERCENT,
            strongest * SMALLEST_SHARE * SMALLEST_SHARE);
    double factor = quantileOverMean(spectrum.segments(), NORMAL_DEVIATE);
    List<Found> found = new ArrayList<>();
    for (int k = lobe; k <= last; k++) {
      if (spectrum.power(k) >= least && highestAround(spectrum, k, lobe)) {
        double noise = noiseAround(spectrum, k, lobe, last);
        if (spectrum.power(k) > factor * noise) {
          found.add(refined(spectrum, k, noise));
        }
      }
    }
    found.sort(Comparator.comparingDouble(Found::peakPercent).reversed());
    return List.copyOf(found.subList(0, Math.min(MOST_LINES, found.size())));
  }

  private static boolean highestAround(SpeedSpectrum spectrum, int k, int lobe) {
    for (int i = Math.max(1, k - lobe); i <= Math.min(spectrum.size() - 1, k + lobe); i++) {
      if (spectrum.power(i) > spectrum.power(k)) {
        return false;
      }
    }
    return true;
  }

  /** Mean noise power beside a peak; the window is narrower where the rate is low. */
  static double noiseAround(SpeedSpectrum spectrum, int k, int lobe, int last) {
    int reach = NEIGHBOUR_BINS * spectrum.padding();
    int from = Math.max(Math.max(lobe / 2, 1), k - Math.min(reach, k / 2 + lobe));
    int to = Math.min(last, k + Math.min(reach, k + 2 * lobe));
    double[] beside = new double[to - from + 1];
    int n = 0;
    for (int i = from; i <= to; i++) {
      if (Math.abs(i - k) > lobe) {
        beside[n++] = spectrum.power(i);
      }
    }
    if (n == 0) {
      return Double.POSITIVE_INFINITY;
    }
    Arrays.sort(beside, 0, n);
    return beside[n / 2] / quantileOverMean(spectrum.segments(), 0);
  }

  /** Quantile of an average of periodograms of noise over its mean. */
  static double quantileOverMean(int averages, double normalDeviate) {
    double v = 1 / (9.0 * averages);
    double root = 1 - v + normalDeviate * Math.sqrt(v);
    return root * root * root;
  }

  /** The crest of a parabola through the logarithms of three bins. */
  private static Found refined(SpeedSpectrum spectrum, int k, double noise) {
    double a = Math.log(spectrum.power(k - 1));
    double b = Math.log(spectrum.power(k));
    double c = Math.log(spectrum.power(k + 1));
    double bend = a - 2 * b + c;
    double shift = bend < 0 ? 0.5 * (a - c) / bend : 0;
    double power = Math.exp(b - 0.25 * (a - c) * shift);
    // averaging power adds the noise to the line: taken off again
    double peak = Math.sqrt(Math.max(power - noise, 0.25 * power));
    double scatter = Math.sqrt(noise / 2 / spectrum.segments());
    return new Found((k + shift) * spectrum.stepHertz(), peak, scatter);
  }
}
