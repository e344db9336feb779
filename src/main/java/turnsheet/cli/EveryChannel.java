package turnsheet.cli;

import java.io.IOException;
import java.io.PrintStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.ChannelMeasurement;
import turnsheet.core.measure.HeapNeed;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.document.ReadingDocument;

/** {@code --channel all}: figures of each channel, in their order. */
final class EveryChannel {

  private final PrintStream out;
  private final PrintStream err;

  EveryChannel(PrintStream out, PrintStream err) {
    this.out = out;
    this.err = err;
  }

  /** Readings and no curves, so that a long recording needs the memory of its threads only. */
  private record End(List<Reading> reading, List<Rejection> rejection) {

    static End of(Outcome outcome) {
      return outcome instanceof Outcome.Measured measured
          ? new End(List.of(measured.reading()), List.of())
          : new End(List.of(), List.of(((Outcome.Refused) outcome).rejection()));
    }
  }

  /** Prints what can be measured; the rest goes to the error stream with its reason. */
  int measure(
      Measurement measurement, ChannelMeasurement.Order order, Recognised recognised, boolean json)
      throws IOException {
    int count = recognised.channels().size();
    int processors = Runtime.getRuntime().availableProcessors();
    ExecutorService threads = Executors.newFixedThreadPool(processors);
    Map<Integer, End> ends;
    try {
      ends =
          new TreeMap<>(
              new ChannelMeasurement(measurement, threads)
                  .measure(
                      order,
                      ChannelMeasurement.chosen(count, 1),
                      HeapNeed.channelsAtOnce(
                          recognised, Runtime.getRuntime().maxMemory(), processors),
                      (channel, outcome) -> End.of(outcome),
                      ChannelMeasurement.ChannelProgress.NONE));
    } finally {
      threads.shutdown();
    }
    List<Reading> readings = new ArrayList<>();
    ends.forEach(
        (channel, end) -> {
          readings.addAll(end.reading());
          end.rejection().forEach(why -> err.println("Channel " + channel + ": " + why.message()));
        });
    if (count > ChannelMeasurement.MOST_CHANNELS) {
      err.println(
          "The file has " + count + " channels: the first " + ends.size() + " were looked at.");
    }
    print(readings, guesses(recognised), json);
    return readings.isEmpty() ? MeasureCommand.REJECTED : MeasureCommand.MEASURED;
  }

  private void print(List<Reading> readings, List<Recognised.Guess> guesses, boolean json) {
    if (json && !readings.isEmpty()) {
      out.println(ReadingDocument.toPrettyJson(readings));
      return;
    }
    for (int i = 0; i < readings.size(); i++) {
      if (i > 0) {
        out.println();
      }
      out.print(ReadingTable.of(readings.get(i), guesses));
    }
  }

  /** No channel is guessed where all are measured. */
  private static List<Recognised.Guess> guesses(Recognised recognised) {
    return recognised.guesses().stream().filter(g -> !g.subject().equals("channel")).toList();
  }
}
