package turnsheet.core.dsp;

/**
 * The speed of an even pulse train as evenly spaced samples of time.
 *
 * <p>The time of an edge as a function of its number is band-limited by a Kaiser-windowed sinc and
 * differentiated in one step, at the place between edges where the wanted moment lies. Unlike the
 * reciprocal of single periods this has no droop towards high rates, and unlike one value per edge
 * it is even in time, so that the mean of the samples is the mean speed whatever the fluctuation.
 * Pass band up to {@link #PASS} of the edge rate over the decimation, leakage and ripple below 80
 * dB.
 */
public final class EdgeSpeed {

  /** Highest rate shown in full, as a share of the rate of edges over the decimation. */
  private static final double PASS = 0.4;

  private static final double ATTENUATION_DB = 80;
  private static final double BETA = 0.1102 * (ATTENUATION_DB - 8.7);

  /** Moments between two output samples that the table tells apart, at least. */
  private static final int FINENESS = 1024;

  /** Below this edge rate the weighting sees too little to be worth a finer trace. */
  private static final double LOWEST_FINE_HERTZ = 25;

  private final int decimation;
  private final int half;
  private final double passHertz;
  private final double stepSeconds;
  private final float[][] taps;

  /** The latest edges twice in a row, so that they always lie somewhere in one piece. */
  private final double[] ring;

  private final double[] evenSums;
  private final int width;
  private final Output output;
  private int oldest;
  private long index;
  private long nextOutput;
  private double startSeconds = Double.NaN;

  /** Takes the samples. */
  @FunctionalInterface
  public interface Output {
    /**
     * @param edgesPerSecond at the start plus as many steps as samples came before
     */
    void speed(double edgesPerSecond);
  }

  /**
   * @param edgesPerSecond expected mean rate
   * @param decimation edges per output sample, on average
   * @param perEdge output samples per edge where the decimation is 1: more of them show no higher
   *     rates, but what reads peaks and percentiles finds them
   */
  public EdgeSpeed(double edgesPerSecond, int decimation, int perEdge, Output output) {
    this.decimation = decimation;
    this.stepSeconds = decimation / (perEdge * edgesPerSecond);
    this.passHertz = PASS * edgesPerSecond / decimation;
    double pass = PASS / decimation;
    double stop = decimation == 1 ? 0.5 : (1 - PASS) / decimation;
    double transition = 2 * Math.PI * (stop - pass);
    this.half = (int) Math.ceil((ATTENUATION_DB - 8) / (2.285 * transition) / 2);
    this.taps = derivatives(pass + stop, half, Math.max(16, FINENESS / decimation));
    this.width = 2 * half + 2;
    this.ring = new double[2 * width];
    this.evenSums = evenSums(taps, half);
    this.output = output;
  }

  /** Edges per output sample that bring the rate near 1 kHz where edges come faster. */
  public static int decimationFor(double edgesPerSecond) {
    return edgesPerSecond > 1200 ? (int) Math.ceil(edgesPerSecond / 1000) : 1;
  }

  /**
   * Output samples per edge that bring the rate to 1 kHz or a little more where edges are fewer.
   */
  public static int perEdgeFor(double edgesPerSecond) {
    return edgesPerSecond < LOWEST_FINE_HERTZ ? 1 : (int) Math.ceil(1000 / edgesPerSecond);
  }

  /** Highest rate of fluctuation that is shown in full. */
  public double passHertz() {
    return passHertz;
  }

  public double rateHertz() {
    return 1 / stepSeconds;
  }

  public int decimation() {
    return decimation;
  }

  /** Time of the first sample; NaN before there is one. */
  public double startSeconds() {
    return startSeconds;
  }

  /** How far to either side a sample looks, in edges. */
  public int reachEdges() {
    return half;
  }

