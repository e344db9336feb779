package turnsheet.core.diagnose.filter;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What candidates leave of a recorded waveform.
 *
 * @param seconds of the recording that were used
 * @param toothHz mean pulse rate found
 * @param pulses of the recording that were compared
 * @param swing from the lowest to the highest of the mean pulse, in the recording's unit
 * @param noiseDb white noise beside the pulses, relative to their fundamental
 * @param hum lines of the mains, relative to the fundamental
 * @param rows no filter first, then the candidates in the order of the plan
 * @param choice the sensible candidate; null where none keeps all edges
 */
public record TrialResult(
    TrialPlan plan,
    double seconds,
    double toothHz,
    long pulses,
    double swing,
    double noiseDb,
    List<Hum> hum,
    List<Row> rows,
    @Nullable Choice choice) {

  public TrialResult {
    hum = List.copyOf(hum);
    rows = List.copyOf(rows);
  }

  /**
   * A line of the mains.
   *
   * @param relativeDb to the fundamental of the pulses at the same place
   */
  public record Hum(double rateHz, double relativeDb) {}

  /**
   * One candidate.
   *
   * @param design null for no filter
   * @param signalDb what is left of the fundamental at the pulse rate
   * @param hum what is left of each line, in the order of the result's
   * @param delayMicroseconds group delay at the pulse rate
   * @param bare edges where the filtered waveform passes its middle
   * @param compared edges as the comparator gives them
   */
  public record Row(
      @Nullable FilterDesign design,
      double signalDb,
      List<Hum> hum,
      double delayMicroseconds,
      Edges bare,
      Edges compared) {

    public Row {
      hum = List.copyOf(hum);
    }
  }

  /**
   * Edges behind a candidate.
   *
   * @param counted rising edges found
   * @param lost missing beside the pulses of the recording
   * @param extra false ones
   * @param noiseMicroseconds of one edge, measured; null where too few follow each other
   * @param noisePercent the same of the period
   * @param predictedMicroseconds of the same, from the noise before the filter, the filter's
   *     response and the slope behind it; null where the mean pulse crosses no threshold
   * @param humMicroseconds root mean square by which the lines of the mains move edges
   */
  public record Edges(
      long counted,
      long lost,
      long extra,
      @Nullable Double noiseMicroseconds,
      @Nullable Double noisePercent,
      @Nullable Double predictedMicroseconds,
      @Nullable Double humMicroseconds,
      Speed lowest,
      Speed highest) {

    /** Noise and hum together; null where either is not known. */
    public @Nullable Double errorMicroseconds() {
      return noiseMicroseconds == null || humMicroseconds == null
          ? null
          : Double.valueOf(Math.hypot(noiseMicroseconds, humMicroseconds));
    }

    /** Whether every pulse is one edge, here and at both other speeds. */
    public boolean allKept() {
      return lost == 0 && extra == 0 && lowest.survives() && highest.survives();
    }
  }

  /**
   * A speed setting of the machine, played with the recorded shape, hum and noise.
   *
   * @param toothHz pulse rate there
   * @param signalDb fundamental behind the filter, relative to the recorded one before it
   * @param responseDb the filter's part of that
   */
  public record Speed(
      double toothHz, double signalDb, double responseDb, long pulses, long lost, long extra) {

    public boolean survives() {
      return pulses > 0 && lost == 0 && extra == 0;
    }
  }

  /** Why a candidate was chosen. */
  public enum Reason {
    /** the unfiltered signal is quiet enough */
    NO_FILTER,
    /** fewest poles among those nearly as quiet as the quietest */
    FEWEST_POLES,
    /** the same, but each candidate loses more than half the signal at one of the speeds */
    SIGNAL_LOST
  }

  /**
   * The sensible candidate.
   *
   * @param row its place in the rows
   * @param errorMicroseconds its noise and hum together, behind the comparator
   * @param leastMicroseconds the least of all that keep every edge
   * @param limitMicroseconds up to which a candidate counts as quiet
   * @param kept how many candidates keep every edge
   */
  public record Choice(
      int row,
      Reason reason,
      double errorMicroseconds,
      double leastMicroseconds,
      double limitMicroseconds,
      int kept) {}
}
