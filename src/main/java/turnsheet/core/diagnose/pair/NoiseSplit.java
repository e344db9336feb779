package turnsheet.core.diagnose.pair;

/**
 * Splits what two series do not share between them, as white noise of their edges.
 *
 * <p>An error of the time at which an edge is seen with the one-sided density S_x becomes an error
 * of the speed with the density (2 pi f)^2 S_x, and independent errors of standard deviation s at R
 * edges per second have S_x = 2 s^2 / R. So the density of each sensor's own part is a f^2 with one
 * number a for each, fitted over all rates that both traces show in full, every rate with the
 * weight that its scatter leaves it.
 *
 * <p>Scatter, for Gaussian series with the densities M + N1 and M + N2 that share M: the variance
 * of the mean of n values of |X1|^2 - Re(X1 X2*) is (N1^2 + (M (N1 + N2) + N1 N2) / 2) / n, the
 * covariance with its counterpart (N1 N2 - M (N1 + N2)) / (2 n). Worked out from the moments of
 * complex normal variables (J. S. Bendat and A. G. Piersol, "Random data").
 *
 * @param first of the first series, a in 1/Hz^3
 * @param second of the second
 * @param covariance of both
 */
record NoiseSplit(Level first, Level second, double covariance) {

  private static final double LOWEST_HERTZ = 1;
  private static final int PASSES = 4;

  /** Below this share of both together a level only serves to weigh with. */
  private static final double SMALLEST_SHARE = 1e-3;

  /**
   * One level.
   *
   * @param variance of the value
   * @param steepness how many standard deviations the upper half of the rates lies above the lower
   */
  record Level(double value, double variance, double steepness) {}

  static NoiseSplit of(PairSpectra spectra, OwnLines lines) {
    double[] ofEven = start(spectra, spectra.even(), lines);
    double[] ofOdd = start(spectra, spectra.odd(), lines);
    Sums[] sums = new Sums[0];
    for (int pass = 0; pass < PASSES; pass++) {
      // the weights of each half from the other half
      Sums[] even = sums(spectra, spectra.even(), spectra.odd(), ofOdd, lines);
      Sums[] odd = sums(spectra, spectra.odd(), spectra.even(), ofEven, lines);
      ofEven = floored(even);
      ofOdd = floored(odd);
      sums = new Sums[] {even[0].plus(odd[0]), even[1].plus(odd[1])};
    }
    double[] n = floored(sums);
    return new NoiseSplit(
        level(spectra, lines, n, sums, 0),
        level(spectra, lines, n, sums, 1),
        covariance(spectra, lines, n));
  }

  /** From the upper half of the rates, where the machine does least. */
  private static double[] start(PairSpectra spectra, CrossSpectra half, OwnLines lines) {
    double one = 0;
    double other = 0;
    int count = 0;
    for (int k = spectra.lastBin() / 2; k <= spectra.lastBin(); k++) {
      if (!lines.holds(k)) {
        double f = k * spectra.stepHertz();
        one += half.firstAlone(k) / (f * f);
        other += half.secondAlone(k) / (f * f);
        count++;
      }
    }
    return floored(one / count, other / count);
  }

  private static double[] floored(Sums[] sums) {
    return floored(sums[0].value(), sums[1].value());
  }

  private static double[] floored(double one, double other) {
    double least = Math.max(Double.MIN_NORMAL, SMALLEST_SHARE * Math.abs(one + other));
    return new double[] {Math.max(least, one), Math.max(least, other)};
  }

  /** Weighted sums of one half of the segments. */
  private static Sums[] sums(
      PairSpectra spectra, CrossSpectra of, CrossSpectra weights, double[] a, OwnLines lines) {
    Sums[] sums = {new Sums(), new Sums()};
    for (int k = lowest(spectra); k <= spectra.lastBin(); k++) {
      if (lines.holds(k)) {
        continue;
      }
      double f2 = square(k * spectra.stepHertz());
      double m = smoothed(weights, k, spectra.lastBin());
      for (int i = 0; i < 2; i++) {
        double weight = f2 * f2 / variance(m, a[i] * f2, a[1 - i] * f2);
        double alone = i == 0 ? of.firstAlone(k) : of.secondAlone(k);
        sums[i].add(of.segments() * weight, alone / f2);
      }
    }
    return sums;
  }

