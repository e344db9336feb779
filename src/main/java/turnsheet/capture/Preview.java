package turnsheet.capture;

import java.util.Arrays;

/**
 * A short stretch of a capture, for an eye that wants to know what came in.
 *
 * <p>For a waveform: evenly spaced samples from {@code startSeconds} on. For edges: times and the
 * level after each. Immutable.
 */
public final class Preview {

  private final double[] seconds;
  private final double[] levels;
  private final boolean steps;

  Preview(double[] seconds, double[] levels, boolean steps) {
    this.seconds = seconds.clone();
    this.levels = levels.clone();
    this.steps = steps;
  }

  public int size() {
    return seconds.length;
  }

  public double seconds(int index) {
    return seconds[index];
  }

  public double level(int index) {
    return levels[index];
  }

  /** Whether the level stays until the next point, as between edges. */
  public boolean steps() {
    return steps;
  }

  public double lowest() {
    return Arrays.stream(levels).min().orElse(0);
  }

  public double highest() {
    return Arrays.stream(levels).max().orElse(0);
  }
}
