package turnsheet.core.dsp;

/**
 * Periodic cosine-sum windows.
 *
 * <p>Source: F. J. Harris, "On the use of windows for harmonic analysis with the discrete Fourier
 * transform", Proc. IEEE 66 (1978), 51-83 (Hann, four-term Blackman-Harris); the flat-top
 * coefficients are those in common use in numerical libraries.
 */
public enum Window {
  HANN(0.5, 0.5),
  /** Side lobes below -92 dB, main lobe four bins to either side. */
  BLACKMAN_HARRIS(0.35875, 0.48829, 0.14128, 0.01168),
  /** Reads the amplitude between bins within 0.01 dB. */
  FLAT_TOP(0.21557895, 0.41663158, 0.277263158, 0.083578947, 0.006947368);

  @SuppressWarnings("ImmutableEnumChecker") // never handed out, never written
  private final double[] terms;

  Window(double... terms) {
    this.terms = terms;
  }

  /** The window of n values. */
  public double[] values(int n) {
    double[] w = new double[n];
    for (int i = 0; i <= n / 2; i++) {
      // higher terms from the first one: cos (k + 1) x = 2 cos x cos kx - cos (k - 1) x
      double c = StrictMath.cos(2 * Math.PI * i / n);
      double before = 1;
      double now = c;
      double sum = terms[0];
      for (int k = 1; k < terms.length; k++) {
        sum += (k & 1) == 0 ? terms[k] * now : -terms[k] * now;
        double after = 2 * c * now - before;
        before = now;
        now = after;
      }
      w[i] = sum;
    }
    for (int i = n / 2 + 1; i < n; i++) {
      w[i] = w[n - i];
    }
    return w;
  }

  /** Mean of the window: the reading of a line at the middle of a bin. */
  public double coherentGain() {
    return terms[0];
  }

  /** Equivalent noise bandwidth in bins. */
  public double noiseBandwidthBins() {
    double power = terms[0] * terms[0];
    for (int k = 1; k < terms.length; k++) {
      power += terms[k] * terms[k] / 2;
    }
    return power / (terms[0] * terms[0]);
  }

  /** Half width of the main lobe in bins. */
  public int lobeBins() {
    return terms.length;
  }
}
