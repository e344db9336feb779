package turnsheet.core.diagnose.mains;

import java.util.List;
import turnsheet.core.measure.Figure;

/**
 * The mains as their hum shows them.
 *
 * @param nominalHz 50 or 60
 * @param frequencyHz mean over the recording, corrected for the recorder's clock
 * @param wanderHz standard deviation of the frequency between stretches, what the noise does not
 *     explain
 * @param harmonics those that stand out, in the order of their frequency
 * @param points the frequency over time
 */
public record Mains(
    double nominalHz,
    Figure frequencyHz,
    Figure wanderHz,
    List<Harmonic> harmonics,
    List<Point> points) {

  public Mains {
    harmonics = List.copyOf(harmonics);
    points = List.copyOf(points);
  }

  /**
   * One harmonic of the hum.
   *
   * @param order 1 for the fundamental
   * @param peak in the unit of the recording; full scale is 1
   * @param overNoiseDb its power over that of the noise in one hertz beside it
   */
  public record Harmonic(int order, double rateHz, double peak, double overNoiseDb) {}

  /**
   * The frequency of a stretch.
   *
   * @param timeSeconds middle of the stretch
   * @param noiseHz standard uncertainty that the noise leaves
   */
  public record Point(double timeSeconds, double frequencyHz, double noiseHz) {}
}
