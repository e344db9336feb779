package turnsheet.core.diagnose.motion;

import java.util.Arrays;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Window;
import turnsheet.core.signal.Fluctuation;

/**
 * How strong the fluctuation is at each rate and time: overlapping Hann-windowed stretches of the
 * capture, their bins gathered into rows of equal ratio.
 *
 * <p>Units: a cell holds the peak, in percent of the mean speed, that a line in the middle of a bin
 * would have; a row that spans several bins shows the strongest of them. A line between bins reads
 * up to 1.42 dB low (scalloping of the Hann window, Harris 1978), less where zeros are padded to
 * the next power of two.
 */
public final class RateMap {

  private static final double LOWEST_HERTZ = 0.2;
  private static final double HIGHEST_HERTZ = 200;
  private static final double ROWS_PER_DECADE = 32;

  /** Short enough to show motion, long enough to part a reel from its neighbours. */
  private static final double SHARE_OF_CAPTURE = 1 / 6.0;

  private static final double SHORTEST_SECONDS = 2;
  private static final double LONGEST_SECONDS = 20;
  private static final int COLUMNS = 64;
  private static final int NEIGHBOURS = 8;

  private final double startSeconds;
  private final double columnSeconds;
  private final double windowSeconds;
  private final double fromHertz;
  private final double[][] peaks;

  private RateMap(
      double startSeconds,
      double columnSeconds,
      double windowSeconds,
      double fromHertz,
      double[][] peaks) {
    this.startSeconds = startSeconds;
    this.columnSeconds = columnSeconds;
    this.windowSeconds = windowSeconds;
    this.fromHertz = fromHertz;
    this.peaks = peaks;
  }

  /** Whether a map of it would show anything: two windows side by side at least. */
  public static boolean possible(Fluctuation fluctuation) {
    return fluctuation.durationSeconds() >= 2 * SHORTEST_SECONDS;
  }

  /**
   * @throws IllegalArgumentException if {@link #possible} says no
   */
  public static RateMap of(Fluctuation fluctuation) {
    if (!possible(fluctuation)) {
      throw new IllegalArgumentException(fluctuation.durationSeconds() + " s");
    }
    double rate = fluctuation.rateHertz();
    double wanted = SHARE_OF_CAPTURE * fluctuation.durationSeconds();
    int window = (int) (rate * Math.max(SHORTEST_SECONDS, Math.min(LONGEST_SECONDS, wanted)));
    double hop = (fluctuation.length() - window) / (double) (COLUMNS - 1);
    double from = Math.max(LOWEST_HERTZ, 2 * rate / window);
    double to = Math.min(HIGHEST_HERTZ, 0.45 * rate);
    int rows = Math.max(1, (int) (ROWS_PER_DECADE * Math.log10(to / from)));
    double[][] peaks = new double[COLUMNS][];
    Fft fft = new Fft(Fft.lengthFor(window));
    double[] shape = Window.HANN.values(window);
    double scale = 2 / (window * Window.HANN.coherentGain());
    for (int c = 0; c < COLUMNS; c++) {
      double[] work =
          Arrays.copyOf(fluctuation.percent((int) Math.round(c * hop), window), fft.length());
      for (int i = 0; i < window; i++) {
        work[i] *= shape[i] * scale;
      }
      fft.real(work);
      peaks[c] = rows(work, rate / fft.length(), from, rows);
    }
    return new RateMap(
        fluctuation.startSeconds() + (window / 2.0 - hop / 2) / rate,
        hop / rate,
        window / rate,
        from,
        peaks);
  }

  private static double[] rows(double[] bins, double stepHertz, double from, int rows) {
    double[] peaks = new double[rows];
    for (int r = 0; r < rows; r++) {
      int first = (int) Math.round(edge(from, r) / stepHertz);
      int last = Math.max(first + 1, (int) Math.round(edge(from, r + 1) / stepHertz));
      double strongest = 0;
      for (int k = first; k < last && 2 * k + 1 < bins.length; k++) {
        strongest =
            Math.max(strongest, bins[2 * k] * bins[2 * k] + bins[2 * k + 1] * bins[2 * k + 1]);
      }
      peaks[r] = Math.sqrt(strongest);
    }
    return peaks;
  }

  private static double edge(double from, int row) {
    return from * Math.pow(10, row / ROWS_PER_DECADE);
  }

  public int columns() {
    return peaks.length;
  }

  public int rows() {
    return peaks[0].length;
  }

  /** Where a column begins; {@link #columns} asked for is where the last one ends. */
  public double seconds(int column) {
    return startSeconds + column * columnSeconds;
  }

  /** Where a row begins; {@link #rows} asked for is where the last one ends. */
  public double hertz(int row) {
    return edge(fromHertz, row);
  }

  /** How much of the capture each column looks at. */
  public double windowSeconds() {
    return windowSeconds;
  }

  public double peakPercent(int column, int row) {
    return peaks[column][row];
  }

  /**
   * What half of the cells in a row and in the eight rows to either side do not exceed: noise, and
   * not the line or two that may run through them.
   */
  public double middlePercent(int row) {
    int from = Math.max(0, row - NEIGHBOURS);
    int to = Math.min(rows(), row + NEIGHBOURS + 1);
    double[] near =
        Arrays.stream(peaks)
            .flatMapToDouble(column -> Arrays.stream(column, from, to))
            .sorted()
            .toArray();
    return near[near.length / 2];
  }

  public double largestPercent() {
    return Arrays.stream(peaks).flatMapToDouble(Arrays::stream).max().orElse(0);
  }
}
