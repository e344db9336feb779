package turnsheet.core.measure;

/**
 * Finds clicks in a tone: bursts that stand out of what its phase and level do otherwise and are
 * over sooner than a machine with any mass could change its speed and back.
 *
 * <p>The bounds are our own. Ten times the root mean square is far beyond the crest of fluctuation
 * and of Gaussian noise; a burst that lasts longer than {@value #LONGEST_SECONDS} s is a change of
 * speed and is left alone.
 */
final class ClickWatch {

  /** The longest click with the ringing of the filters before. */
  static final double LONGEST_SECONDS = 0.004;

  /** A click is over when nothing stood out for so long. */
  static final double QUIET_SECONDS = 0.001;

  private static final double OUTSTANDING = 10;
  private static final double MEMORY_SECONDS = 1;
  private static final double SETTLING_SECONDS = 0.3;

  private final long settling;
  private final long longest;
  private final long quiet;
  private final double memory;
  private double power;
  private long count;
  private long start = -1;
  private long latest = -1;
  private boolean tooLong;

  ClickWatch(double rateHertz) {
    this.settling = Math.round(SETTLING_SECONDS * rateHertz);
    this.longest = Math.round(LONGEST_SECONDS * rateHertz);
    this.quiet = Math.round(QUIET_SECONDS * rateHertz);
    this.memory = MEMORY_SECONDS * rateHertz;
  }

  /**
   * Takes how far the tone went off its slow course in one step.
   *
   * @param squared that way as a share of the tone's length, squared
   * @return how many of the latest steps belong to a click that is over with this one; 0 where none
   */
  int next(double squared) {
    long now = count++;
    boolean learning = now < settling;
    if (!learning && squared > OUTSTANDING * OUTSTANDING * power) {
      start = start < 0 ? now : start;
      latest = now;
      tooLong = tooLong || now - start > longest;
      if (tooLong) {
        learn(squared);
      }
      return 0;
    }
    if (start < 0 || tooLong) {
      learn(squared);
    }
    if (start < 0 || now - latest < quiet) {
      return 0;
    }
    int length = tooLong ? 0 : (int) (now - start + 1);
    start = -1;
    tooLong = false;
    return length;
  }

  /** The tone is gone or back: whatever stood out belongs to that. */
  void interrupt() {
    start = -1;
    tooLong = false;
  }

  private void learn(double squared) {
    power += (squared - power) / Math.min((double) count, memory);
  }
}
