package turnsheet.core.signal;

/**
 * Relative deviation from nominal speed, evenly sampled. Immutable.
 *
 * <p>Units: percent, positive where faster than nominal. Sample k belongs to the time {@code
 * startSeconds + k / rateHertz} of the capture. Kept in single precision: a deviation of 10 % is
 * then rounded by at most 4e-7 percentage points.
 */
public final class SpeedTrace {

  private final double startSeconds;
  private final double rateHertz;
  private final float[] percent;

  /** Takes a copy of the samples. */
  public SpeedTrace(double startSeconds, double rateHertz, float[] percent) {
    if (!(rateHertz > 0 && Double.isFinite(rateHertz))) {
      throw new IllegalArgumentException("rate " + rateHertz + " Hz");
    }
    this.startSeconds = startSeconds;
    this.rateHertz = rateHertz;
    this.percent = percent.clone();
  }

  public double startSeconds() {
    return startSeconds;
  }

  public double rateHertz() {
    return rateHertz;
  }

  public int length() {
    return percent.length;
  }

  public double durationSeconds() {
    return percent.length / rateHertz;
  }

  public double percent(int index) {
    return percent[index];
  }

  /**
   * Copies samples.
   *
   * @param from first index
   * @param into receives {@code count} samples from index 0
   */
  public void copyTo(int from, double[] into, int count) {
    for (int i = 0; i < count; i++) {
      into[i] = percent[from + i];
    }
  }
}
