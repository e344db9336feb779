package turnsheet.core.diagnose.parts;

/** What a part is; the usual causes of a line and the next check follow from it. */
public enum PartKind {
  CAPSTAN,
  ROLLER,
  IDLER,
  BELT,
  PULLEY,
  PLATTER,
  MOTOR,
  REEL,
  GEAR,
  BEARING,
  SENSOR,
  OTHER,
  /** no part of the model: hum that gets into the signal */
  MAINS
}
