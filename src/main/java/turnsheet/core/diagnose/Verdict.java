package turnsheet.core.diagnose;

/** What can be said of a figure against its service limit. */
public enum Verdict {
  /** the whole interval of the figure keeps the limit */
  WITHIN,
  /** the whole interval of the figure breaks the limit */
  OUTSIDE,
  /** the interval holds the limit, or there is no interval */
  UNDECIDED
}
