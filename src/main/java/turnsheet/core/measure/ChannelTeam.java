package turnsheet.core.measure;

import java.io.IOException;
import java.io.InterruptedIOException;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.Executor;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicIntegerArray;
import org.jspecify.annotations.Nullable;

/**
 * Threads that work on one channel of a capture each, or on one of any numbered pieces of work, and
 * the caller's thread that starts them, tells the progress and waits. One use.
 */
public final class ChannelTeam<T> {

  private static final long LOOK_MILLISECONDS = 100;

  /** Progress is handed between threads in these steps. */
  private static final int STEPS = 1_000_000;

  private final List<Integer> channels;
  private final Work<T> work;
  private final int atOnce;
  private final Executor threads;
  private final AtomicIntegerArray done;
  private final BlockingQueue<Ended<T>> ended = new LinkedBlockingQueue<>();
  private volatile boolean stopped;
  private int started;
  private int running;

  /** One channel from beginning to end. */
  @FunctionalInterface
  public interface Work<T> {
    T on(int channel, Progress progress) throws IOException;
  }

  /** One of the two is there, unless the channel was told to stop. */
  private record Ended<T>(int index, @Nullable T result, @Nullable Throwable failure) {}

  /**
   * @param work called for each number; may throw
   * @param atOnce most that are worked on at the same time
   * @param threads never waited for by the work itself
   */
  public ChannelTeam(List<Integer> channels, Work<T> work, int atOnce, Executor threads) {
    this.channels = channels;
    this.work = work;
    this.atOnce = atOnce;
    this.threads = threads;
    this.done = new AtomicIntegerArray(channels.size());
  }

  /**
   * The results in the order of the channels. Where one fails, or progress throws, the others are
   * stopped and have ended when the exception arrives.
   */
  public List<T> run(ChannelMeasurement.ChannelProgress progress) throws IOException {
    List<@Nullable T> results = new ArrayList<>(Collections.nCopies(channels.size(), null));
    try {
      for (int left = channels.size(); left > 0; ) {
        startMore();
        Ended<T> one = next(progress);
        if (one != null) {
          running--;
          left--;
          rethrow(one.failure);
          results.set(one.index, one.result);
        }
        progress.reached(shares());
      }
    } finally {
      stopped = true;
      awaitRunning();
    }
    return present(results);
  }

  private void startMore() {
    while (running < atOnce && started < channels.size()) {
      int index = started;
      threads.execute(() -> ended.add(one(index)));
      started++;
      running++;
    }
  }

  /** Whatever goes wrong on a channel is told to the caller, who would wait forever otherwise. */
  @SuppressWarnings("CatchingUnchecked")
  private Ended<T> one(int index) {
    try {
      T result = work.on(channels.get(index), fraction -> reached(index, fraction));
      done.set(index, STEPS);
      return new Ended<>(index, result, null);
    } catch (Throwable e) {
      return new Ended<>(index, null, e);
    }
  }

  private void reached(int index, double fraction) {
    if (stopped) {
      throw new ChannelMeasurement.StoppedException();
    }
    done.set(index, (int) (fraction * STEPS));
  }

  private @Nullable Ended<T> next(ChannelMeasurement.ChannelProgress progress)
      throws InterruptedIOException {
    try {
      return ended.poll(LOOK_MILLISECONDS, TimeUnit.MILLISECONDS);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      // the caller may have a way of its own to end
      progress.reached(shares());
      throw new InterruptedIOException("interrupted while channels were measured");
    }
  }

  private List<ChannelMeasurement.Share> shares() {
    List<ChannelMeasurement.Share> shares = new ArrayList<>();
    for (int i = 0; i < channels.size(); i++) {
      shares.add(new ChannelMeasurement.Share(channels.get(i), (double) done.get(i) / STEPS));
    }
    return shares;
  }

  /** No thread reads the capture any more when the caller goes on. */
  private void awaitRunning() {
    boolean interrupted = false;
    while (running > 0) {
      try {
        ended.take();
        running--;
      } catch (InterruptedException e) {
        interrupted = true;
      }
    }
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
  }

  private static void rethrow(@Nullable Throwable failure) throws IOException {
    if (failure instanceof IOException e) {
      throw e;
    }
    if (failure instanceof RuntimeException e) {
      throw e;
    }
    if (failure instanceof Error e) {
      throw e;
    }
  }

  private static <T> List<T> present(List<@Nullable T> results) {
    List<T> all = new ArrayList<>();
    for (T result : results) {
      if (result == null) {
        throw new IllegalStateException("a channel left nothing");
      }
      all.add(result);
    }
    return all;
  }
}
