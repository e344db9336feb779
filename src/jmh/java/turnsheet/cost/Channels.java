package turnsheet.cost;

import com.sun.management.OperatingSystemMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.stream.IntStream;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.ChannelMeasurement;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;

/** All channels of a recording against one channel: time on the clock and processor time. */
final class Channels {

  private static final int RUNS = 12;

  private Channels() {}

  /** Least time of several runs; each of the two may come from another run. */
  record Cost(double wallSeconds, double processorSeconds) {}

  /** Prints the rows. */
  static void rows() throws IOException {
    Path mono = Recordings.tone(10, 96_000, 1);
    Path stereo = Recordings.tone(10, 96_000, 2);
    Cost one = cost(FileSource.of(mono), 1, 1);
    row("tone of 10 min, one channel", one, one);
    row("one channel of two", cost(FileSource.of(stereo), 1, 1), one);
    row("both channels, one after the other", cost(FileSource.of(stereo), 2, 1), one);
    row("both channels at once", cost(FileSource.of(stereo), 2, 2), one);
  }

  static Cost cost(ByteSource source, int channels, int atOnce) throws IOException {
    var system = ManagementFactory.getPlatformMXBean(OperatingSystemMXBean.class);
    double wall = Double.POSITIVE_INFINITY;
    double processor = Double.POSITIVE_INFINITY;
    for (int i = 0; i < RUNS; i++) {
      long clock = System.nanoTime();
      long time = system.getProcessCpuTime();
      measure(source, channels, atOnce);
      wall = Math.min(wall, (System.nanoTime() - clock) * 1e-9);
      processor = Math.min(processor, (system.getProcessCpuTime() - time) * 1e-9);
    }
    return new Cost(wall, processor);
  }

  /** The first channels; of each only that it was measured is kept. */
  static void measure(ByteSource source, int channels, int atOnce) throws IOException {
    ExecutorService threads = Executors.newFixedThreadPool(atOnce);
    try {
      List<Integer> numbers = IntStream.rangeClosed(1, channels).boxed().toList();
      boolean all =
          new ChannelMeasurement(new Measurement(CaptureFormats.standard()), threads)
                  .measure(
                      new ChannelMeasurement.Order(
                          source,
                          "",
                          ReadOptions.none(),
                          MeasureSettings.tone(Recordings.TONE_HERTZ)),
                      numbers,
                      atOnce,
                      (channel, outcome) -> outcome instanceof Outcome.Measured,
                      ChannelMeasurement.ChannelProgress.NONE)
                  .values()
                  .stream()
                  .allMatch(measured -> measured);
      if (!all) {
        throw new IllegalStateException("a channel was refused");
      }
    } finally {
      threads.shutdown();
    }
  }

  private static void row(String what, Cost cost, Cost one) {
    System.out.printf(
        Locale.ROOT,
        "| %s | %.2f s on the clock, %.2f s processor | %.2f, %.2f |%n",
        what,
        cost.wallSeconds,
        cost.processorSeconds,
        cost.wallSeconds / one.wallSeconds,
        cost.processorSeconds / one.processorSeconds);
  }
}
