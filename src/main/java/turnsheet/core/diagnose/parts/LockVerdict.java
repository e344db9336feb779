package turnsheet.core.diagnose.parts;

/** Whether a line moves with the unit or stands with the mains. */
public enum LockVerdict {
  SHAFT,
  MAINS,
  /** both explain it equally well */
  UNDECIDED,
  /** neither: a suspect that follows neither, or none at all */
  NEITHER
}
