package turnsheet.core.measure;

import java.io.IOException;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * The rising edges of a capture, all at once, as its measurement takes them: for what looks at them
 * more than once. Eight bytes an edge.
 *
 * <p>Times are in seconds on the corrected clock. Edges changed by whoever looks can be measured
 * again with the same settings.
 */
public final class EdgeTimes {

  private static final int BLOCK = 4096;

  private final double[] rises;
  private final EdgeProbe probe;
  private final MeasureSettings settings;

  private EdgeTimes(double[] rises, EdgeProbe probe, MeasureSettings settings) {
    this.rises = rises;
    this.probe = probe;
    this.settings = settings;
  }

  /**
   * Reads a waveform.
   *
   * @param most edges that are kept; later ones are left out
   */
  public static EdgeTimes ofWaveform(SampleOpener opener, MeasureSettings settings, int most)
      throws IOException, RejectedException {
    return of(new TachometerPlan(opener, settings).edges(), settings, most);
  }

  /**
   * Reads a list of edges.
   *
   * @param most edges that are kept; later ones are left out
   */
  public static EdgeTimes of(EdgeOpener opener, MeasureSettings settings, int most)
      throws IOException, RejectedException {
    double clockFactor = 1 / (1 + settings.clockErrorPpm() * 1e-6);
    EdgeProbe probe = EdgeProbe.of(opener, clockFactor);
    double[] rises = new double[BLOCK];
    int n = 0;
    try (EdgeReader reader = opener.open()) {
      double[] times = new double[BLOCK];
      boolean[] rising = new boolean[BLOCK];
      int count;
      while (n < most && (count = reader.read(times, rising)) > 0) {
        for (int i = 0; i < count && n < most; i++) {
          if (rising[i]) {
            if (n == rises.length) {
              rises = Arrays.copyOf(rises, n + n / 2);
            }
            rises[n++] = times[i] * clockFactor;
          }
        }
      }
    }
    return new EdgeTimes(Arrays.copyOfRange(rises, probe.skipFirst() ? 1 : 0, n), probe, settings);
  }

  /** In order; a copy. */
  public double[] risesSeconds() {
    return rises.clone();
  }

  /** Period to expect at the beginning. */
  public double startPeriodSeconds() {
    return probe.startSeconds();
  }

  /** Step of the clock that stamped the edges; 0 where none can be told. */
  public double stepSeconds() {
    return probe.gridSeconds();
  }

  /**
   * Measures edges as those of this capture were measured.
   *
   * @param changed rising edges, in order, on the corrected clock
   * @param teeth of the wheel; null where unknown
   */
  public Reading measured(double[] changed, @Nullable Integer teeth)
      throws IOException, RejectedException {
    MeasureSettings corrected =
        new MeasureSettings(
            CaptureKind.EDGES,
            settings.channel(),
            settings.nominalHz(),
            settings.searchPercent(),
            teeth,
            settings.clockStandardUncertaintyPpm(),
            0,
            settings.mediumStandardUncertaintyPercent());
    return new EdgePlan("", "", null, corrected)
        .measure(() -> new Kept(changed, stepSeconds()), WaveformSignal.ofAList())
        .reading();
  }

  /** Reads edges that are in memory. */
  private static final class Kept implements EdgeReader {
    private final double[] rises;
    private final double stepSeconds;
    private int next;

    Kept(double[] rises, double stepSeconds) {
      this.rises = rises;
      this.stepSeconds = stepSeconds;
    }

    @Override
    public int read(double[] timesSeconds, boolean[] rising) {
      int count = Math.min(timesSeconds.length, rises.length - next);
      System.arraycopy(rises, next, timesSeconds, 0, count);
      Arrays.fill(rising, 0, count, true);
      next += count;
      return count;
    }

    @Override
    public double timeStepSeconds() {
      return stepSeconds;
    }

    @Override
    public List<Warning> warnings() {
      return List.of();
    }

    @Override
    public void close() {
      // nothing is open
    }
  }
}
