package turnsheet.trial;

import java.time.Clock;
import java.time.temporal.ChronoUnit;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.access.CurrentUser;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.capture.Looked;
import turnsheet.capture.MissingFile;
import turnsheet.core.diagnose.filter.Circuit;
import turnsheet.core.diagnose.filter.FilterDesign;
import turnsheet.core.diagnose.filter.TrialPlan;
import turnsheet.core.diagnose.filter.TrialResult;
import turnsheet.core.measure.CaptureKind;
import turnsheet.job.Job;
import turnsheet.job.Jobs;
import turnsheet.shop.MachineModels;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Orders trials, calls them off and removes them. */
@Service
public class TrialDesk {

  /** Name of the job whose subject is a trial. */
  public static final String JOB = "trial";

  private final Captures captures;
  private final CaptureStore store;
  private final Trials trials;
  private final MachineModels models;
  private final Jobs jobs;
  private final CurrentUser user;
  private final TransactionOperations transactions;
  private final Clock clock;

  TrialDesk(
      Captures captures,
      CaptureStore store,
      Trials trials,
      MachineModels models,
      Jobs jobs,
      CurrentUser user,
      TransactionOperations transactions,
      Clock clock) {
    this.captures = captures;
    this.store = store;
    this.trials = trials;
    this.models = models;
    this.jobs = jobs;
    this.user = user;
    this.transactions = transactions;
    this.clock = clock;
  }

  /**
   * A capture on whose waveform filters can be tried.
   *
   * @throws NotFoundException if there is no such capture
   * @throws RefusedRequestException if it is none of a tachometer, or not measured
   */
  public Capture capture(CaptureId id) {
    Capture capture = captures.find(id).orElseThrow(() -> new NotFoundException("capture"));
    CaptureChoices choices = capture.choices();
    if (choices == null || capture.state() != CaptureState.MEASURED) {
      throw new RefusedRequestException(
          "notMeasured", "The recording has not been measured yet: confirm and measure it first.");
    }
    if (choices.settings().kind() != CaptureKind.TACHOMETER) {
      throw new RefusedRequestException(
          "noWaveform",
          "Filters are tried on the waveform of a tachometer: this recording is none.");
    }
    return capture;
  }

  /** Whether the file of a capture lies here. */
  public boolean holds(Capture capture) {
    return store.holds(capture.bytes());
  }

  /** What a trial of a capture begins with: ranges from its pulse rate and the model's settings. */
  public TrialOrder proposal(Capture capture) {
    double nominal = nominalHertz(capture);
    double[] rates =
        models.ofSetting(capture.key().setting()).stream()
            .flatMap(model -> model.settings().stream().map(model::pulsesPerSecond))
            .filter(OptionalDouble::isPresent)
            .mapToDouble(OptionalDouble::getAsDouble)
            .toArray();
    double lowest = Math.min(nominal, Arrays.stream(rates).min().orElse(nominal));
    double highest = Math.max(nominal, Arrays.stream(rates).max().orElse(nominal));
    Looked looked = capture.looked();
    Double rate = looked == null ? null : looked.recognised().sampleRateHertz();
    return TrialOrder.proposed(lowest, highest, rate);
  }

  /** Pulses per second that the capture was measured at. */
  public static double nominalHertz(Capture capture) {
    CaptureChoices choices = capture.choices();
    if (choices == null) {
      throw new IllegalStateException("not measured: " + capture.id());
    }
    return choices.settings().nominalHz();
  }

  /** The trials of a capture, the newest first. */
  public List<KeptTrial> ofCapture(CaptureId id) {
    return trials.ofCapture(id);
  }

  /**
   * Orders a trial.
   *
   * @throws RefusedRequestException also where there is nothing to try, or too much
   */
  public TrialId order(CaptureId captureId, TrialOrder order) {
    Capture capture = capture(captureId);
    if (!holds(capture)) {
      throw MissingFile.refused();
    }
    if (order.count() < 1 || order.count() > TrialPlan.MOST_DESIGNS) {
      throw new RefusedRequestException(
          "trialSize",
          "The choices make "
              + order.count()
              + " candidates and a trial takes 1 to "
              + TrialPlan.MOST_DESIGNS
              + ": choose fewer kinds, poles or steps.");
    }
    TrialId id = TrialId.random();
    transactions.executeWithoutResult(
        status ->
            trials.add(
                new KeptTrial(
                    id,
                    captureId,
                    clock.instant().truncatedTo(ChronoUnit.MICROS),
                    user.signInName(),
                    order,
                    jobs.enqueue(JOB, id.value()),
                    null,
                    null)));
    return id;
  }

  public KeptTrial find(TrialId id) {
    return trials.find(id).orElseThrow(() -> new NotFoundException("trial"));
  }

  /**
   * The circuit for a row of a result.
   *
   * @throws NotFoundException if there is no such row, or it is the signal without a filter
   */
  public Circuit circuit(KeptTrial trial, int row) {
    TrialResult result = trial.result();
    if (result == null || row < 0 || row >= result.rows().size()) {
      throw new NotFoundException("candidate");
    }
    FilterDesign design = result.rows().get(row).design();
    if (design == null) {
      throw new NotFoundException("circuit");
    }
    return Circuit.of(design, trial.order().parts(), result.plan().highestHz());
  }

  public Job job(KeptTrial trial) {
    return jobs.find(trial.job()).orElseThrow();
  }

  /** Calls a trial off; one that is over stays as it is. */
  public void cancel(TrialId id) {
    jobs.cancel(find(id).job());
  }

  /** Removes a trial for good, and calls it off where it runs. */
  public void remove(TrialId id) {
    KeptTrial trial = find(id);
    transactions.executeWithoutResult(
        status -> {
          jobs.cancel(trial.job());
          trials.remove(id);
        });
  }
}
