package turnsheet.core.diagnose.wheel;

/** What can be said of a harmonic of the turn: whether it is the wheel or the speed. */
public enum Standing {
  /** No stronger than uneven teeth alone make it. */
  SPACING,
  /** Stronger, and the recording cannot tell whether the wheel or the speed makes it. */
  OPEN,
  /** Stronger, and it stays the same in angle while the speed changes: the wheel's. */
  WHEEL,
  /** A true speed variation, in part at least: it changes with the speed or slips in time. */
  MOTION
}
