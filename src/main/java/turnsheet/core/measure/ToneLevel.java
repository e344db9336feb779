package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;

/**
 * Watches a tone for drop-outs and clicks and mends the phase steps across them, so that their
 * noise does not reach the filters behind. Steps come out some milliseconds later than they go in,
 * because the trouble begins before the level has fallen, and a click is known when it is over.
 */
final class ToneLevel {

  /** 20 dB below the level before counts as gone. */
  private static final double GONE = 0.1;

  private static final double SHORTEST_SECONDS = 0.001;
  private static final double GUARD_SECONDS = 0.004;
  private static final double DELAY_SECONDS =
      GUARD_SECONDS + ClickWatch.LONGEST_SECONDS + ClickWatch.QUIET_SECONDS;
  private static final double LEVEL_SECONDS = 2;
  private static final double STEP_SECONDS = 0.05;

  private final double rate;
  private final double startSeconds;
  private final double levelShare;
  private final double stepShare;
  private final int guard;
  private final int delay;
  private final double[] steps;
  private final boolean[] bad;
  private final List<Stretch> dropouts = new ArrayList<>();
  private final List<Stretch> clicks = new ArrayList<>();
  private final ClickWatch watch;
  private double level;
  private double calmStep;
  private long index;
  private int slot;
  private int left;
  private long goneSince = -1;
  private double lastAmplitude;
  private double amplitudeSum;
  private double amplitudeSquares;
  private long amplitudeCount;

  /**
   * @param amplitude expected level
   * @param startSeconds time of the first value
   */
  ToneLevel(double rate, double startSeconds, double amplitude) {
    this.rate = rate;
    this.startSeconds = startSeconds;
    this.levelShare = 1 / (LEVEL_SECONDS * rate);
    this.stepShare = 1 / (STEP_SECONDS * rate);
    this.level = amplitude;
    this.lastAmplitude = amplitude;
    this.guard = (int) Math.ceil(GUARD_SECONDS * rate);
    this.delay = (int) Math.ceil(DELAY_SECONDS * rate);
    this.steps = new double[delay + 1];
    this.bad = new boolean[delay + 1];
    this.watch = new ClickWatch(rate);
  }

  /** How many steps come out later than they go in. */
  int delay() {
    return delay;
  }

  /** Takes a step and its amplitude and gives the step of {@link #delay} earlier, mended. */
  double next(double step, double amplitude) {
    boolean gone = amplitude < GONE * level;
    if (gone) {
      if (goneSince < 0) {
        goneSince = index;
      }
      left = guard;
      spoil(guard);
      watch.interrupt();
    } else {
      ended();
      level += (amplitude - level) * levelShare;
      amplitudeSum += amplitude;
      amplitudeSquares += amplitude * amplitude;
      amplitudeCount++;
    }
    steps[slot] = step;
    bad[slot] = gone || left-- > 0;
    left = Math.max(left, 0);
    if (!bad[slot]) {
      // a click turns the tone, or makes it longer or shorter, as its phase falls
      double turned = step - calmStep;
      double grown = (amplitude - lastAmplitude) / level;
      int clicked = watch.next(turned * turned + grown * grown);
      if (clicked > 0) {
        spoil(clicked + guard);
        left = guard;
        clicks.add(new Stretch(time(index - clicked), time(index)));
      }
    }
    lastAmplitude = amplitude;
    index++;
    slot = slot + 1 == steps.length ? 0 : slot + 1;
    // the oldest one stands where the next will go
    if (bad[slot]) {
      return calmStep;
    }
    calmStep += (steps[slot] - calmStep) * stepShare;
    return steps[slot];
  }

  private double time(long at) {
    return startSeconds + at / rate;
  }

  /** Marks the latest steps that have not gone out yet. */
  private void spoil(int count) {
    for (int i = 0; i <= Math.min(count, delay); i++) {
      bad[Math.floorMod(slot - i, bad.length)] = true;
    }
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

  List<Stretch> clicks() {
    return clicks;
  }

  /** Peak of a sine that would swing the level outside drop-outs as much, as a share of it. */
  double swing() {
    double mean = amplitude();
    return mean == 0
        ? 0
        : Math.sqrt(2 * Math.max(0, amplitudeSquares / amplitudeCount / (mean * mean) - 1));
  }

  /** Mean amplitude outside drop-outs. */
  double amplitude() {
    return amplitudeCount == 0 ? 0 : amplitudeSum / amplitudeCount;
  }
}
