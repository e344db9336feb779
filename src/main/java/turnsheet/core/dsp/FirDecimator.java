package turnsheet.core.dsp;

/**
 * Filters a stream with given taps and keeps every n-th value; several filters of equal length may
 * share the stream. Bits do not depend on how the stream is cut.
 *
 * <p>Shape: output m is the sum of {@code taps[i] * in[m * factor + i]}: it belongs to the middle
 * of its taps, and nothing is invented before the first or behind the last sample.
 *
 * <p>Cost: the sums run over rows of samples that lie {@code factor} apart, so that neighbouring
 * outputs come from neighbouring places of every row. The inner loop reads whole arrays from index
 * 0, the form that the just-in-time compiler turns into vector instructions; an offset in any index
 * would undo that.
 */
public final class FirDecimator {

  /** Outputs and samples that are worked on together, so that they stay near the processor. */
  private static final int MOST_OUTPUTS = 256;

  private static final int MOST_SAMPLES = 4096;

  /** Fewer rows would leave too much to the last step, which is not done by vectors. */
  private static final int LEAST_ROWS = 8;

  private final int length;
  private final int factor;

  /** Outputs by which the stream moves from one set of rows to the next. */
  private final int stride;

  /** For every filter and set of rows one tap per row; zeros in front make the sets whole. */
  private final double[][][] taps;

  private final int outputs;
  private final double[][] rows;
  private final double[] ripe;
  private final double[] other;

  /** For every filter and set of rows but the last: sums whose turn has not come. */
  private final double[][][] held;

  private final double[] buffer;
  private int filled;

  /** Outputs that were begun and lack samples still. */
  private int begun;

  /** One filter. */
  public FirDecimator(double[] taps, int factor) {
    this(new double[][] {taps}, factor);
  }

  /** Several filters on one stream. */
  FirDecimator(double[][] filters, int factor) {
    length = filters[0].length;
    if (length == 0 || factor < 1) {
      throw new IllegalArgumentException(length + " taps, factor " + factor);
    }
    this.factor = factor;
    outputs = Math.max(1, Math.min(MOST_OUTPUTS, MOST_SAMPLES / factor));
    stride = (LEAST_ROWS + factor - 1) / factor;
    int used = stride * factor;
    int sets = (length + used - 1) / used;
    int lead = sets * used - length;
    rows = new double[(used + 3) / 4 * 4][outputs];
    taps = new double[filters.length][sets][rows.length];
    for (int f = 0; f < filters.length; f++) {
      for (int i = 0; i < length; i++) {
        taps[f][(lead + i) / used][(lead + i) % used] = filters[f][i];
      }
    }
    ripe = new double[outputs + stride];
    other = new double[outputs + stride];
    held = new double[filters.length][sets - 1][stride];
    buffer = new double[used + outputs * factor];
    filled = lead;
  }

  /** Samples between the first input and the middle of the first output. */
  public double delaySamples() {
    return (length - 1) / 2.0;
  }

  /** How many values {@link #process} may write for a number read. */
  public int roomFor(int count) {
    return count / factor + 1;
  }

  /**
   * Filters samples through the only filter.
   *
   * @param in read from index 0, left alone
   * @param out written from index 0
   * @return how many were written
   */
  public int process(double[] in, int count, double[] out) {
    return process(in, count, new double[][] {out});
  }

  /**
   * Filters samples.
   *
   * @param in read from index 0, left alone
   * @param out for every filter one array, written from index 0
   * @return how many were written to each
   */
  int process(double[] in, int count, double[][] out) {
    int written = 0;
    int read = 0;
    while (read < count) {
      int part = Math.min(count - read, buffer.length - filled);
      System.arraycopy(in, read, buffer, filled, part);
      filled += part;
      read += part;
      int used = stride * factor;
      int whole = filled < used ? 0 : Math.min(outputs, (filled - used) / factor + 1);
      if (whole > 0) {
        arrange(whole);
        written += advance(whole, out, written);
        int drop = whole * factor;
        System.arraycopy(buffer, drop, buffer, 0, filled - drop);
        filled -= drop;
      }
    }
    return written;
  }

  /** Lays the samples out in rows. */
  private void arrange(int count) {
    for (int r = 0; r < stride * factor; r++) {
      double[] row = rows[r];
      for (int m = 0, at = r; m < count; m++, at += factor) {
        row[m] = buffer[at];
      }
    }
  }

  /**
   * The sums of one set of rows are held back until those of the next set for the same output come,
   * so that each set adds to an array that begins at index 0.
   */
  private int advance(int count, double[][] out, int at) {
    int sets = taps[0].length;
    int late = (sets - 1) * stride;
    int unripe = Math.min(count, Math.max(0, late - begun));
    for (int f = 0; f < taps.length; f++) {
      double[] sums = ripe;
      java.util.Arrays.fill(sums, 0, count, 0);
      for (int s = 0; s < sets; s++) {
        if (s > 0) {
          sums = delayed(sums, count, held[f][s - 1]);
        }
        weigh(sums, taps[f][s], count);
      }
      System.arraycopy(sums, unripe, out[f], at, count - unripe);
    }
    begun = Math.min(late, begun + count);
    return count - unripe;
  }

  /** The sums {@link #stride} outputs later, in the other array. */
  private double[] delayed(double[] sums, int count, double[] before) {
    double[] later = sums == ripe ? other : ripe;
    System.arraycopy(before, 0, later, 0, stride);
    System.arraycopy(sums, 0, later, stride, count);
    System.arraycopy(later, count, before, 0, stride);
    return later;
  }

  /** Adds one set of rows, each row times its tap. */
  private void weigh(double[] sums, double[] weights, int count) {
    for (int r = 0; r < rows.length; r += 4) {
      go(
          sums,
          count,
          weights[r],
          weights[r + 1],
          weights[r + 2],
          weights[r + 3],
          rows[r],
          rows[r + 1],
          rows[r + 2],
          rows[r + 3]);
    }
  }

  private static void go(
      double[] sums,
      int n,
      double a,
      double b,
      double c,
      double d,
      double[] w,
      double[] x,
      double[] y,
      double[] z) {
    for (int m = 0; m < n; m++) {
      sums[m] += (a * w[m] + b * x[m]) + (c * y[m] + d * z[m]);
    }
  }
}
