package turnsheet.core.diagnose.filter;

/** What a filter lets through. */
public enum FilterKind {
  HIGH_PASS,
  LOW_PASS,
  /** a high-pass followed by a low-pass */
  BAND_PASS
}
