package turnsheet.core.diagnose;

import org.jspecify.annotations.Nullable;

/**
 * A verdict with the reason for its absence.
 *
 * @param why what keeps an undecided figure from being decided; null for the other two
 */
public record Judgement(Verdict verdict, @Nullable String why) {

  public Judgement {
    if ((verdict == Verdict.UNDECIDED) != (why != null)) {
      throw new IllegalArgumentException(verdict + ", why " + why);
    }
  }
}
