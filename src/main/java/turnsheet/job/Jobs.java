package turnsheet.job;

import com.github.kagkarlsson.scheduler.Scheduler;
import com.github.kagkarlsson.scheduler.task.TaskInstance;
import java.time.Clock;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.stereotype.Service;
import org.springframework.transaction.support.TransactionSynchronization;
import org.springframework.transaction.support.TransactionSynchronizationManager;

/** Enqueues jobs and tells how they stand. */
@Service
public class Jobs {

  private final JobTable table;
  private final ObjectProvider<Scheduler> scheduler;
  private final Clock clock;

  // the scheduler knows the task, the task the handlers, and a handler may enqueue: asked for late
  Jobs(JobTable table, ObjectProvider<Scheduler> scheduler, Clock clock) {
    this.table = table;
    this.scheduler = scheduler;
    this.clock = clock;
  }

  /**
   * Enqueues a job in the caller's transaction: it is begun after the commit, and a rollback leaves
   * nothing of it.
   *
   * @param name of a {@link JobHandler}
   * @throws IllegalStateException outside a transaction
   */
  public JobId enqueue(String name, UUID subject) {
    if (!TransactionSynchronizationManager.isActualTransactionActive()) {
      throw new IllegalStateException(
          "a job is enqueued with what it is about, in one transaction");
    }
    JobId id = JobId.random();
    table.add(id, name, subject);
    scheduler
        .getObject()
        .schedule(
            new TaskInstance<Void>(JobConfig.TASK_NAME, id.value().toString()), clock.instant());
    TransactionSynchronizationManager.registerSynchronization(
        new TransactionSynchronization() {
          @Override
          public void afterCommit() {
            scheduler.getObject().triggerCheckForDueExecutions();
          }
        });
    return id;
  }

  /**
   * Calls a job off. One that waits is never begun; one that runs ends the next time its handler
   * tells its progress.
   *
   * @return false where it was over already, or is unknown
   */
  public boolean cancel(JobId id) {
    return table.cancel(id);
  }

  public Optional<Job> find(JobId id) {
    return table.find(id);
  }

  /** All jobs ever done to a subject, the newest first. */
  public List<Job> ofSubject(UUID subject) {
    return table.ofSubject(subject);
  }
}
