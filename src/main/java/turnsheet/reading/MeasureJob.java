package turnsheet.reading;

import java.io.IOException;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.capture.Looked;
import turnsheet.core.diagnose.RotatingPart;
import turnsheet.core.diagnose.Suspects;
import turnsheet.core.measure.HeapNeed;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.job.JobHandler;
import turnsheet.job.JobRun;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.SpeedSettingId;

/**
 * Measures a confirmed capture. Run twice, it leaves one reading: the core gives the same document
 * for the same bytes and choices, and the store keeps the same document once.
 */
@Component
class MeasureJob implements JobHandler {

  private static final Logger log = LoggerFactory.getLogger(MeasureJob.class);

  private final Captures captures;
  private final CaptureStore store;
  private final Measurement measurement;
  private final MachineModels models;
  private final Readings readings;
  private final TransactionOperations transactions;

  MeasureJob(
      Captures captures,
      CaptureStore store,
      Measurement measurement,
      MachineModels models,
      Readings readings,
      TransactionOperations transactions) {
    this.captures = captures;
    this.store = store;
    this.measurement = measurement;
    this.models = models;
    this.readings = readings;
    this.transactions = transactions;
  }

  @Override
  public String name() {
    return "measure";
  }

  @Override
  public void run(JobRun run) throws IOException {
    CaptureId id = new CaptureId(run.subject());
    Capture capture = captures.find(id).orElse(null);
    CaptureChoices choices = capture == null ? null : capture.choices();
    if (capture == null || choices == null || capture.state() != CaptureState.QUEUED) {
      log.info("capture {} does not wait to be measured", id.value());
      return;
    }
    Looked looked = capture.looked();
    Optional<Rejection> tooLong =
        looked == null
            ? Optional.empty()
            : HeapNeed.refusal(looked.recognised(), Runtime.getRuntime().maxMemory());
    if (tooLong.isPresent()) {
      captures.refused(id, tooLong.get());
      return;
    }
    Outcome outcome =
        measurement.measure(
            store.open(capture.bytes()),
            capture.bytes().sha256(),
            choices.options(),
            choices.settings(),
            run::progress);
    if (outcome instanceof Outcome.Measured measured) {
      Reading named = withSuspects(measured.reading(), capture.key().setting());
      transactions.executeWithoutResult(
          status -> {
            if (captures.measured(id)) {
              readings.add(id, named, measured.series());
            }
          });
    } else if (outcome instanceof Outcome.Refused refused) {
      captures.refused(id, refused.rejection());
    }
  }

  @Override
  public void gaveUp(UUID subject, String sentence) {
    captures.failed(new CaptureId(subject), sentence);
  }

  /** Parts turn as much too fast or too slow as the unit does. */
  private Reading withSuspects(Reading reading, SpeedSettingId settingId) {
    Double deviation = reading.speed().deviationPercent().value();
    List<RotatingPart> parts =
        models.ofSetting(settingId).stream()
            .flatMap(model -> partsAt(model, settingId).stream())
            .map(part -> part.atDeviation(deviation == null ? 0 : deviation))
            .toList();
    return reading.withLines(
        Suspects.name(reading.lines(), parts, reading.source().durationSeconds()));
  }

  private static List<RotatingPart> partsAt(MachineModel model, SpeedSettingId settingId) {
    return model.setting(settingId).stream()
        .flatMap(setting -> model.partRatesAt(setting).stream())
        .map(rate -> new RotatingPart(rate.part(), rate.rateHertz()))
        .toList();
  }
}
