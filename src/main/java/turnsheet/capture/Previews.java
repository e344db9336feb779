package turnsheet.capture;

import java.io.IOException;
import java.util.Arrays;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.KindGuess;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/** Cuts previews out of stored captures. */
@Component
public class Previews {

  private static final Logger log = LoggerFactory.getLogger(Previews.class);

  private static final double START_SECONDS = 0.5;
  private static final double LONGEST_SECONDS = 0.1;

  /** So many swings can still be told apart on a phone. */
  private static final int SWINGS = 16;

  private static final int MOST_POINTS = 2000;
  private static final int EDGES = 40;

  private final CaptureStore store;
  private final CaptureFormats formats;

  Previews(CaptureStore store, CaptureFormats formats) {
    this.store = store;
    this.formats = formats;
  }

  /** The stretch; empty where nothing can be drawn. */
  public Optional<Preview> of(StoredBytes bytes, Looked looked) {
    ReadOptions options = looked.options().withChannel(looked.recognised().channel());
    try {
      return looked.recognised().contents() == Contents.WAVEFORM
          ? waveform(bytes, options, looked.guess())
          : edges(bytes, options);
    } catch (IOException | RejectedException | RuntimeException e) {
      log.warn("no preview of {}", bytes.sha256(), e);
      return Optional.empty();
    }
  }

  private Optional<Preview> waveform(
      StoredBytes bytes, ReadOptions options, @Nullable KindGuess guess)
      throws IOException, RejectedException {
    try (SampleReader in = formats.openSamples(store.open(bytes), options)) {
      double rate = in.sampleRateHertz();
      double[] all = Looker.first(in, START_SECONDS + LONGEST_SECONDS);
      Double swing = guess == null ? null : guess.rateHertz();
      double span = swing == null ? LONGEST_SECONDS : Math.min(LONGEST_SECONDS, SWINGS / swing);
      int wanted = Math.max(2, Math.min(MOST_POINTS, (int) Math.ceil(span * rate)));
      int from = Math.min((int) (START_SECONDS * rate), Math.max(0, all.length - wanted));
      double[] levels = Arrays.copyOfRange(all, from, Math.min(all.length, from + wanted));
      double[] seconds = new double[levels.length];
      for (int i = 0; i < seconds.length; i++) {
        seconds[i] = (from + i) / rate;
      }
      return levels.length < 2
          ? Optional.empty()
          : Optional.of(new Preview(seconds, levels, false));
    }
  }

  private Optional<Preview> edges(StoredBytes bytes, ReadOptions options)
      throws IOException, RejectedException {
    try (EdgeReader in = formats.openEdges(store.open(bytes), options)) {
      double[] times = new double[EDGES];
      boolean[] rising = new boolean[EDGES];
      int n = in.read(times, rising);
      if (n < 2) {
        return Optional.empty();
      }
      boolean oneKind = !contains(rising, n, false);
      return Optional.of(oneKind ? ticks(times, n) : levels(times, rising, n));
    }
  }

  private static boolean contains(boolean[] values, int n, boolean wanted) {
    for (int i = 0; i < n; i++) {
      if (values[i] == wanted) {
        return true;
      }
    }
    return false;
  }

  private static Preview levels(double[] times, boolean[] rising, int n) {
    double[] levels = new double[n];
    for (int i = 0; i < n; i++) {
      levels[i] = rising[i] ? 1 : 0;
    }
    return new Preview(Arrays.copyOf(times, n), levels, true);
  }

  /** A list of one kind of edge says nothing about the level between: each becomes a short mark. */
  private static Preview ticks(double[] times, int n) {
    double width = (times[n - 1] - times[0]) / (n - 1) / 10;
    double[] seconds = new double[2 * n];
    double[] levels = new double[2 * n];
    for (int i = 0; i < n; i++) {
      seconds[2 * i] = times[i];
      levels[2 * i] = 1;
      seconds[2 * i + 1] = times[i] + width;
    }
    return new Preview(seconds, levels, true);
  }
}
