package turnsheet.trial;

import java.time.Instant;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.CaptureId;
import turnsheet.core.diagnose.filter.TrialResult;
import turnsheet.core.signal.Rejection;
import turnsheet.job.JobId;

/**
 * One trial as it is kept.
 *
 * @param refusal why the recording cannot be used for it; null where it can, or nobody knows yet
 * @param result null before its job has come to its end
 */
public record KeptTrial(
    TrialId id,
    CaptureId capture,
    Instant orderedAt,
    String orderedBy,
    TrialOrder order,
    JobId job,
    @Nullable Rejection refusal,
    @Nullable TrialResult result) {}
