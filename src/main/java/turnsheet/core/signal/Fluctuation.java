package turnsheet.core.signal;

/**
 * Fluctuation of the speed, evenly sampled, kept in 16 bits of its own scale so that an hour of it
 * takes a few megabytes. Immutable.
 *
 * <p>Units: percent of the mean speed, without mean and straight line. Sample k belongs to the time
 * {@code startSeconds + k / rateHertz} of the capture. Rounded by at most half of {@link
 * #stepPercent}, which is a part in 65 534 of the largest sample: noise 98 dB below a steady sine.
 */
public final class Fluctuation {

  private static final int FULL = Short.MAX_VALUE;

  private final double startSeconds;
  private final double rateHertz;
  private final double stepPercent;
  private final short[] steps;

  private Fluctuation(double startSeconds, double rateHertz, double stepPercent, short[] steps) {
    if (!(rateHertz > 0 && Double.isFinite(rateHertz) && stepPercent > 0)) {
      throw new IllegalArgumentException(rateHertz + " Hz, step " + stepPercent + " %");
    }
    this.startSeconds = startSeconds;
    this.rateHertz = rateHertz;
    this.stepPercent = stepPercent;
    this.steps = steps;
  }

  /** Samples in percent. */
  public static Fluctuation of(double startSeconds, double rateHertz, double[] percent) {
    double largest = 0;
    for (double p : percent) {
      largest = Math.max(largest, Math.abs(p));
    }
    Builder builder = new Builder(percent.length, largest);
    for (double p : percent) {
      builder.add(p);
    }
    return builder.build(startSeconds, rateHertz);
  }

  /**
   * Samples as they were kept.
   *
   * @param steps copied
   */
  public static Fluctuation ofSteps(
      double startSeconds, double rateHertz, double stepPercent, short[] steps) {
    return new Fluctuation(startSeconds, rateHertz, stepPercent, steps.clone());
  }

  public double startSeconds() {
    return startSeconds;
  }

  public double rateHertz() {
    return rateHertz;
  }

  /** What the last bit stands for. */
  public double stepPercent() {
    return stepPercent;
  }

  public int length() {
    return steps.length;
  }

  public double durationSeconds() {
    return steps.length / rateHertz;
  }

  /** A sample in steps, for keeping. */
  public short steps(int index) {
    return steps[index];
  }

  public double percent(int index) {
    return steps[index] * stepPercent;
  }

  /** A stretch in percent. */
  public double[] percent(int from, int count) {
    double[] values = new double[count];
    for (int i = 0; i < count; i++) {
      values[i] = percent(from + i);
    }
    return values;
  }

  /** Takes a known number of samples whose largest magnitude is known. One use. */
  public static final class Builder {
    private final double stepPercent;
    private final short[] steps;
    private int filled;

    public Builder(int length, double largestPercent) {
      steps = new short[length];
      stepPercent = largestPercent > 0 ? largestPercent / FULL : 1.0 / FULL;
    }

    public void add(double percent) {
      steps[filled++] = (short) Math.max(-FULL, Math.min(FULL, Math.round(percent / stepPercent)));
    }

    public Fluctuation build(double startSeconds, double rateHertz) {
      if (filled != steps.length) {
        throw new IllegalStateException(filled + " of " + steps.length + " samples");
      }
      return new Fluctuation(startSeconds, rateHertz, stepPercent, steps);
    }
  }
}
