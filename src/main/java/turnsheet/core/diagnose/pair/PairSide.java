package turnsheet.core.diagnose.pair;

import java.util.List;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.SpeedTrace;

/**
 * What one of two sensors on a shaft recorded.
 *
 * @param trace speed in percent of nominal
 * @param edgesPerSecond mean rate of the pulses
 * @param teeth pulses per turn
 * @param gaps stretches without pulses, in seconds of the trace's clock
 * @param ownEdgeNoiseMicroseconds noise of one edge as this recording alone tells it
 */
public record PairSide(
    SpeedTrace trace,
    double edgesPerSecond,
    int teeth,
    List<Reading.Dropout> gaps,
    Figure ownEdgeNoiseMicroseconds) {

  /** Highest rate that a trace shows in full, as a share of edges or of samples. */
  private static final double PASS = 0.4;

  public PairSide {
    if (!(edgesPerSecond > 0 && Double.isFinite(edgesPerSecond)) || teeth < 1) {
      throw new IllegalArgumentException(edgesPerSecond + " edges per second, " + teeth + " teeth");
    }
    gaps = List.copyOf(gaps);
  }

  /**
   * What a measured pulse train shows.
   *
   * @throws IllegalArgumentException for a tone, which has no edges
   */
  public static PairSide of(Outcome.Measured measured, int teeth) {
    Reading reading = measured.reading();
    Reading.Edges edges = reading.edges();
    Double rate = reading.speed().meanHz().value();
    if (edges == null || rate == null) {
      throw new IllegalArgumentException("no pulse train");
    }
    return new PairSide(
        measured.series().trace(),
        rate,
        teeth,
        reading.signal().dropouts(),
        edges.edgeNoiseMicroseconds());
  }

  /** The same with another number of pulses per turn. */
  PairSide withTeeth(int other) {
    return new PairSide(trace, edgesPerSecond, other, gaps, ownEdgeNoiseMicroseconds);
  }

  /** Turns of the shaft in a second. */
  double turnsPerSecond() {
    return edgesPerSecond / teeth;
  }

  /** Highest rate of fluctuation that the trace shows in full. */
  double passHertz() {
    return PASS * Math.min(edgesPerSecond, trace.rateHertz());
  }

  /** How far a gap reaches into the trace beside it: the filter's weight is gone beyond. */
  double marginSeconds() {
    return 10 / Math.min(edgesPerSecond, trace.rateHertz());
  }
}
