package turnsheet.core.measure;

/** What a capture is a recording of. */
public enum CaptureKind {
  /** a test tone played by the unit */
  TONE,
  /** the waveform of a tachometer */
  TACHOMETER,
  /** times of a tachometer's edges */
  EDGES
}