  private static Level level(
      PairSpectra spectra, OwnLines lines, double[] a, Sums[] sums, int which) {
    int middle = middle(spectra, lines, a, which);
    double[] below = half(spectra, lines, a, which, lowest(spectra), middle);
    double[] above = half(spectra, lines, a, which, middle + 1, spectra.lastBin());
    double steepness = (above[0] - below[0]) / Math.sqrt(above[1] + below[1]);
    return new Level(
        sums[which].value(),
        half(spectra, lines, a, which, lowest(spectra), spectra.lastBin())[1],
        Double.isFinite(steepness) ? steepness : 0);
  }

  /** Level and its variance over some of the rates. */
  private static double[] half(
      PairSpectra spectra, OwnLines lines, double[] a, int which, int from, int to) {
    CrossSpectra all = spectra.all();
    double weights = 0;
    double sum = 0;
    double variance = 0;
    for (int k = from; k <= to; k++) {
      if (lines.holds(k)) {
        continue;
      }
      double f2 = square(k * spectra.stepHertz());
      double n1 = a[which] * f2;
      double n2 = a[1 - which] * f2;
      double weight = weight(spectra, a, which, k);
      weights += weight;
      sum += weight * (which == 0 ? all.firstAlone(k) : all.secondAlone(k)) / f2;
      variance += square(weight / f2) * variance(Math.max(0, all.common(k)), n1, n2);
    }
    return new double[] {sum / weights, variance / (weights * weights) / spectra.averagesOfSums()};
  }

  private static double weight(PairSpectra spectra, double[] a, int which, int bin) {
    double f2 = square(bin * spectra.stepHertz());
    double m = smoothed(spectra.all(), bin, spectra.lastBin());
    return f2 * f2 / variance(m, a[which] * f2, a[1 - which] * f2);
  }

  /** The bin with as much weight below as above. */
  private static int middle(PairSpectra spectra, OwnLines lines, double[] a, int which) {
    int last = spectra.lastBin();
    double[] upTo = new double[last + 1];
    for (int k = lowest(spectra); k <= last; k++) {
      upTo[k] = upTo[k - 1] + (lines.holds(k) ? 0 : weight(spectra, a, which, k));
    }
    int middle = lowest(spectra);
    while (middle < last && upTo[middle] < upTo[last] / 2) {
      middle++;
    }
    return middle;
  }

  private static double covariance(PairSpectra spectra, OwnLines lines, double[] a) {
    double sum = 0;
    double one = 0;
    double other = 0;
    for (int k = lowest(spectra); k <= spectra.lastBin(); k++) {
      if (lines.holds(k)) {
        continue;
      }
      double f2 = square(k * spectra.stepHertz());
      double n1 = a[0] * f2;
      double n2 = a[1] * f2;
      double m = smoothed(spectra.all(), k, spectra.lastBin());
      double w1 = f2 * f2 / variance(m, n1, n2);
      double w2 = f2 * f2 / variance(m, n2, n1);
      one += w1;
      other += w2;
      sum += w1 * w2 / (f2 * f2) * (n1 * n2 - m * (n1 + n2)) / 2;
    }
    return sum / (one * other) / spectra.averagesOfSums();
  }

  private static double variance(double m, double n1, double n2) {
    return n1 * n1 + (m * (n1 + n2) + n1 * n2) / 2;
  }

  /** What both share about a bin, the highest of the neighbourhood: lines must not slip through. */
  private static double smoothed(CrossSpectra spectra, int bin, int last) {
    double highest = 0;
    for (int at = bin - 4; at <= bin + 4; at += 2) {
      double sum = 0;
      int count = 0;
      for (int k = Math.max(1, at - 1); k <= Math.min(last, at + 1); k++) {
        sum += spectra.common(k);
        count++;
      }
      highest = count == 0 ? highest : Math.max(highest, sum / count);
    }
    return highest;
  }

  private static int lowest(PairSpectra spectra) {
    return Math.max(spectra.lowestBin(), (int) Math.ceil(LOWEST_HERTZ / spectra.stepHertz()));
  }

  private static double square(double x) {
    return x * x;
  }

  /** A weighted mean in the making. */
  private static final class Sums {
    private double weights;
    private double products;

    void add(double weight, double value) {
      weights += weight;
      products += weight * value;
    }

    Sums plus(Sums other) {
      Sums sum = new Sums();
      sum.weights = weights + other.weights;
      sum.products = products + other.products;
      return sum;
    }

    double value() {
      return weights > 0 ? products / weights : 0;
    }
  }
}
