package turnsheet.cost;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import turnsheet.core.diagnose.filter.FilterDesign;
import turnsheet.core.diagnose.filter.FilterFamily;
import turnsheet.core.diagnose.filter.Trial;
import turnsheet.core.diagnose.filter.TrialPlan;
import turnsheet.core.diagnose.filter.TrialResult;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;

/** The way of a file through the whole of the core. */
final class Measuring {

  private static final ReadOptions OPTIONS = new ReadOptions(1, null, null, null);

  private Measuring() {}

  static Reading tone(Path file) throws IOException {
    return measured(file, MeasureSettings.tone(Recordings.TONE_HERTZ));
  }

  static Reading edges(Path file) throws IOException {
    return measured(file, MeasureSettings.edges(Recordings.PULSES_PER_SECOND, null));
  }

  static Reading tachometer(Path file) throws IOException {
    return measured(file, MeasureSettings.tachometer(Recordings.PULSES_PER_SECOND, null));
  }

  /** Forty candidates at once, as many at a time as there are processors. */
  static TrialResult trial(Path file) throws Exception {
    List<FilterDesign> designs = new ArrayList<>();
    for (FilterFamily family : FilterFamily.values()) {
      for (int poles = 2; poles <= 8; poles += 2) {
        for (int step = 0; step < 5; step++) {
          designs.add(FilterDesign.highPass(family, poles, 100 + 100 * step));
        }
      }
    }
    int processors = Runtime.getRuntime().availableProcessors();
    ExecutorService threads = Executors.newFixedThreadPool(processors);
    try {
      return new Trial(threads, processors)
          .run(
              () -> CaptureFormats.standard().openSamples(FileSource.of(file), OPTIONS),
              new TrialPlan(
                  Recordings.PULSES_PER_SECOND,
                  Recordings.PULSES_PER_SECOND / 4,
                  Recordings.PULSES_PER_SECOND,
                  true,
                  10,
                  0,
                  0.05,
                  designs),
              Progress.NONE);
    } finally {
      threads.shutdown();
    }
  }

  private static Reading measured(Path file, MeasureSettings settings) throws IOException {
    Outcome outcome =
        new Measurement(CaptureFormats.standard())
            .measure(FileSource.of(file), "", OPTIONS, settings, Progress.NONE);
    if (outcome instanceof Outcome.Measured measured) {
      return measured.reading();
    }
    throw new IllegalStateException(outcome.toString());
  }
}
