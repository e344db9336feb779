package turnsheet.trial;

import java.io.IOException;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.core.measure.Measurement;
import turnsheet.core.signal.RejectedException;
import turnsheet.job.JobHandler;
import turnsheet.job.JobRun;

/** Runs one trial; twice leaves the same result. */
@Component
class TrialJob implements JobHandler {

  private static final Logger log = LoggerFactory.getLogger(TrialJob.class);

  private final Trials trials;
  private final Captures captures;
  private final CaptureStore store;
  private final Measurement measurement;
  private final TrialThreads threads;

  TrialJob(
      Trials trials,
      Captures captures,
      CaptureStore store,
      Measurement measurement,
      TrialThreads threads) {
    this.trials = trials;
    this.captures = captures;
    this.store = store;
    this.measurement = measurement;
    this.threads = threads;
  }

  @Override
  public String name() {
    return TrialDesk.JOB;
  }

  @Override
  public void run(JobRun run) throws IOException {
    KeptTrial trial = trials.find(new TrialId(run.subject())).orElse(null);
    Capture capture = trial == null ? null : captures.find(trial.capture()).orElse(null);
    CaptureChoices choices = capture == null ? null : capture.choices();
    if (trial == null || capture == null || choices == null || !store.holds(capture.bytes())) {
      log.info("trial {} cannot be run", run.subject());
      return;
    }
    try {
      trials.found(
          trial.id(),
          threads
              .trial()
              .run(
                  () ->
                      measurement
                          .formats()
                          .openSamples(store.open(capture.bytes()), choices.options()),
                  trial.order().plan(choices.settings().nominalHz()),
                  run::progress));
    } catch (RejectedException e) {
      trials.refused(trial.id(), e.rejection());
    }
  }
}
