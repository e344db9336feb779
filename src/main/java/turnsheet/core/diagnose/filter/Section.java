package turnsheet.core.diagnose.filter;

/**
 * A second-order stage of an analogue filter with gain 1 in its pass band.
 *
 * @param highPass false for a low-pass
 * @param f0Hz natural frequency
 * @param q quality
 */
public record Section(boolean highPass, double f0Hz, double q) {

  /** Response at a frequency. */
  Complex response(double hertz) {
    double x = hertz / f0Hz;
    Complex denominator = new Complex(1 - x * x, x / q);
    return new Complex(highPass ? -x * x : 1, 0).over(denominator);
  }
}
