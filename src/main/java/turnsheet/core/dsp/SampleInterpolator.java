package turnsheet.core.dsp;

/**
 * Values between even samples, by a Kaiser-windowed sinc over {@value #TAPS} of them: right to 1e-4
 * for what lies below 0.45 times the sample rate, and exact on the samples.
 */
final class SampleInterpolator {

  /** Samples that take part, half of them on either side. */
  static final int TAPS = 48;

  /** Steps between two samples. */
  static final int STEPS = 32;

  /** For a transition from 0.45 to 0.55 of the sample rate: 77 dB. */
  private static final double BETA = 7.5;

  private static final double[][] WEIGHTS = weights();

  private SampleInterpolator() {}

  /**
   * The value some steps after the middle sample.
   *
   * @param samples read from {@code from} on, {@value #TAPS} of them; the middle one stands at
   *     {@code from + TAPS / 2 - 1}
   * @param step -1 to {@link #STEPS} + 1
   */
  static double at(double[] samples, int from, int step) {
    double[] weights = WEIGHTS[step + 1];
    double sum = 0;
    for (int i = 0; i < TAPS; i++) {
      sum += weights[i] * samples[from + i];
    }
    return sum;
  }

  private static double[][] weights() {
    double[][] table = new double[STEPS + 3][TAPS];
    for (int p = 0; p < table.length; p++) {
      double sum = 0;
      for (int i = 0; i < TAPS; i++) {
        double x = i - (TAPS / 2 - 1) - (p - 1) / (double) STEPS;
        double r = Math.min(1, Math.abs(x) / (TAPS / 2));
        double sinc = x == 0 ? 1 : StrictMath.sin(Math.PI * x) / (Math.PI * x);
        table[p][i] = sinc * KaiserFir.bessel0(BETA * Math.sqrt(1 - r * r));
        sum += table[p][i];
      }
      for (int i = 0; i < TAPS; i++) {
        table[p][i] /= sum;
      }
    }
    return table;
  }
}
