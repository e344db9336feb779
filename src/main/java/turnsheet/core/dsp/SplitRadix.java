package turnsheet.core.dsp;

/**
 * Complex discrete Fourier transform of a power-of-two length, forward, without scaling. Numbers
 * lie as real and imaginary part in turn.
 *
 * <p>Source: split radix with conjugate pairs, I. Kamar and Y. Elcherif, Electronics Letters 25
 * (1989), 324-325 (from memory; the tests compare with sums by the definition): a transform of
 * every second number and two of every fourth are joined. Recursion keeps the parts near the
 * processor and leaves no reordering to do.
 *
 * <p>Cost: the whole of it is two short loops and two unrolled ends, which are translated in some
 * hundredths of a second. A library with a tuned routine for every length is a quarter faster when
 * warm and costs the shell command several times as much to translate.
 */
final class SplitRadix {

  private final int log2;

  /** For every power of two its roots of unity over the first quarter turn. */
  private final double[][] roots;

  /**
   * @param log2 of the longest length
   */
  SplitRadix(int log2) {
    this.log2 = log2;
    this.roots = new double[log2 + 1][0];
    for (int b = log2; b >= 3; b--) {
      roots[b] = b == log2 ? roots(1 << b) : everySecond(roots[b + 1]);
    }
  }

  private static double[] roots(int length) {
    double[] w = new double[length / 2];
    for (int k = 0; k < w.length / 2; k++) {
      double angle = 2 * Math.PI * k / length;
      w[2 * k] = StrictMath.cos(angle);
      w[2 * k + 1] = -StrictMath.sin(angle);
    }
    return w;
  }

  private static double[] everySecond(double[] finer) {
    double[] w = new double[finer.length / 2];
    for (int k = 0; k < w.length; k += 2) {
      w[k] = finer[2 * k];
      w[k + 1] = finer[2 * k + 1];
    }
    return w;
  }

  /** exp(-2 pi i k / 2^log2) for k from 0 to a quarter of the longest length, exclusive. */
  double[] longestRoots() {
    return roots[log2];
  }

  /**
   * Transforms.
   *
   * @param length a power of two, 2 to the longest one
   * @param in 2 * length numbers, left alone
   * @param out another array, receives as many
   */
  void transform(int length, double[] in, double[] out) {
    part(in, 0, 2, 2 * length - 1, out, 0, Integer.numberOfTrailingZeros(length));
  }

  /** Transforms every {@code step}-th place; indices count single numbers and go round. */
  private void part(double[] in, int first, int step, int mask, double[] out, int at, int bits) {
    if (bits == 2) {
      four(in, first, step, mask, out, at);
    } else if (bits == 1) {
      two(in, first, (first + step) & mask, out, at);
    } else {
      int quarter = 1 << (bits - 1);
      part(in, first, 2 * step, mask, out, at, bits - 1);
      part(in, (first + step) & mask, 4 * step, mask, out, at + 2 * quarter, bits - 2);
      part(in, (first - step) & mask, 4 * step, mask, out, at + 3 * quarter, bits - 2);
      join(out, at, quarter, roots[bits]);
    }
  }

  private static void two(double[] in, int p, int q, double[] out, int at) {
    double re = in[p];
    double im = in[p + 1];
    out[at] = re + in[q];
    out[at + 1] = im + in[q + 1];
    out[at + 2] = re - in[q];
    out[at + 3] = im - in[q + 1];
  }

  private static void four(double[] in, int p, int step, int mask, double[] out, int at) {
    int q = (p + step) & mask;
    int r = (p + 2 * step) & mask;
    int s = (p - step) & mask;
    double evenRe = in[p] + in[r];
    double evenIm = in[p + 1] + in[r + 1];
    double crossRe = in[p] - in[r];
    double crossIm = in[p + 1] - in[r + 1];
    double oddRe = in[q] + in[s];
    double oddIm = in[q + 1] + in[s + 1];
    double turnedRe = in[q + 1] - in[s + 1];
    double turnedIm = in[s] - in[q];
    out[at] = evenRe + oddRe;
    out[at + 1] = evenIm + oddIm;
    out[at + 2] = crossRe + turnedRe;
    out[at + 3] = crossIm + turnedIm;
    out[at + 4] = evenRe - oddRe;
    out[at + 5] = evenIm - oddIm;
    out[at + 6] = crossRe - turnedRe;
    out[at + 7] = crossIm - turnedIm;
  }

  /** Joins the transform in the first half with those in the third and fourth quarter. */
  private static void join(double[] x, int at, int quarter, double[] w) {
    for (int k = 0, a = at; k < quarter; k += 2, a += 2) {
      int b = a + quarter;
      int c = b + quarter;
      int d = c + quarter;
      double cosine = w[k];
      double sine = w[k + 1];
      double re = x[c] * cosine - x[c + 1] * sine;
      double im = x[c] * sine + x[c + 1] * cosine;
      double conjugateRe = x[d] * cosine + x[d + 1] * sine;
      double conjugateIm = x[d + 1] * cosine - x[d] * sine;
      double sumRe = re + conjugateRe;
      double sumIm = im + conjugateIm;
      double turnedRe = im - conjugateIm;
      double turnedIm = conjugateRe - re;
      double firstRe = x[a];
      double firstIm = x[a + 1];
      double secondRe = x[b];
      double secondIm = x[b + 1];
      x[a] = firstRe + sumRe;
      x[a + 1] = firstIm + sumIm;
      x[b] = secondRe + turnedRe;
      x[b + 1] = secondIm + turnedIm;
      x[c] = firstRe - sumRe;
      x[c + 1] = firstIm - sumIm;
      x[d] = secondRe - turnedRe;
      x[d + 1] = secondIm - turnedIm;
    }
  }
}
