package turnsheet.reading;

import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.ThreadPoolExecutor;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.springframework.stereotype.Component;
import turnsheet.core.measure.ChannelMeasurement;
import turnsheet.core.measure.Measurement;

/**
 * As many threads as there are processors, for the channels of all captures together. They stop
 * when the job that waits for them does, and end when they have had nothing to do for a while.
 */
@Component
class ChannelThreads {

  private static final int IDLE_SECONDS = 10;

  private final int count = Runtime.getRuntime().availableProcessors();
  private final ChannelMeasurement measurement;

  ChannelThreads(Measurement one) {
    AtomicInteger number = new AtomicInteger();
    ThreadPoolExecutor threads =
        new ThreadPoolExecutor(
            count,
            count,
            IDLE_SECONDS,
            TimeUnit.SECONDS,
            new LinkedBlockingQueue<>(),
            work -> {
              Thread thread = new Thread(work, "channel-" + number.incrementAndGet());
              thread.setDaemon(true);
              return thread;
            });
    threads.allowCoreThreadTimeOut(true);
    this.measurement = new ChannelMeasurement(one, threads);
  }

  int count() {
    return count;
  }

  ChannelMeasurement measurement() {
    return measurement;
  }
}
