package turnsheet.core.measure;

/** Causes of uncertainty that others than the budget's reader must know apart. */
public final class Causes {

  /** common to all captures that one instrument recorded */
  public static final String CLOCK = "recording clock";

  /** common to all captures of one test tape or record */
  public static final String MEDIUM = "reference medium";

  /** chance: another stretch of the same machine would read otherwise */
  public static final String LENGTH = "length of the recording";

  /** common to all captures, as the filter is the same */
  public static final String WEIGHTING = "weighting";

  private Causes() {}
}
