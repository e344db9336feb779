package turnsheet.job;

import com.github.kagkarlsson.scheduler.task.Task;
import com.github.kagkarlsson.scheduler.task.helper.Tasks;
import java.time.Clock;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** Ties the job table to the scheduler: one task whose instances are the ids of jobs. */
@Configuration(proxyBeanMethods = false)
class JobConfig {

  static final String TASK_NAME = "job";

  @Bean
  Task<Void> jobTask(JobRunner runner) {
    return Tasks.oneTime(TASK_NAME)
        .onFailure(runner::failed)
        .onDeadExecution(runner::died)
        .execute(runner::run);
  }

  /** One clock for the rows of both tables. */
  @Bean
  com.github.kagkarlsson.scheduler.Clock schedulerClock(Clock clock) {
    return clock::instant;
  }
}
