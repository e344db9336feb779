package turnsheet.bench.web;

import java.time.Instant;
import java.time.LocalDate;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.bench.ClockCheck;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.signal.Warning;

/**
 * A check of a clock in JSON. Expanded uncertainties are at k = 2.
 *
 * @param sampleRateHz null for edges
 * @param measuredHz as the clock tells it
 * @param measuredExpandedUncertaintyHz what the recording leaves to it
 * @param clockErrorPpm positive where the clock runs fast
 * @param keepingPpm half width allowed for the time until the next check, part of the uncertainty
 * @param taken null as long as it was not taken into the instrument's record
 */
record ClockDocument(
    UUID id,
    UUID instrumentId,
    Instant madeAt,
    String madeBy,
    String source,
    double referenceHz,
    double referenceExpandedUncertaintyPpm,
    String fileName,
    String sha256,
    String format,
    CaptureKind kind,
    int channel,
    @Nullable Double sampleRateHz,
    double durationSeconds,
    String methodVersion,
    double measuredHz,
    double measuredExpandedUncertaintyHz,
    double clockErrorPpm,
    double clockExpandedUncertaintyPpm,
    double keepingPpm,
    List<Warning> warnings,
    @Nullable TakenDocument taken) {

  /** When it was taken, and what stood in the record until then. */
  record TakenDocument(
      Instant at,
      String by,
      double beforeErrorPpm,
      @Nullable Double beforeExpandedUncertaintyPpm,
      @Nullable LocalDate beforeCheckedOn) {

    static TakenDocument of(ClockCheck.Taken taken) {
      return new TakenDocument(
          taken.at(),
          taken.by(),
          taken.before().errorPpm(),
          taken.before().expandedUncertaintyPpm(),
          taken.before().checkedOn());
    }
  }

  static ClockDocument of(ClockCheck check) {
    ClockCheck.Taken taken = check.taken();
    return new ClockDocument(
        check.id().value(),
        check.instrument().value(),
        check.madeAt(),
        check.madeBy(),
        check.against().source(),
        check.against().reference().hertz(),
        check.against().reference().expandedUncertaintyPpm(),
        check.recording().file().name(),
        check.recording().file().bytes().sha256(),
        check.recording().format(),
        check.recording().kind(),
        check.recording().channel(),
        check.recording().sampleRateHz(),
        check.recording().durationSeconds(),
        check.found().methodVersion(),
        check.found().measuredHz(),
        check.found().measuredExpandedUncertaintyHz(),
        check.found().errorPpm(),
        check.found().expandedUncertaintyPpm(),
        check.found().keepingPpm(),
        check.found().warnings(),
        taken == null ? null : TakenDocument.of(taken));
  }
}
