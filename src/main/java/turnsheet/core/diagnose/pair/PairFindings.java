package turnsheet.core.diagnose.pair;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.signal.Warning;

/**
 * What two sensors on one shaft showed together. Rates are in Hz, percentages relative to the mean
 * speed, uncertainties at k = 2.
 *
 * @param fromHz lowest rate of the common fluctuation
 * @param toHz highest rate of it
 * @param noiseToHz highest rate that the noise was read from
 * @param secondsUsed of what both recorded without a gap
 * @param segments how many overlapping pieces were averaged
 * @param stepHz distance of the rates that are told apart
 * @param turnsPerSecond of the shaft
 * @param noiseRatio edge noise of the original over that of the replacement
 * @param commonWeightedRmsPercent weighted fluctuation that both show
 * @param commonUnweightedRmsPercent fluctuation that both show
 * @param ownLines rates at which the sensors differ by more than noise
 * @param mainsPercent rms of common lines at multiples of 50 or 60 Hz; null where there are none
 * @param alignment null where both were recorded on one clock
 */
public record PairFindings(
    double fromHz,
    double toHz,
    double noiseToHz,
    double secondsUsed,
    int segments,
    double stepHz,
    double turnsPerSecond,
    Sensor original,
    Sensor replacement,
    Figure noiseRatio,
    Figure commonWeightedRmsPercent,
    Figure commonUnweightedRmsPercent,
    List<OwnLine> ownLines,
    @Nullable Double mainsPercent,
    @Nullable Alignment alignment,
    List<Point> spectrum,
    List<Warning> warnings) {

  public PairFindings {
    ownLines = List.copyOf(ownLines);
    spectrum = List.copyOf(spectrum);
    warnings = List.copyOf(warnings);
  }

  /**
   * One of the two.
   *
   * @param edgeNoiseMicroseconds standard deviation of one edge that the other sensor does not
   *     share
   * @param atMostMicroseconds where that noise is too small to tell beside the other's, what it is
   *     below; null otherwise
   * @param noiseUnweightedPercent fluctuation that this noise alone shows in the band
   * @param noiseWeightedPercent the same behind the weighting
   * @param singleEdgeNoiseMicroseconds what this sensor's recording tells by itself
   */
  public record Sensor(
      int teeth,
      double edgesPerSecond,
      Figure edgeNoiseMicroseconds,
      @Nullable Double atMostMicroseconds,
      Figure noiseUnweightedPercent,
      Figure noiseWeightedPercent,
      Figure singleEdgeNoiseMicroseconds) {}

  /**
   * A line that the sensors show differently.
   *
   * @param originalPercent rms at that rate
   * @param replacementPercent rms at that rate
   * @param turnMultiple which multiple of the shaft's rate it is; null where it is none
   * @param mains whether it is a multiple of 50 or 60 Hz
   */
  public record OwnLine(
      double rateHz,
      double originalPercent,
      double replacementPercent,
      @Nullable Integer turnMultiple,
      boolean mains) {}

  /**
   * One place of the spectra: amplitude densities in percent per root of a hertz.
   *
   * @param common null where it cannot be told from chance
   * @param coherence 0 to 1
   * @param chance what the coherence stays below in 95 of 100 cases where nothing is shared
   */
  public record Point(
      double rateHz,
      double original,
      double replacement,
      @Nullable Double common,
      double coherence,
      double chance) {}
}
