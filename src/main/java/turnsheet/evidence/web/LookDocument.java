package turnsheet.evidence.web;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import turnsheet.job.Job;
import turnsheet.web.CoreWords;

/**
 * How a closer look stands.
 *
 * @param jobState {@code queued}, {@code running}, {@code done}, {@code failed}; null where none
 *     was ordered
 * @param over whether nothing more will happen by itself
 */
record LookDocument(
    @Nullable String jobState, double progress, String message, int attempts, boolean over) {

  static LookDocument of(@Nullable Job job) {
    return job == null
        ? new LookDocument(null, 0, "", 0, true)
        : new LookDocument(
            job.state().name().toLowerCase(Locale.ROOT),
            job.progress(),
            CoreWords.in(LocaleContextHolder.getLocale(), job.message()),
            job.attempts(),
            job.state().isOver());
  }
}
