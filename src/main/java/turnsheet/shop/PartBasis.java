package turnsheet.shop;

/** What the rate of a rotating part follows from. */
public enum PartBasis {
  /** its rim runs at tape speed: rate = v / (pi d) (textbook) */
  DIAMETER_MM,
  /** it turns so many times per turn of another part, or of the machine's nominal rotation */
  TURNS_PER_TURN,
  /** it turns at a rate of its own, whatever the speed setting */
  FIXED_PER_MINUTE,
  /** a belt that comes round in its length, on the rim of another part or at tape speed */
  LENGTH_MM,
  /** a motor with so many pole pairs on the mains */
  MAINS_POLE_PAIRS
}
