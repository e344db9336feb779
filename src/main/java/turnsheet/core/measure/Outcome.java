package turnsheet.core.measure;

import turnsheet.core.signal.Rejection;

/** What became of measuring a capture. */
public sealed interface Outcome {

  /** Figures and the curves behind them. */
  record Measured(Reading reading, Series series) implements Outcome {}

  /** The capture cannot give figures. */
  record Refused(Rejection rejection) implements Outcome {}
}
