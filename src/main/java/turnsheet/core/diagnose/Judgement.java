package turnsheet.core.diagnose;

import org.jspecify.annotations.Nullable;

/**
 * A verdict with the reason for its absence.
 *
 * @param conformanceProbability that the true magnitude keeps the limit, 0 to 1 (JCGM 106:2012);
 *     null where the figure has no uncertainty
 * @param why what keeps an undecided figure from being decided; null for the other two
 * @param detail the figure's own reason where {@code why} is {@link Why#NO_UNCERTAINTY}
 */
public record Judgement(
    Verdict verdict,
    @Nullable Double conformanceProbability,
    @Nullable Why why,
    @Nullable String detail) {

  /** What keeps a figure from being decided. */
  public enum Why {
    /** no value, or no uncertainty to go with it */
    NO_UNCERTAINTY,
    /** the interval of the figure holds the limit */
    LIMIT_IN_INTERVAL,
    /** the uncertainty, noise of the capture included, is as large as the limit */
    NOT_RESOLVED
  }

  public Judgement {
    if ((verdict == Verdict.UNDECIDED) != (why != null)) {
      throw new IllegalArgumentException(verdict + ", why " + why);
    }
  }
}
