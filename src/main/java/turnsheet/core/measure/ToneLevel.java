package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;

/**
 * Watches the level of a tone for drop-outs and mends the phase steps across them, so that the
 * noise of a drop-out does not reach the filters behind. Steps come out some milliseconds later
 * than they go in, because the trouble begins before the level has fallen.
 */
final class ToneLevel {

  /** 20 dB below the level before counts as gone. */
  private static final double GONE = 0.1;

  private static final double SHORTEST_SECONDS = 0.001;
  private static final double GUARD_SECONDS = 0.004;
  private static final double LEVEL_SECONDS = 2;
  private static final double STEP_SECONDS = 0.05;

  private final double rate;
  private final double startSeconds;
  private final int guard;
  private final double[] steps;
  private final boolean[] bad;
  private final List<Stretch> dropouts = new ArrayList<>();
  private double level;
  private double calmStep;
  private long index;
  private int left;
  private long goneSince = -1;
  private double amplitudeSum;
  private long amplitudeCount;

  /**
   * @param amplitude expected level
   * @param startSeconds time of the first value
   */
  ToneLevel(double rate, double startSeconds, double amplitude) {
    this.rate = rate;
    this.startSeconds = startSeconds;
    this.level = amplitude;
    this.guard = (int) Math.ceil(GUARD_SECONDS * rate);
    this.steps = new double[guard + 1];
    this.bad = new boolean[guard + 1];
  }

  /** How many steps come out later than they go in. */
  int delay() {
    return guard;
  }

  /** Takes a step and its amplitude and gives the step of {@link #delay} earlier, mended. */
  double next(double step, double amplitude) {
    boolean gone = amplitude < GONE * level;
    if (gone) {
      if (goneSince < 0) {
        goneSince = index;
      }
      left = guard;
      java.util.Arrays.fill(bad, true);
    } else {
      ended();
      level += (amplitude - level) / (LEVEL_SECONDS * rate);
      amplitudeSum += amplitude;
      amplitudeCount++;
    }
    int slot = (int) (index % steps.length);
    steps[slot] = step;
    bad[slot] = gone || left-- > 0;
    left = Math.max(left, 0);
    index++;
    int oldest = (int) (index % steps.length);
    if (bad[oldest]) {
      return calmStep;
    }
    calmStep += (steps[oldest] - calmStep) / (STEP_SECONDS * rate);
    return steps[oldest];
  }

  /** Whether the latest value belongs to a drop-out. */
  boolean gone() {
    return goneSince >= 0;
  }

  /** Closes a drop-out that lasts to the end. */
  void finish() {
    ended();
  }

  private void ended() {
    if (goneSince >= 0) {
      if ((index - goneSince) / rate >= SHORTEST_SECONDS) {
        dropouts.add(new Stretch(startSeconds + goneSince / rate, startSeconds + index / rate));
      }
      goneSince = -1;
    }
  }

  List<Stretch> dropouts() {
    return dropouts;
  }

  /** Mean amplitude outside drop-outs. */
  double amplitude() {
    return amplitudeCount == 0 ? 0 : amplitudeSum / amplitudeCount;
  }
}
