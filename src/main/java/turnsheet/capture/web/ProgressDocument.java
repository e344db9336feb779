package turnsheet.capture.web;

import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureState;
import turnsheet.job.Job;
import turnsheet.web.CoreWords;

/**
 * How the measurement of a capture stands.
 *
 * @param state of the capture
 * @param jobState {@code queued}, {@code running}, {@code done}, {@code failed}; null where it was
 *     never ordered
 * @param over whether nothing more will happen by itself
 */
record ProgressDocument(
    String state,
    @Nullable String jobState,
    double progress,
    String message,
    int attempts,
    boolean over) {

  static ProgressDocument of(Capture capture, @Nullable Job job) {
    return new ProgressDocument(
        capture.state().word(),
        job == null ? null : job.state().name().toLowerCase(java.util.Locale.ROOT),
        job == null ? 0 : job.progress(),
        job == null ? "" : CoreWords.in(LocaleContextHolder.getLocale(), job.message()),
        job == null ? 0 : job.attempts(),
        capture.state() != CaptureState.QUEUED);
  }
}
