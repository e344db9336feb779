package turnsheet.core.diagnose.wheel;

import java.io.IOException;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.EdgeTimes;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/** What is needed to look at lists of edges. */
final class Wheels {

  private Wheels() {}

  static EdgeTimes edges(double[] rises, double pulsesPerSecond)
      throws IOException, RejectedException {
    return EdgeTimes.of(
        () -> new Listed(rises),
        MeasureSettings.edges(pulsesPerSecond, null),
        WheelLook.MOST_EDGES);
  }

  static Reading measured(double[] rises, double pulsesPerSecond)
      throws IOException, RejectedException {
    return edges(rises, pulsesPerSecond).measured(rises, null);
  }

  static WheelFinding look(double[] rises, double pulsesPerSecond, @Nullable Integer stated)
      throws IOException, RejectedException {
    EdgeTimes edges = edges(rises, pulsesPerSecond);
    return WheelLook.find(edges, stated, edges.measured(rises, null), done -> {});
  }

  /** A list in memory. */
  private static final class Listed implements EdgeReader {
    private final double[] rises;
    private int next;

    Listed(double[] rises) {
      this.rises = rises;
    }

    @Override
    public int read(double[] times, boolean[] rising) {
      int n = Math.min(times.length, rises.length - next);
      System.arraycopy(rises, next, times, 0, n);
      Arrays.fill(rising, 0, n, true);
      next += n;
      return n;
    }

    @Override
    public double timeStepSeconds() {
      return 0;
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
