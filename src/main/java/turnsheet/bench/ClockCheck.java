package turnsheet.bench;

import java.time.Instant;
import java.time.LocalDate;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.Budget;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;

/**
 * One check of the clock of a bench instrument: the recording, what was said about it, what was
 * found. It is never edited; it can be taken into the instrument's record once.
 *
 * @param madeBy name of the account
 * @param taken null as long as it was not taken
 */
public record ClockCheck(
    ClockCheckId id,
    InstrumentId instrument,
    Instant madeAt,
    String madeBy,
    Against against,
    Recording recording,
    Found found,
    @Nullable Taken taken) {

  /**
   * What the clock was held against.
   *
   * @param source what gave the frequency, for people
   */
  public record Against(String source, ClockError.Reference reference) {}

  /**
   * The file.
   *
   * @param format name for people
   * @param sampleRateHz as the file states it; null for edges
   * @param durationSeconds as the clock counted it
   */
  public record Recording(
      KeptFile file,
      String format,
      CaptureKind kind,
      int channel,
      @Nullable Double sampleRateHz,
      double durationSeconds) {}

  /**
   * What came of it.
   *
   * @param methodVersion of the core
   * @param measuredHz rate as the clock tells it
   * @param recordingPpm standard uncertainty that the recording leaves to that rate
   * @param errorPpm positive where the clock runs fast
   * @param expandedUncertaintyPpm of that error, coverage factor 2
   * @param keepingPpm half width allowed for the time until the next check, part of the uncertainty
   * @param warnings of the core about the recording
   */
  public record Found(
      String methodVersion,
      double measuredHz,
      double recordingPpm,
      double errorPpm,
      double expandedUncertaintyPpm,
      double keepingPpm,
      List<Warning> warnings) {

    public Found {
      warnings = List.copyOf(warnings);
    }

    /** Of the rate alone, the reference left out; coverage factor 2, in hertz. */
    public double measuredExpandedUncertaintyHz() {
      return Budget.K * recordingPpm * 1e-6 * measuredHz;
    }
  }

  /**
   * When it went into the record, and what stood there until then.
   *
   * @param by name of the account
   */
  public record Taken(Instant at, String by, Before before) {}

  /**
   * What a record says of a clock.
   *
   * @param expandedUncertaintyPpm null where unknown
   * @param checkedOn null where never
   */
  public record Before(
      double errorPpm, @Nullable Double expandedUncertaintyPpm, @Nullable LocalDate checkedOn) {

    /** What the record says now. */
    public static Before of(BenchInstrument instrument) {
      return new Before(
          instrument.clockErrorPpm(),
          instrument.clockExpandedUncertaintyPpm(),
          instrument.checkedOn());
    }

    /** What measurements reckon with, coverage factor 2; for a clock never checked as well. */
    public double reckonedExpandedPpm() {
      return expandedUncertaintyPpm == null
          ? Budget.K * MeasureSettings.UNCHECKED_CLOCK_PPM
          : expandedUncertaintyPpm;
    }
  }

  /** Shorter than this the uncertainty grows large; it is measured all the same. */
  public static final double SHORT_SECONDS = 10;

  public boolean isShort() {
    return recording.durationSeconds() < SHORT_SECONDS;
  }

  /** Whether readings become less certain than with what was reckoned with until then. */
  public boolean isWorseThan(Before before) {
    return found.expandedUncertaintyPpm() > before.reckonedExpandedPpm();
  }

  /**
   * Whether this and the record differ by more than their uncertainties allow: E_n above 1, the way
   * laboratories are compared (ISO/IEC 17043:2010, B.3.1.3, from memory).
   */
  public boolean contradicts(Before before) {
    return Math.abs(found.errorPpm() - before.errorPpm())
        > Math.hypot(found.expandedUncertaintyPpm(), before.reckonedExpandedPpm());
  }

  /** Whether the record says what this check found, and says so because it was taken. */
  public boolean standsIn(BenchInstrument instrument) {
    Double uncertainty = instrument.clockExpandedUncertaintyPpm();
    return taken != null
        && instrument.clockErrorPpm() == found.errorPpm()
        && uncertainty != null
        && uncertainty == found.expandedUncertaintyPpm();
  }
}
