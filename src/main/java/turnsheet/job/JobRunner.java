package turnsheet.job;

import com.github.kagkarlsson.scheduler.task.Execution;
import com.github.kagkarlsson.scheduler.task.ExecutionComplete;
import com.github.kagkarlsson.scheduler.task.ExecutionContext;
import com.github.kagkarlsson.scheduler.task.ExecutionOperations;
import com.github.kagkarlsson.scheduler.task.TaskInstance;
import com.github.kagkarlsson.scheduler.task.TaskInstanceId;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionTemplate;

/** Carries one job through its attempts: run, try again later, give up. */
@Component
class JobRunner {

  private static final Logger log = LoggerFactory.getLogger(JobRunner.class);

  static final int RETRIES = 3;

  /**
   * A job that was begun so often has taken its process down with it again and again: two kills by
   * hand beside every retry are still forgiven.
   */
  static final int MOST_ATTEMPTS = RETRIES + 3;

  private final JobTable table;
  private final ObjectProvider<JobHandler> handlers;
  private final Clock clock;
  private final TransactionTemplate transaction;
  private final Duration firstDelay;

  JobRunner(
      JobTable table,
      ObjectProvider<JobHandler> handlers,
      Clock clock,
      TransactionTemplate transaction,
      @Value("${turnsheet.job.first-retry-delay:5s}") Duration firstDelay) {
    this.table = table;
    this.handlers = handlers;
    this.clock = clock;
    this.transaction = transaction;
    this.firstDelay = firstDelay;
  }

  void run(TaskInstance<Void> instance, ExecutionContext context) {
    JobId id = idOf(instance);
    if (!table.begin(id)) {
      return;
    }
    Job job = table.find(id).orElseThrow();
    JobHandler handler =
        handler(job.name())
            .orElseThrow(() -> new IllegalStateException("no handler for " + job.name()));
    try {
      handler.run(new JobRun(job, table, clock, context.getSchedulerState()::isShuttingDown));
    } catch (JobCancelledException e) {
      log.info("job {} was called off", id.value());
      return;
    } catch (RuntimeException e) {
      throw e;
    } catch (Exception e) {
      throw new JobFailedException(e);
    }
    table.done(id);
  }

  /** The attempt ended with an exception. */
  void failed(ExecutionComplete complete, ExecutionOperations<Void> operations) {
    JobId id = idOf(complete.getExecution());
    Throwable cause = complete.getCause().orElse(null);
    int failures = complete.getExecution().consecutiveFailures + 1;
    if (cause instanceof JobStoppedException) {
      table.requeue(id, "");
      operations.reschedule(notAFailure(complete), clock.instant());
    } else if (failures <= RETRIES) {
      log.warn("job {} failed, attempt {}", id.value(), failures, cause);
      table.requeue(id, "");
      operations.reschedule(complete, clock.instant().plus(delay(failures)));
    } else {
      giveUp(id, cause);
      operations.stop();
    }
  }

  /** The process that ran the attempt has gone silent. */
  void died(ExecutionComplete complete, ExecutionOperations<Void> operations) {
    JobId id = idOf(complete.getExecution());
    int attempts = table.find(id).map(Job::attempts).orElse(MOST_ATTEMPTS);
    if (attempts < MOST_ATTEMPTS) {
      log.info("job {} lost its process and is begun again", id.value());
      table.requeue(id, "");
      operations.reschedule(complete, clock.instant());
    } else {
      giveUp(id, null);
      operations.stop();
    }
  }

  private static ExecutionComplete notAFailure(ExecutionComplete complete) {
    Execution execution = complete.getExecution();
    Instant done = complete.getTimeDone();
    return ExecutionComplete.success(execution, done.minus(complete.getDuration()), done);
  }

  private void giveUp(JobId id, @Nullable Throwable cause) {
    String reference = id.value().toString().substring(0, 8);
    log.error("job {} was given up, reference {}", id.value(), reference, cause);
    String sentence =
        "The work stopped with an unexpected error, several times: this is a fault of the service,"
            + " not of the recording. Quote the reference "
            + reference
            + ".";
    transaction.executeWithoutResult(
        status -> {
          Optional<Job> job = table.find(id);
          if (table.fail(id, sentence)) {
            job.flatMap(j -> handler(j.name()))
                .ifPresent(h -> h.gaveUp(job.orElseThrow().subject(), sentence));
          }
        });
  }

  /** Grows threefold: 5, 15, 45 seconds by default. */
  private Duration delay(int failures) {
    return firstDelay.multipliedBy((long) Math.pow(3, Math.min(failures, RETRIES) - 1));
  }

  private Optional<JobHandler> handler(String name) {
    return handlers.stream().filter(h -> h.name().equals(name)).findFirst();
  }

  private static JobId idOf(TaskInstanceId instance) {
    return new JobId(UUID.fromString(instance.getId()));
  }

  /** Carries a handler's checked exception through the scheduler. */
  private static final class JobFailedException extends RuntimeException {
    JobFailedException(Exception cause) {
      super(cause);
    }
  }
}
