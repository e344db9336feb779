package turnsheet.core.diagnose.filter;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Pole pairs of low-pass filters whose -3 dB point is at 1.
 *
 * <p>Butterworth: poles evenly on the unit circle. Bessel: the roots of the reverse Bessel
 * polynomial, divided by the frequency at which the filter with those poles has lost 3 dB (W. E.
 * Thomson, "Delay networks having maximally flat frequency characteristics", Proc. IEE 96 (1949)
 * 487-490; the polynomials from memory). Computed to about 1e-12; no table is copied.
 */
final class Prototype {

  private static final int ROUNDS = 200;

  private Prototype() {}

  /**
   * One pole pair.
   *
   * @param ratio its natural frequency over the cutoff of the low-pass
   */
  record Pair(double ratio, double q) {}

  /**
   * The pairs, the lowest Q first.
   *
   * @param poles 2, 4, 6 or 8
   */
  static List<Pair> pairs(FilterFamily family, int poles) {
    if (poles < 2 || poles > 8 || poles % 2 != 0) {
      throw new IllegalArgumentException(poles + " poles");
    }
    List<Pair> pairs = family == FilterFamily.BUTTERWORTH ? butterworth(poles) : bessel(poles);
    pairs.sort(Comparator.comparingDouble(Pair::q));
    return List.copyOf(pairs);
  }

  private static List<Pair> butterworth(int poles) {
    List<Pair> pairs = new ArrayList<>();
    for (int k = 0; k < poles / 2; k++) {
      double angle = Math.PI * (2 * k + 1) / (2.0 * poles);
      pairs.add(new Pair(1, 1 / (2 * StrictMath.cos(angle))));
    }
    return pairs;
  }

  private static List<Pair> bessel(int poles) {
    double[] polynomial = reverseBessel(poles);
    double cutoff = threeDecibels(polynomial);
    List<Pair> pairs = new ArrayList<>();
    for (Complex root : roots(polynomial)) {
      if (root.im() > 0) {
        double natural = root.magnitude();
        pairs.add(new Pair(natural / cutoff, natural / (-2 * root.re())));
      }
    }
    return pairs;
  }

  /** Coefficients from the constant up: (2n - k)! / (2^(n - k) k! (n - k)!). */
  private static double[] reverseBessel(int n) {
    double[] c = new double[n + 1];
    c[n] = 1;
    for (int k = n - 1; k >= 0; k--) {
      c[k] = c[k + 1] * (2 * n - k) * (k + 1) / (2.0 * (n - k));
    }
    return c;
  }

  /** Angular frequency at which the polynomial's filter has half its power. */
  private static double threeDecibels(double[] polynomial) {
    double low = 0;
    double high = 10;
    for (int i = 0; i < 100; i++) {
      double middle = (low + high) / 2;
      double magnitude = value(polynomial, new Complex(0, middle)).magnitude();
      if (magnitude < Math.sqrt(2) * polynomial[0]) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return (low + high) / 2;
  }

  private static Complex value(double[] polynomial, Complex s) {
    Complex sum = new Complex(0, 0);
    for (int k = polynomial.length - 1; k >= 0; k--) {
      sum = sum.times(s).plus(new Complex(polynomial[k], 0));
    }
    return sum;
  }

  /** All roots at once, each step divided by the distances to the others (Weierstrass). */
  private static List<Complex> roots(double[] monic) {
    int n = monic.length - 1;
    double size = StrictMath.pow(monic[0], 1.0 / n);
    List<Complex> roots = new ArrayList<>();
    for (int k = 0; k < n; k++) {
      // on a circle of the roots' mean size, none of them real
      double angle = 2 * Math.PI * k / n + 0.4;
      roots.add(new Complex(size * StrictMath.cos(angle), size * StrictMath.sin(angle)));
    }
    for (int round = 0; round < ROUNDS; round++) {
      for (int k = 0; k < n; k++) {
        Complex at = roots.get(k);
        Complex others = Complex.ONE;
        for (int j = 0; j < n; j++) {
          if (j != k) {
            others = others.times(at.minus(roots.get(j)));
          }
        }
        roots.set(k, at.minus(value(monic, at).over(others)));
      }
    }
    return roots;
  }
}
