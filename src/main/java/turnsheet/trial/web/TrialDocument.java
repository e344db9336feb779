package turnsheet.trial.web;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.filter.TrialResult;
import turnsheet.core.signal.Rejection;
import turnsheet.job.Job;
import turnsheet.trial.KeptTrial;
import turnsheet.trial.TrialOrder;

/**
 * One trial, for programs.
 *
 * @param orderedAt as an instant in UTC
 */
record TrialDocument(
    String id,
    String captureId,
    String orderedAt,
    String orderedBy,
    Standing job,
    TrialOrder order,
    @Nullable Rejection refusal,
    @Nullable TrialResult result) {

  /**
   * How the job stands.
   *
   * @param jobState {@code queued}, {@code running}, {@code done}, {@code failed}, {@code
   *     cancelled}
   * @param over whether nothing more will happen by itself
   */
  record Standing(String jobState, double progress, String message, boolean over) {

    static Standing of(Job job) {
      return new Standing(
          job.state().name().toLowerCase(Locale.ROOT),
          job.progress(),
          job.message(),
          job.state().isOver());
    }
  }

  static TrialDocument of(KeptTrial trial, Job job) {
    return new TrialDocument(
        trial.id().toString(),
        trial.capture().toString(),
        trial.orderedAt().toString(),
        trial.orderedBy(),
        Standing.of(job),
        trial.order(),
        trial.refusal(),
        trial.result());
  }
}
