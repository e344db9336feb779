package turnsheet.shop;

/** What a nominal speed is stated in. */
public enum SpeedUnit {
  /** speed of a tape or film past the head */
  CM_PER_S,
  /** turns of a platter */
  REV_PER_MIN;

  /** Exact by definition of the inch. */
  public static final double CM_PER_INCH = 2.54;
}
