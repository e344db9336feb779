package turnsheet.core.dsp;

/**
 * Values between even samples of a stream, so that what reads crests and percentiles finds them: at
 * 200 Hz a trace of 1000 values per second has only five per turn. A Kaiser-windowed sinc over
 * {@value #TAPS} samples; flat to a third of the rate, rest below 65 dB.
 */
public final class FineValues {

  private static final int TAPS = 12;
  private static final double BETA = 0.1102 * (65 - 8.7);

  /** Enough for ten values per turn at 200 Hz. */
  private static final double WANTED_HERTZ = 2000;

  private final double[][] weights;
  private final double[] ring = new double[2 * TAPS];
  private int oldest;

  private FineValues(int perSample) {
    weights = new double[perSample][];
    for (int p = 0; p < weights.length; p++) {
      weights[p] = row(p / (double) weights.length);
    }
  }

  /** As many values as crests ask for. */
  public static FineValues at(double rateHertz) {
    return new FineValues(perSample(rateHertz));
  }

  /** Samples alone, as late as with values between them. */
  public static FineValues none() {
    return new FineValues(1);
  }

  /** Values per sample that crests ask for. */
  public static int perSample(double rateHertz) {
    return (int) Math.max(1, Math.ceil(WANTED_HERTZ / rateHertz));
  }

  private static double[] row(double share) {
    double[] row = new double[TAPS];
    double sum = 0;
    for (int i = 0; i < TAPS; i++) {
      double x = i - (TAPS / 2 - 1) - share;
      double r = Math.min(1, Math.abs(x) / (TAPS / 2));
      double sinc = x == 0 ? 1 : StrictMath.sin(Math.PI * x) / (Math.PI * x);
      row[i] = sinc * KaiserFir.bessel0(BETA * Math.sqrt(1 - r * r));
      sum += row[i];
    }
    for (int i = 0; i < TAPS; i++) {
      row[i] /= sum;
    }
    return row;
  }

  /** Values per sample. */
  public int perSample() {
    return weights.length;
  }

  /** Samples that the values lie behind the latest one. */
  public int delaySamples() {
    return TAPS / 2;
  }

  /** Takes the next sample. */
  public void add(double sample) {
    ring[oldest] = sample;
    ring[oldest + TAPS] = sample;
    oldest = oldest + 1 == TAPS ? 0 : oldest + 1;
  }

  /**
   * A value of the sample that lies {@link #delaySamples} back or between it and the next.
   *
   * @param part 0 is the sample itself, {@link #perSample} would be the next one
   */
  public double value(int part) {
    if (part == 0) {
      return ring[oldest + TAPS / 2 - 1];
    }
    double[] row = weights[part];
    double even = 0;
    double odd = 0; // two sums, as each addition waits for the one before
    for (int i = 0; i < TAPS; i += 2) {
      even += row[i] * ring[oldest + i];
      odd += row[i + 1] * ring[oldest + i + 1];
    }
    return even + odd;
  }
}
