package turnsheet.core.dsp;

/**
 * The lower end of a recording at a lower rate: what lies below {@link #topHertz} is kept within
 * 0.01 %, what would fold onto it is stopped by 80 dB. One use.
 */
public final class LowBand {

  private static final double ATTENUATION_DB = 80;

  /** The rate is at least this many times the highest frequency that is kept. */
  private static final double ROOM = 2.5;

  private final FirDecimator filter;
  private final double rateHertz;
  private final double topHertz;
  private double[] out = new double[0];

  /**
   * @param topHertz wanted; where the recording holds less, 0.45 of its rate
   */
  public LowBand(double sampleRateHertz, double topHertz) {
    this.topHertz = Math.min(topHertz, 0.45 * sampleRateHertz);
    int factor = (int) Math.max(1, Math.floor(sampleRateHertz / (ROOM * this.topHertz)));
    this.rateHertz = sampleRateHertz / factor;
    double[] taps =
        factor == 1
            ? new double[] {1}
            : KaiserFir.lowPass(
                this.topHertz, rateHertz - this.topHertz, ATTENUATION_DB, sampleRateHertz);
    this.filter = new FirDecimator(taps, factor);
  }

  /** Values per second that come out. */
  public double rateHertz() {
    return rateHertz;
  }

  /** Highest frequency that is kept. */
  public double topHertz() {
    return topHertz;
  }

  /**
   * Takes samples.
   *
   * @return how many values {@link #values} now holds
   */
  public int process(double[] samples, int count) {
    int room = filter.roomFor(count);
    if (out.length < room) {
      out = new double[room];
    }
    return filter.process(samples, count, out);
  }

  /** The latest values; valid up to the next {@link #process}. */
  public double[] values() {
    return out;
  }
}
