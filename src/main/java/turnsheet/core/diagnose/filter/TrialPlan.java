package turnsheet.core.diagnose.filter;

import java.util.List;

/**
 * What is to be tried on a recorded waveform.
 *
 * @param nominalHz pulse rate of the recording
 * @param lowestHz pulse rate at the machine's lowest speed setting
 * @param highestHz pulse rate at its highest
 * @param levelFollowsSpeed whether the sensor's level is proportional to speed, as that of a coil
 *     is, or stays the same
 * @param hysteresisPercent distance of the comparator's two thresholds, in percent of the swing
 *     recorded
 * @param offsetPercent of their middle from that of the signal, likewise
 * @param goodEnoughPercent movement of edges, in percent of the period, below which a quieter
 *     candidate is not worth more poles
 * @param designs candidates, beside no filter at all
 */
public record TrialPlan(
    double nominalHz,
    double lowestHz,
    double highestHz,
    boolean levelFollowsSpeed,
    double hysteresisPercent,
    double offsetPercent,
    double goodEnoughPercent,
    List<FilterDesign> designs) {

  /** More candidates than this are not tried at once. */
  public static final int MOST_DESIGNS = 200;

  public TrialPlan {
    designs = List.copyOf(designs);
    if (!(nominalHz > 0) || !(lowestHz > 0) || !(highestHz >= lowestHz)) {
      throw new IllegalArgumentException(nominalHz + ", " + lowestHz + " to " + highestHz + " Hz");
    }
    if (!(hysteresisPercent >= 0 && hysteresisPercent < 100)
        || !(Math.abs(offsetPercent) < 50)
        || !(goodEnoughPercent >= 0)
        || designs.size() > MOST_DESIGNS) {
      throw new IllegalArgumentException(
          hysteresisPercent + " %, " + offsetPercent + " %, " + designs.size() + " designs");
    }
  }
}
