package turnsheet.core.diagnose.filter;

/** A complex number. */
record Complex(double re, double im) {

  static final Complex ONE = new Complex(1, 0);

  Complex plus(Complex other) {
    return new Complex(re + other.re, im + other.im);
  }

  Complex minus(Complex other) {
    return new Complex(re - other.re, im - other.im);
  }

  Complex times(Complex other) {
    return new Complex(re * other.re - im * other.im, re * other.im + im * other.re);
  }

  Complex times(double factor) {
    return new Complex(re * factor, im * factor);
  }

  Complex over(Complex other) {
    double square = other.re * other.re + other.im * other.im;
    return new Complex(
        (re * other.re + im * other.im) / square, (im * other.re - re * other.im) / square);
  }

  double magnitude() {
    return Math.hypot(re, im);
  }
}
