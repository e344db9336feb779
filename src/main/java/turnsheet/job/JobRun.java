package turnsheet.job;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.UUID;
import java.util.function.BooleanSupplier;

/** One attempt at one job, as its handler sees it. Not thread-safe. */
public final class JobRun {

  /** Often enough for an eye on a progress bar, seldom enough to cost nothing. */
  static final Duration BETWEEN_WRITES = Duration.ofMillis(300);

  private final Job job;
  private final JobTable table;
  private final Clock clock;
  private final BooleanSupplier stopping;
  private Instant lastWrite = Instant.MIN;

  JobRun(Job job, JobTable table, Clock clock, BooleanSupplier stopping) {
    this.job = job;
    this.table = table;
    this.clock = clock;
    this.stopping = stopping;
  }

  public JobId id() {
    return job.id();
  }

  public UUID subject() {
    return job.subject();
  }

  /** Which attempt this is, from 1. */
  public int attempt() {
    return job.attempts();
  }

  /** Tells how far the work is; see {@link #progress(double, String)}. */
  public void progress(double fraction) {
    progress(fraction, "");
  }

  /**
   * Tells how far the work is. Cheap: most calls write nothing.
   *
   * @param fraction 0 to 1; anything beyond is cut
   * @param message what is being done, for people; may be empty
   * @throws JobStoppedException if the service is going down; let it pass
   * @throws JobCancelledException if people have called the job off; let it pass
   */
  public void progress(double fraction, String message) {
    // the flag is cleared, or the database would close its file at the next write
    if (stopping.getAsBoolean() || Thread.interrupted()) {
      throw new JobStoppedException();
    }
    Instant now = clock.instant();
    if (lastWrite.equals(Instant.MIN)
        || Duration.between(lastWrite, now).compareTo(BETWEEN_WRITES) >= 0) {
      lastWrite = now;
      if (!table.progress(job.id(), Math.min(1, Math.max(0, fraction)), message)) {
        throw new JobCancelledException();
      }
    }
  }
}
