package turnsheet.core.diagnose.filter;

/** Which shape a filter has. */
public enum FilterFamily {
  /** flattest in its pass band */
  BUTTERWORTH,
  /** evenest delay, here with its -3 dB point at the cutoff */
  BESSEL
}
