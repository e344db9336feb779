package turnsheet.core.dsp;

import java.util.function.DoubleUnaryOperator;

/**
 * Finite impulse responses of least delay with a given magnitude.
 *
 * <p>Source: the folded real cepstrum, A. V. Oppenheim and R. W. Schafer, "Discrete-time signal
 * processing", chapter on cepstrum analysis: the causal part of the cepstrum of the log magnitude
 * belongs to the response whose energy comes earliest.
 */
final class MinimumPhase {

  /** Bins per tap of the transform: keeps the cepstrum of a zero at DC from folding onto itself. */
  private static final int BINS_PER_TAP = 16;

  /** Share of the response, at its end, that is faded out. */
  private static final double FADED_SHARE = 0.25;

  private MinimumPhase() {}

  /**
   * Designs the response.
   *
   * @param logGain natural logarithm of the gain over frequency in hertz; finite above 0
   * @param taps length of the response; its end is faded out by half a cosine
   */
  static double[] design(DoubleUnaryOperator logGain, double rateHertz, int taps) {
    Fft fft = new Fft(Fft.lengthFor(BINS_PER_TAP * taps));
    int n = fft.length();
    double[] work = new double[n];
    double step = rateHertz / n;
    work[0] = logGain.applyAsDouble(step / 2); // at zero itself the gain may vanish
    work[1] = logGain.applyAsDouble(rateHertz / 2);
    for (int k = 1; k < n / 2; k++) {
      work[2 * k] = logGain.applyAsDouble(k * step);
    }
    fft.realInverse(work);
    for (int k = 1; k < n / 2; k++) {
      work[k] *= 2;
      work[n - k] = 0;
    }
    fft.real(work);
    work[0] = StrictMath.exp(work[0]);
    work[1] = StrictMath.exp(work[1]);
    for (int k = 1; k < n / 2; k++) {
      double gain = StrictMath.exp(work[2 * k]);
      double angle = work[2 * k + 1];
      work[2 * k] = gain * StrictMath.cos(angle);
      work[2 * k + 1] = gain * StrictMath.sin(angle);
    }
    fft.realInverse(work);
    double[] h = new double[taps];
    int faded = (int) (FADED_SHARE * taps);
    for (int k = 0; k < taps; k++) {
      int left = taps - k;
      double fade = left > faded ? 1 : 0.5 - 0.5 * StrictMath.cos(Math.PI * left / (faded + 1));
      h[k] = work[k] * fade;
    }
    return h;
  }
}
