package turnsheet.core.format.api;

/** What the numbers of a file stand for. */
public enum Contents {
  /** evenly spaced samples of a voltage or level */
  WAVEFORM,
  /** times at which a signal changed its level */
  EDGE_TIMES,
  /** times between successive rising edges */
  PERIODS
}
