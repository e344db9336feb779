package turnsheet.core.dsp;

/**
 * Linear-phase low-pass filters by the Kaiser window.
 *
 * <p>Source: J. F. Kaiser's formulas for the window parameter and the number of taps, as in A. V.
 * Oppenheim and R. W. Schafer, "Discrete-time signal processing", chapter on window design (values
 * from memory; the tests measure the response).
 */
public final class KaiserFir {

  private KaiserFir() {}

  /**
   * Designs a filter whose ripple in the pass band and leakage in the stop band are both below the
   * attenuation asked for.
   *
   * @param passHertz end of the pass band
   * @param stopHertz beginning of the stop band
   * @param attenuationDb positive
   * @return an odd number of taps with gain 1 at zero frequency
   */
  public static double[] lowPass(
      double passHertz, double stopHertz, double attenuationDb, double rateHertz) {
    int taps = taps(passHertz, stopHertz, attenuationDb, rateHertz);
    double beta = 0.1102 * (attenuationDb - 8.7);
    double cut = (passHertz + stopHertz) / rateHertz; // twice the cut-off over the rate
    double[] h = new double[taps];
    int middle = taps / 2;
    double sum = 0;
    for (int i = 0; i < taps; i++) {
      double x = i - middle;
      double sinc = x == 0 ? cut : StrictMath.sin(Math.PI * cut * x) / (Math.PI * x);
      double r = middle == 0 ? 0 : x / middle;
      h[i] = sinc * bessel0(beta * Math.sqrt(Math.max(0, 1 - r * r)));
      sum += h[i];
    }
    for (int i = 0; i < taps; i++) {
      h[i] /= sum;
    }
    return h;
  }

  /** How many taps {@link #lowPass} takes. */
  public static int taps(
      double passHertz, double stopHertz, double attenuationDb, double rateHertz) {
    if (!(passHertz > 0 && stopHertz > passHertz && attenuationDb > 50)) {
      throw new IllegalArgumentException(
          "pass " + passHertz + " Hz, stop " + stopHertz + " Hz, " + attenuationDb + " dB");
    }
    double transition = 2 * Math.PI * (stopHertz - passHertz) / rateHertz;
    return (int) Math.ceil((attenuationDb - 8) / (2.285 * transition)) | 1;
  }

  /** I0, by its series. */
  static double bessel0(double x) {
    double term = 1;
    double sum = 1;
    for (int k = 1; term > 1e-17 * sum; k++) {
      term *= x * x / (4.0 * k * k);
      sum += term;
    }
    return sum;
  }
}
