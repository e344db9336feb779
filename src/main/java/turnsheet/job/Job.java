package turnsheet.job;

import java.time.Instant;
import java.util.UUID;
import org.jspecify.annotations.Nullable;

/**
 * A piece of work that takes longer than a page may.
 *
 * @param name which {@link JobHandler} does it
 * @param subject what it is done to
 * @param progress 0 to 1, of the current attempt
 * @param message what is being done, or why it was given up; may be empty
 * @param attempts how often it was begun, those of killed processes included
 */
public record Job(
    JobId id,
    String name,
    UUID subject,
    JobState state,
    double progress,
    String message,
    int attempts,
    Instant createdAt,
    @Nullable Instant startedAt,
    @Nullable Instant finishedAt) {}
