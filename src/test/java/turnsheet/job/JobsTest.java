package turnsheet.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.github.kagkarlsson.scheduler.Scheduler;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.UUID;
import java.util.concurrent.ConcurrentLinkedQueue;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.function.Predicate;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.support.StaticListableBeanFactory;
import org.springframework.jdbc.datasource.TransactionAwareDataSourceProxy;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class JobsTest {

  private static final Duration DEADLINE = Duration.ofSeconds(20);

  private final Database database;
  private final StaticListableBeanFactory beans = new StaticListableBeanFactory();
  private final Jobs jobs;
  private final Scheduler scheduler;
  private final Recorder recorder = new Recorder();

  JobsTest(Database database) {
    database.empty();
    this.database = database;
    JobTable table = new JobTable(database.jdbc(), Clock.systemUTC());
    JobRunner runner =
        new JobRunner(
            table,
            beans.getBeanProvider(JobHandler.class),
            Clock.systemUTC(),
            database.transactions(),
            Duration.ofMillis(1));
    scheduler =
        Scheduler.create(
                new TransactionAwareDataSourceProxy(database.dataSource()),
                new JobConfig().jobTask(runner))
            .pollingInterval(Duration.ofMillis(20))
            .heartbeatInterval(Duration.ofMillis(100))
            .threads(2)
            .build();
    beans.addBean("scheduler", scheduler);
    beans.addBean("recorder", recorder);
    jobs = new Jobs(table, beans.getBeanProvider(Scheduler.class), Clock.systemUTC());
  }

  @AfterEach
  void stop() {
    recorder.goOn.countDown();
    scheduler.stop();
  }

  @Test
  void runsAJobThatWasCommitted() {
    scheduler.start();
    UUID subject = UUID.randomUUID();
    JobId id = enqueue("record", subject);
    Job done = await(id, job -> job.state() == JobState.DONE);
    assertThat(recorder.subjects).containsExactly(subject);
    assertThat(done.attempts()).isEqualTo(1);
    assertThat(done.progress()).isEqualTo(1);
    assertThat(jobs.ofSubject(subject)).containsExactly(done);
  }

  @Test
  void aRollbackLeavesNothing() {
    UUID subject = UUID.randomUUID();
    database
        .transactions()
        .executeWithoutResult(
            status -> {
              jobs.enqueue("record", subject);
              status.setRollbackOnly();
            });
    assertThat(jobs.ofSubject(subject)).isEmpty();
    assertThat(rows("job")).isZero();
    assertThat(rows("scheduled_tasks")).isZero();
  }

  @Test
  void refusesToEnqueueOutsideATransaction() {
    assertThatThrownBy(() -> jobs.enqueue("record", UUID.randomUUID()))
        .isInstanceOf(IllegalStateException.class);
    assertThat(rows("job") + rows("scheduled_tasks")).isZero();
  }

  @Test
  void triesAgainAfterAFailure() {
    recorder.failures = 2;
    scheduler.start();
    JobId id = enqueue("record", UUID.randomUUID());
    assertThat(await(id, job -> job.state() == JobState.DONE).attempts()).isEqualTo(3);
    assertThat(recorder.gaveUp).isEmpty();
  }

  @Test
  void givesUpAfterThreeRetriesWithAReference() {
    recorder.failures = Integer.MAX_VALUE;
    scheduler.start();
    UUID subject = UUID.randomUUID();
    JobId id = enqueue("record", subject);
    Job failed = await(id, job -> job.state() == JobState.FAILED);
    assertThat(failed.attempts()).isEqualTo(1 + JobRunner.RETRIES);
    assertThat(failed.message()).contains(id.value().toString().substring(0, 8));
    assertThat(failed.message()).doesNotContain("planted");
    assertThat(recorder.gaveUp).containsExactly(subject);
    awaitNoExecutions();
  }

  @Test
  void failsAJobThatNobodyDoes() {
    scheduler.start();
    JobId id = enqueue("unheard of", UUID.randomUUID());
    assertThat(await(id, job -> job.state() == JobState.FAILED).finishedAt()).isNotNull();
  }

  @Test
  void beginsTheJobOfADeadProcessAgain() {
    JobId id = deadJob(1);
    scheduler.start();
    Job done = await(id, job -> job.state() == JobState.DONE);
    assertThat(done.attempts()).isEqualTo(2);
    assertThat(recorder.subjects).hasSize(1);
  }

  @Test
  void givesUpOnAJobThatKillsItsProcessAgainAndAgain() {
    JobId id = deadJob(JobRunner.MOST_ATTEMPTS);
    scheduler.start();
    await(id, job -> job.state() == JobState.FAILED);
    assertThat(recorder.subjects).isEmpty();
    assertThat(recorder.gaveUp).hasSize(1);
  }

  @Test
  void doesNotRepeatAJobThatIsOver() {
    JobId id = deadJob(1);
    database
        .jdbc()
        .sql("update job set state = 'done', finished_at = started_at where id = ?")
        .param(id.value())
        .update();
    scheduler.start();
    awaitNoExecutions();
    assertThat(recorder.subjects).isEmpty();
    assertThat(jobs.find(id).orElseThrow().state()).isEqualTo(JobState.DONE);
  }

  @Test
  void showsProgressWhileItRuns() throws InterruptedException {
    recorder.waits = true;
    scheduler.start();
    JobId id = enqueue("record", UUID.randomUUID());
    assertThat(recorder.reached.await(DEADLINE.toSeconds(), TimeUnit.SECONDS)).isTrue();
    Job running = jobs.find(id).orElseThrow();
    assertThat(running.state()).isEqualTo(JobState.RUNNING);
    assertThat(running.progress()).isEqualTo(0.25);
    assertThat(running.message()).isEqualTo("a quarter");
    recorder.goOn.countDown();
    await(id, job -> job.state() == JobState.DONE);
  }

  @Test
  void stopsForAServiceThatGoesDownAndBeginsAgainAtItsNextStart() throws InterruptedException {
    recorder.waits = true;
    scheduler.start();
    JobId id = enqueue("record", UUID.randomUUID());
    assertThat(recorder.reached.await(DEADLINE.toSeconds(), TimeUnit.SECONDS)).isTrue();
    Thread stopping = new Thread(scheduler::stop);
    stopping.start();
    awaitTrue(() -> scheduler.getSchedulerState().isShuttingDown());
    recorder.goOn.countDown();
    stopping.join(DEADLINE.toMillis());
    assertThat(jobs.find(id).orElseThrow().state()).isEqualTo(JobState.QUEUED);
    int failures =
        database
            .jdbc()
            .sql("select consecutive_failures from scheduled_tasks where not picked")
            .query(Integer.class)
            .single();
    assertThat(failures).isZero();
  }

  @Test
  void aJobThatIsCalledOffEndsAtItsNextProgressAndIsNotBegunAgain() throws InterruptedException {
    recorder.waits = true;
    scheduler.start();
    JobId id = enqueue("record", UUID.randomUUID());
    assertThat(recorder.reached.await(DEADLINE.toSeconds(), TimeUnit.SECONDS)).isTrue();
    assertThat(jobs.cancel(id)).isTrue();
    assertThat(jobs.cancel(id)).isFalse();
    Thread.sleep(JobRun.BETWEEN_WRITES.toMillis()); // or the next progress would write nothing
    recorder.goOn.countDown();
    awaitNoExecutions();
    Job cancelled = jobs.find(id).orElseThrow();
    assertThat(cancelled.state()).isEqualTo(JobState.CANCELLED);
    assertThat(cancelled.state().isOver()).isTrue();
    assertThat(cancelled.attempts()).isEqualTo(1);
    assertThat(cancelled.finishedAt()).isNotNull();
    assertThat(recorder.subjects).isEmpty();
    assertThat(recorder.gaveUp).isEmpty();
  }

  @Test
  void aJobThatIsCalledOffWhileItWaitsIsNeverBegun() {
    JobId id = enqueue("record", UUID.randomUUID());
    assertThat(jobs.cancel(id)).isTrue();
    scheduler.start();
    awaitNoExecutions();
    assertThat(jobs.find(id).orElseThrow().attempts()).isZero();
    assertThat(recorder.subjects).isEmpty();
    assertThat(jobs.cancel(new JobId(UUID.randomUUID()))).isFalse();
  }

  @Test
  void writesProgressSeldom() {
    JobId id = enqueue("record", UUID.randomUUID());
    Instant start = Instant.parse("2020-01-01T00:00:00Z");
    var times = List.of(start, start.plusMillis(299), start.plusMillis(300)).iterator();
    JobTable table = new JobTable(database.jdbc(), Clock.systemUTC());
    assertThat(table.begin(id)).isTrue();
    JobRun run =
        new JobRun(
            jobs.find(id).orElseThrow(),
            table,
            new Clock() {
              @Override
              public Instant instant() {
                return times.next();
              }

              @Override
              public java.time.ZoneId getZone() {
                return ZoneOffset.UTC;
              }

              @Override
              public Clock withZone(java.time.ZoneId zone) {
                return this;
              }
            },
            () -> false);
    run.progress(0.1);
    run.progress(0.2);
    assertThat(jobs.find(id).orElseThrow().progress()).isEqualTo(0.1);
    run.progress(0.3);
    assertThat(jobs.find(id).orElseThrow().progress()).isEqualTo(0.3);
  }

  private JobId enqueue(String name, UUID subject) {
    JobId id = database.transactions().execute(status -> jobs.enqueue(name, subject));
    assertThat(id).isNotNull();
    return id;
  }

  /** A job as a killed process leaves it: running, picked, without a heartbeat for an hour. */
  private JobId deadJob(int attempts) {
    JobId id = enqueue("record", UUID.randomUUID());
    database
        .jdbc()
        .sql("update job set state = 'running', attempts = ?, started_at = created_at")
        .param(attempts)
        .update();
    database
        .jdbc()
        .sql(
            "update scheduled_tasks set picked = true, picked_by = 'a dead one', last_heartbeat ="
                + " ?, version = version + 1")
        .param(Instant.now().minusSeconds(3600).atOffset(ZoneOffset.UTC))
        .update();
    return id;
  }

  private long rows(String table) {
    return database.jdbc().sql("select count(*) from " + table).query(Long.class).single();
  }

  private void awaitNoExecutions() {
    awaitTrue(() -> rows("scheduled_tasks") == 0);
  }

  private Job await(JobId id, Predicate<Job> state) {
    awaitTrue(() -> jobs.find(id).filter(state).isPresent());
    return jobs.find(id).orElseThrow();
  }

  private static void awaitTrue(java.util.function.BooleanSupplier condition) {
    long end = System.nanoTime() + DEADLINE.toNanos();
    while (!condition.getAsBoolean()) {
      if (System.nanoTime() > end) {
        throw new AssertionError("nothing happened in " + DEADLINE);
      }
      Thread.onSpinWait();
    }
  }

  /** Notes what it is asked to do; fails or waits as told. */
  private static final class Recorder implements JobHandler {
    final ConcurrentLinkedQueue<UUID> subjects = new ConcurrentLinkedQueue<>();
    final ConcurrentLinkedQueue<UUID> gaveUp = new ConcurrentLinkedQueue<>();
    final CountDownLatch reached = new CountDownLatch(1);
    final CountDownLatch goOn = new CountDownLatch(1);
    volatile int failures;
    volatile boolean waits;

    @Override
    public String name() {
      return "record";
    }

    @Override
    public void run(JobRun run) throws Exception {
      if (failures >= run.attempt()) {
        throw new Exception("planted");
      }
      if (waits) {
        run.progress(0.25, "a quarter");
        reached.countDown();
        assertThat(goOn.await(DEADLINE.toSeconds(), TimeUnit.SECONDS)).isTrue();
        run.progress(0.5);
      }
      subjects.add(run.subject());
    }

    @Override
    public void gaveUp(UUID subject, String sentence) {
      gaveUp.add(subject);
    }
  }
}
