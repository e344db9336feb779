package turnsheet.shop;

import java.time.LocalDate;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.MeasureSettings;

/**
 * What records captures: a sound card, an oscilloscope, a controller.
 *
 * @param clockErrorPpm positive where its clock runs fast; 0 where nobody has checked it
 * @param clockExpandedUncertaintyPpm of that error, coverage factor 2; null where unknown
 * @param checkedOn the day of the check; null where there was none
 * @param note may be empty
 */
public record BenchInstrument(
    InstrumentId id,
    String name,
    double clockErrorPpm,
    @Nullable Double clockExpandedUncertaintyPpm,
    @Nullable LocalDate checkedOn,
    String note) {

  public static final int NAME_LENGTH = 200;
  public static final int NOTE_LENGTH = 4000;

  /** A clock that is wrong by a tenth is not a clock: whoever types that means another unit. */
  public static final double LARGEST_PPM = 100_000;

  public BenchInstrument {
    Require.text("name", name, NAME_LENGTH);
    Require.atMost("note", note, NOTE_LENGTH);
    Require.notNegative("uncertainty", clockExpandedUncertaintyPpm);
    if (!(Math.abs(clockErrorPpm) <= LARGEST_PPM)) {
      throw new IllegalArgumentException("clock error " + clockErrorPpm + " ppm");
    }
  }

  /** What a measurement has to reckon with: half the expanded one, or that of any such clock. */
  public double clockStandardUncertaintyPpm() {
    return clockExpandedUncertaintyPpm == null
        ? MeasureSettings.UNCHECKED_CLOCK_PPM
        : clockExpandedUncertaintyPpm / 2;
  }
}
