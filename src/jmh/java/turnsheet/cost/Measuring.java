package turnsheet.cost;

import java.io.IOException;
import java.nio.file.Path;
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
