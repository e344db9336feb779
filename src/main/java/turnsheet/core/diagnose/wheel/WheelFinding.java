package turnsheet.core.diagnose.wheel;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;

/**
 * What the edges of a capture tell of the sensor wheel. The component names are the names in JSON.
 *
 * @param places of a turn, those without a tooth counted
 * @param origin how that number is known
 * @param statedTeeth number stated beforehand; null where none was
 * @param repeatsAfter edges after which the pattern repeats where that is not {@code places}, such
 *     as a multiple of it; null otherwise
 * @param markMissing teeth missing at the reference mark; 0 where there is no mark
 * @param turns averaged over
 * @param turnRateHertz mean
 * @param speedRangePercent lowest to highest mean speed of a turn, relative to the mean
 * @param lostEdges missing beyond mark and missing teeth
 * @param extraEdges left out beyond those of split teeth
 * @param miscountedTurns turns between marks that did not have their number of places
 * @param patternRmsPercentOfPeriod cleared of noise
 * @param certainRmsPercentOfPeriod of that part alone that is the wheel's for certain
 * @param placeUncertaintyPercent expanded uncertainty (k = 2) of a single tooth
 * @param harmonics those that stand out, and the lowest; in rising order
 * @param flutter as the edges show it
 * @param flutterWithout with the whole pattern removed
 * @param flutterWithoutSpacing with that part removed that is the wheel's for certain; null where
 *     that is all of it
 */
public record WheelFinding(
    int places,
    Origin origin,
    @Nullable Integer statedTeeth,
    @Nullable Integer repeatsAfter,
    int markMissing,
    double turns,
    double turnRateHertz,
    double speedRangePercent,
    long lostEdges,
    long extraEdges,
    int miscountedTurns,
    Figure patternRmsPercentOfPeriod,
    Figure patternRmsArcSeconds,
    Figure certainRmsPercentOfPeriod,
    double placeUncertaintyPercent,
    List<WheelPlace> teeth,
    List<WheelHarmonic> harmonics,
    List<ToothDamage> damage,
    FlutterTrio flutter,
    FlutterTrio flutterWithout,
    @Nullable FlutterTrio flutterWithoutSpacing) {

  /** How the number of places is known. */
  public enum Origin {
    /** It was stated, and nothing speaks against it. */
    STATED,
    /** From the distance of the reference marks. */
    MARK,
    /** From the repetition of the pattern. */
    REPETITION
  }

  public WheelFinding {
    teeth = List.copyOf(teeth);
    harmonics = List.copyOf(harmonics);
    damage = List.copyOf(damage);
  }

  /** Whether a harmonic is left of which the recording cannot tell whether it is the wheel's. */
  public boolean open() {
    return harmonics.stream().anyMatch(h -> h.standing() == Standing.OPEN);
  }
}