  /** Takes the next edge of the repaired train. */
  public void edge(double seconds) {
    ring[oldest] = seconds;
    ring[oldest + width] = seconds;
    oldest = oldest + 1 == width ? 0 : oldest + 1;
    index++;
    if (index < width) {
      return;
    }
    // the moments between the two middle edges
    double from = ring[oldest + half];
    double to = ring[oldest + half + 1];
    if (Double.isNaN(startSeconds)) {
      startSeconds = from;
    }
    double moment = startSeconds + nextOutput * stepSeconds;
    while (moment < to) {
      output.speed(1 / slope((moment - from) / (to - from)));
      nextOutput++;
      moment = startSeconds + nextOutput * stepSeconds;
    }
  }

  /** Seconds per edge at a share of the way between the two middle edges. */
  private double slope(double share) {
    int phase = (int) Math.round(share * (taps.length - 1));
    float[] weights = taps[phase];
    double origin = ring[oldest + half];
    double even = (ring[oldest + width - 1] - ring[oldest]) / (width - 1);
    // what the weights make of an even train is taken off: their rounding then costs nothing
    return even + (weighed(weights, ring, oldest, origin) - evenSums[phase] * even);
  }

  /**
   * Weighted sum of times after an origin; four sums, as each addition waits for the one before.
   */
  private static double weighed(float[] weights, double[] times, int from, double origin) {
    double a = 0;
    double b = 0;
    double c = 0;
    double d = 0;
    int i = 0;
    for (; i + 3 < weights.length; i += 4) {
      a += weights[i] * (times[from + i] - origin);
      b += weights[i + 1] * (times[from + i + 1] - origin);
      c += weights[i + 2] * (times[from + i + 2] - origin);
      d += weights[i + 3] * (times[from + i + 3] - origin);
    }
    for (; i < weights.length; i++) {
      a += weights[i] * (times[from + i] - origin);
    }
    return (a + b) + (c + d);
  }

  /** For every phase the weighted sum of an even train one second apart. */
  private static double[] evenSums(float[][] taps, int half) {
    double[] sums = new double[taps.length];
    for (int p = 0; p < sums.length; p++) {
      for (int i = 0; i < taps[p].length; i++) {
        sums[p] += taps[p][i] * (double) (i - half);
      }
    }
    return sums;
  }

  /** For every phase the derivative of the windowed sinc at the distance of each edge. */
  private static float[][] derivatives(double cut, int half, int phases) {
    float[][] table = new float[phases + 1][2 * half + 2];
    for (int p = 0; p <= phases; p++) {
      for (int i = 0; i < table[p].length; i++) {
        table[p][i] = (float) kernelSlope(half + (double) p / phases - i, cut, half + 1);
      }
    }
    return table;
  }

  /** Derivative of sin(pi cut x) / (pi x) times the Kaiser window of a half width, by the rule. */
  private static double kernelSlope(double x, double cut, double halfWidth) {
    double r = x / halfWidth;
    double z = BETA * Math.sqrt(Math.max(0, 1 - r * r));
    double window = bessel0(z) / bessel0(BETA);
    double windowSlope = -BETA * BETA * r / halfWidth * bessel1OverZ(z) / bessel0(BETA);
    double w = Math.PI * cut;
    double sinc = Math.abs(x) < 1e-6 ? cut : StrictMath.sin(w * x) / (Math.PI * x);
    double sincSlope = Math.abs(x) < 1e-6 ? 0 : (cut * StrictMath.cos(w * x) - sinc) / x;
    return sincSlope * window + sinc * windowSlope;
  }

  /** I1(z) / z. */
  private static double bessel1OverZ(double z) {
    double term = 0.5;
    double sum = 0.5;
    for (int k = 1; term > 1e-17 * sum; k++) {
      term *= z * z / (4.0 * k * (k + 1));
      sum += term;
    }
    return sum;
  }

  private static double bessel0(double x) {
    double term = 1;
    double sum = 1;
    for (int k = 1; term > 1e-17 * sum; k++) {
      term *= x * x / (4.0 * k * k);
      sum += term;
    }
    return sum;
  }
}
