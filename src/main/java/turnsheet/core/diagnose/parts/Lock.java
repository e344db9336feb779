package turnsheet.core.diagnose.parts;

/** What a rate follows when the unit runs fast or slow. */
public enum Lock {
  /** the speed of the unit: the rate is off by as much as the unit */
  SHAFT,
  /** the mains: the rate stands wherever the unit's speed is */
  MAINS,
  /** neither: an induction motor under load, or a rate of its own */
  FREE
}
