package turnsheet.trial;

import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.ThreadPoolExecutor;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.filter.Trial;

/** As many threads as there are processors, for the candidates of all trials together. */
@Component
class TrialThreads {

  private static final int IDLE_SECONDS = 10;

  private final Trial trial;

  TrialThreads() {
    int count = Runtime.getRuntime().availableProcessors();
    AtomicInteger number = new AtomicInteger();
    ThreadPoolExecutor threads =
        new ThreadPoolExecutor(
            count,
            count,
            IDLE_SECONDS,
            TimeUnit.SECONDS,
            new LinkedBlockingQueue<>(),
            work -> {
              Thread thread = new Thread(work, "trial-" + number.incrementAndGet());
              thread.setDaemon(true);
              return thread;
            });
    threads.allowCoreThreadTimeOut(true);
    this.trial = new Trial(threads, count);
  }

  Trial trial() {
    return trial;
  }
}
