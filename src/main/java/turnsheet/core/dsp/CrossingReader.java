package turnsheet.core.dsp;

import java.io.IOException;
import java.util.List;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/**
 * Edges of a waveform: the times at which it crosses a level, each counted only after it has gone
 * beyond a band about that level. Between samples the waveform is what a band-limited one must be
 * ({@link SampleInterpolator}); within half its reach of the ends, a cubic through the four
 * nearest. A step from one level to another within a single sample, as a logic signal has it, is
 * not band-limited and tells nothing of where in the sample it was: it is taken in the middle, so
 * that such a train keeps its step of one sample and is known by it.
 */
public final class CrossingReader implements EdgeReader {

  private static final int BLOCK = 8192;
  private static final int TAPS = SampleInterpolator.TAPS;

  /** Samples that must be known beyond c. */
  private static final int AHEAD = TAPS / 2 - 1;

  /** A band-limited step swings by a tenth and more of itself beside the crossing. */
  private static final double HARD = 0.02;

  private final SampleReader samples;
  private final double rateHertz;
  private final double level;
  private final double band;

  /** How far above the level a rise is timed, and how far below it a fall. */
  private final double half;

  private final double[] block = new double[BLOCK];
  private int filled;
  private int taken;
  private boolean ended;

  /** The latest samples less the level, twice in a row, so that they always lie in one piece. */
  private final double[] ring = new double[2 * TAPS];

  private int oldest;
  // four samples in the middle of them; a crossing is looked for between b and c
  private double a;
  private double b;
  private double c;
  private double d;
  private double newest;
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
    this(samples, level, band, 0);
  }

  private CrossingReader(SampleReader samples, double level, double band, double half) {
    this.samples = samples;
    this.rateHertz = samples.sampleRateHertz();
    this.level = level;
    this.band = band;
    this.half = half;
  }

  /**
   * Edges as a comparator gives them: it rises where the waveform passes the level and half the
   * hysteresis, and falls as much below the level.
   *
   * @param hysteresis distance of its two thresholds, in the unit of the samples, not negative
   */
  public static CrossingReader comparator(SampleReader samples, double level, double hysteresis) {
    return new CrossingReader(samples, level, hysteresis / 2, hysteresis / 2);
  }

  @Override
  public int read(double[] timesSeconds, boolean[] rising) throws IOException, RejectedException {
    int n = 0;
    while (n < timesSeconds.length && advance()) {
      // the sample b has this number
      long before = count - AHEAD - 2;
      if (before < 0) {
        continue;
      }
      if (b < half && c >= half) {
        crossingUp = (before + crossing(before, half)) / rateHertz;
      } else if (b >= -half && c < -half) {
        crossingDown = (before + crossing(before, -half)) / rateHertz;
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

  /** Moves on by one sample; past the end the last one is repeated. */
  private boolean advance() throws IOException, RejectedException {
    if (taken == filled && !ended) {
      filled = samples.read(block);
      taken = 0;
      ended = filled == 0;
    }
    if (ended && (count == 0 || flush == AHEAD)) {
      return false;
    }
    if (ended) {
      flush++;
    } else {
      newest = block[taken++] - level;
    }
    if (count == 0) {
      java.util.Arrays.fill(ring, newest);
      b = newest;
      c = newest;
      d = newest;
    }
    ring[oldest] = newest;
    ring[oldest + TAPS] = newest;
    oldest = oldest + 1 == TAPS ? 0 : oldest + 1;
    a = b;
    b = c;
    c = d;
    d = ring[oldest + TAPS / 2 + 1];
    count++;
    return true;
  }

  /**
   * Where the waveform passes a threshold, as a share of the step from b to c.
   *
   * @param off of the threshold from the level
   */
  private double crossing(long before, double off) {
    double coarse = root(a - off, b - off, c - off, d - off);
    if (before < AHEAD || ended || isHard()) {
      return coarse;
    }
    int steps = SampleInterpolator.STEPS;
    int k = Math.min(steps - 1, (int) (coarse * steps));
    double here = SampleInterpolator.at(ring, oldest, k) - off;
    double next = SampleInterpolator.at(ring, oldest, k + 1) - off;
    // the waveform is where b is to the left of the crossing and where c is to its right
    boolean below = b < off;
    while (k > 0 && here < 0 != below) {
      next = here;
      here = SampleInterpolator.at(ring, oldest, --k) - off;
    }
    while (k < steps - 1 && next < 0 == below) {
      here = next;
      next = SampleInterpolator.at(ring, oldest, ++k + 1) - off;
    }
    double left = SampleInterpolator.at(ring, oldest, k - 1) - off;
    double right = SampleInterpolator.at(ring, oldest, k + 2) - off;
    return here < 0 == next < 0 ? coarse : (k + root(left, here, next, right)) / steps;
  }

  /** Whether all samples around lie on the two levels between which this step goes. */
  private boolean isHard() {
    double near = HARD * Math.abs(c - b);
    for (int i = oldest; i < oldest + TAPS; i++) {
      if (Math.abs(ring[i] - b) > near && Math.abs(ring[i] - c) > near) {
        return false;
      }
    }
    return true;
  }

  /** Where the cubic through four even values is zero, as a share of the step from b to c. */
  private static double root(double a, double b, double c, double d) {
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
