package turnsheet.job;

import com.github.kagkarlsson.scheduler.Scheduler;
import java.time.Clock;
import java.time.Duration;
import org.springframework.beans.factory.support.StaticListableBeanFactory;
import org.springframework.jdbc.datasource.TransactionAwareDataSourceProxy;
import turnsheet.testing.Database;

/** Jobs that are enqueued and that nobody does. */
public final class IdleJobs {

  private IdleJobs() {}

  public static Jobs on(Database database) {
    StaticListableBeanFactory beans = new StaticListableBeanFactory();
    JobTable table = new JobTable(database.jdbc(), Clock.systemUTC());
    JobRunner runner =
        new JobRunner(
            table,
            beans.getBeanProvider(JobHandler.class),
            Clock.systemUTC(),
            database.transactions(),
            Duration.ofSeconds(1));
    beans.addBean(
        "scheduler",
        Scheduler.create(
                new TransactionAwareDataSourceProxy(database.dataSource()),
                new JobConfig().jobTask(runner))
            .build());
    return new Jobs(table, beans.getBeanProvider(Scheduler.class), Clock.systemUTC());
  }
}
