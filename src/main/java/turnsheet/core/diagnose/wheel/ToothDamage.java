package turnsheet.core.diagnose.wheel;

/**
 * A tooth that stands out.
 *
 * @param tooth its number; for {@link Kind#SPLIT} the tooth after whose edge the extra one comes
 * @param percentOfPeriod how far its edge lies off its neighbours, positive where it is late; 0
 *     where that has no meaning
 * @param shareOfTurns in how many of the turns it was seen, from 0 to 1
 */
public record ToothDamage(Kind kind, int tooth, double percentOfPeriod, double shareOfTurns) {

  /** What the edges show. */
  public enum Kind {
    /** One edge comes early, the next in time: chipped or bent against the rotation. */
    EARLY,
    /** One edge comes late, the next in time: worn, chipped or bent with the rotation. */
    LATE,
    /** No edge where a tooth ought to be. */
    MISSING,
    /** An edge too many: a tooth split, or dirt in a gap. */
    SPLIT
  }
}
