package turnsheet.core.dsp;

/**
 * A stretch of a waveform at any place between its samples, as a band-limited one must be: right to
 * 1e-4 for what lies below 0.45 times the sample rate. Reads the array it was given, copies
 * nothing.
 */
public final class BetweenSamples {

  /** Samples that must be known on either side. */
  public static final int MARGIN = SampleInterpolator.TAPS / 2;

  private static final int STEPS = SampleInterpolator.STEPS;

  private final double[] samples;
  private final int count;

  public BetweenSamples(double[] samples, int count) {
    this.samples = samples;
    this.count = count;
  }

  /** Whether a place and a little around it can be read. */
  public boolean holds(double place) {
    return place >= MARGIN + 1 && place < count - MARGIN - 2;
  }

  /**
   * The value.
   *
   * @param place in samples from the first
   */
  public double at(double place) {
    int before = (int) Math.floor(place);
    double steps = (place - before) * STEPS;
    int k = Math.min(STEPS - 1, (int) steps);
    int from = before - MARGIN + 1;
    double here = SampleInterpolator.at(samples, from, k);
    return here + (steps - k) * (SampleInterpolator.at(samples, from, k + 1) - here);
  }

  /** The slope per sample. */
  public double slope(double place) {
    double reach = 2.0 / STEPS;
    return (at(place + reach) - at(place - reach)) / (2 * reach);
  }
}
