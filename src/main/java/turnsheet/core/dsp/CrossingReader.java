package turnsheet.core.dsp;

import java.io.IOException;
import java.util.List;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/**
 * Edges of a waveform: the times at which it crosses a level, each counted only after it has gone
 * beyond a band about that level. Between samples the waveform is a cubic through the four nearest.
 */
public final class CrossingReader implements EdgeReader {

  private static final int BLOCK = 8192;

  private final SampleReader samples;
  private final double rateHertz;
  private final double level;
  private final double band;
  private final double[] block = new double[BLOCK];
  private int filled;
  private int taken;
  private boolean ended;
  // the four last samples less the level; a crossing is looked for between b and c
  private double a;
  private double b;
  private double c;
  private double d;
  private long count;
  private int flush;
  private int side;
  private double crossingUp = Double.NaN;
  private double crossingDown = Double.NaN;

  /**
   * @param level to be crossed, in the unit of the samples
   * @param band how far beyond the level the waveform must go before an edge counts, not negative
   */
  public CrossingReader(SampleReader samples, double level, double band) {
    this.samples = samples;
    this.rateHertz = samples.sampleRateHertz();
    this.level = level;
    this.band = band;
  }

  @Override
  public int read(double[] timesSeconds, boolean[] rising) throws IOException, RejectedException {
    int n = 0;
    while (n < timesSeconds.length && advance()) {
      if (count < 3) {
        continue;
      }
      // the sample b has the number count - 3
      if (b < 0 && c >= 0) {
        crossingUp = (count - 3 + root()) / rateHertz;
      } else if (b >= 0 && c < 0) {
        crossingDown = (count - 3 + root()) / rateHertz;
      }
      if (side <= 0 && c > band) {
        if (side < 0 && !Double.isNaN(crossingUp)) {
          timesSeconds[n] = crossingUp;
          rising[n++] = true;
        }
        side = 1;
      } else if (side >= 0 && c < -band) {
        if (side > 0 && !Double.isNaN(crossingDown)) {
          timesSeconds[n] = crossingDown;
          rising[n++] = false;
        }
        side = -1;
      }
    }
    return n;
  }

  /** Moves on by one sample; past the end the last one is repeated once. */
  private boolean advance() throws IOException, RejectedException {
    if (taken == filled && !ended) {
      filled = samples.read(block);
      taken = 0;
      ended = filled == 0;
    }
    if (ended && (count == 0 || flush++ > 0)) {
      return false;
    }
    double next = ended ? d : block[taken++] - level;
    if (count == 0) {
      b = next;
      c = next;
      d = next;
    }
    a = b;
    b = c;
    c = d;
    d = next;
    count++;
    return true;
  }

  /** Where the cubic through the four samples is zero, as a share of the step from b to c. */
  private double root() {
    double first = c - a / 3 - b / 2 - d / 6;
    double second = (a + c) / 2 - b;
    double third = (d - a) / 6 + (b - c) / 2;
    double low = 0;
    double high = 1;
    double x = b / (b - c);
    for (int i = 0; i < 20; i++) {
      double y = b + x * (first + x * (second + x * third));
      double step = y / (first + x * (2 * second + x * 3 * third));
      if (Math.abs(step) < 1e-9) {
        return Math.max(0, Math.min(1, x - step));
      }
      if (y < 0 == b < 0) {
        low = x;
      } else {
        high = x;
      }
      double better = x - step;
      // Newton may leave the bracket where the cubic bends
      x = better > low && better < high ? better : (low + high) / 2;
    }
    return x;
  }

  @Override
  public double timeStepSeconds() {
    return 0;
  }

  @Override
  public List<Warning> warnings() {
    return samples.warnings();
  }

  @Override
  public void close() throws IOException {
    samples.close();
  }
}
