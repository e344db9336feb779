package turnsheet.core.measure;

import java.io.IOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Executor;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;

/**
 * Measures several channels of one capture at once, each in a thread of its own that reads the
 * bytes for itself ({@code docs/decisions/channels-in-parallel.md}). Every channel gives the bits
 * that {@link Measurement} gives for it alone.
 */
public final class ChannelMeasurement {

  /** More channels of one capture than this are not measured: the main one and the first others. */
  public static final int MOST_CHANNELS = 8;

  private final Measurement measurement;
  private final Executor threads;

  /**
   * @param threads run the channels; as many as should work at once over all captures. A thread
   *     that measures never waits for another
   */
  public ChannelMeasurement(Measurement measurement, Executor threads) {
    this.measurement = measurement;
    this.threads = threads;
  }

  /** What is to be measured, and how. */
  public record Order(
      ByteSource source, String sha256, ReadOptions options, MeasureSettings settings) {}

  /** How far one channel has been worked through, 0 to 1. */
  public record Share(int channel, double fraction) {}

  /** Told now and then in the thread that waits for the channels. */
  @FunctionalInterface
  public interface ChannelProgress {

    /** For callers that do not care. */
    ChannelProgress NONE = shares -> {};

    /**
     * May throw a runtime exception of the caller's own to stop the work.
     *
     * @param shares one for each channel, in their order
     */
    void reached(List<Share> shares);
  }

  /**
   * What is kept of a channel's outcome. Called in the thread that measured, so that the curves of
   * one channel can be given up before the next begins.
   */
  public interface Keeper<T> {

    T keep(int channel, Outcome outcome);

    /** A channel ended in a fault of the program; by default that ends all of them. */
    default T broke(int channel, RuntimeException fault) {
      throw fault;
    }
  }

  /**
   * Channels to measure.
   *
   * @param count how many there are
   * @param main the one that stands for the capture, counted from 1
   * @return the main one, then the others in their order, {@link #MOST_CHANNELS} at most
   */
  public static List<Integer> chosen(int count, int main) {
    List<Integer> channels = new ArrayList<>();
    channels.add(main);
    for (int channel = 1; channel <= count && channels.size() < MOST_CHANNELS; channel++) {
      if (channel != main) {
        channels.add(channel);
      }
    }
    return List.copyOf(channels);
  }

  /**
   * Measures channels. A single one is measured in the caller's own thread.
   *
   * <p>A channel that is refused leaves the others alone. Where a channel fails, or progress
   * throws, the others are stopped and have ended when the exception arrives.
   *
   * @param channels counted from 1, none twice
   * @param atOnce most channels that are measured at the same time; see {@link HeapNeed}
   * @return what was kept of each channel, in the order of {@code channels}
   */
  public <T> Map<Integer, T> measure(
      Order order, List<Integer> channels, int atOnce, Keeper<T> keeper, ChannelProgress progress)
      throws IOException {
    Map<Integer, T> kept = new LinkedHashMap<>();
    if (channels.size() == 1) {
      int channel = channels.get(0);
      kept.put(
          channel,
          one(
              order,
              channel,
              keeper,
              fraction -> progress.reached(List.of(new Share(channel, fraction)))));
      return kept;
    }
    ChannelTeam<T> team =
        new ChannelTeam<>(
            channels,
            (channel, told) -> one(order, channel, keeper, told),
            Math.max(1, atOnce),
            threads);
    List<T> results = team.run(progress);
    for (int i = 0; i < channels.size(); i++) {
      kept.put(channels.get(i), results.get(i));
    }
    return kept;
  }

  private <T> T one(Order order, int channel, Keeper<T> keeper, Progress progress)
      throws IOException {
    Outcome outcome;
    try {
      outcome =
          measurement.measure(
              order.source,
              order.sha256,
              order.options,
              order.settings.onChannel(channel),
              progress);
    } catch (StoppedException e) {
      throw e;
    } catch (RuntimeException e) {
      return keeper.broke(channel, e);
    }
    return keeper.keep(channel, outcome);
  }

  /** Ends a channel's work because that of all channels ends. */
  static final class StoppedException extends RuntimeException {}
}
