package turnsheet.core.diagnose.motion;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.dsp.Fft;
import turnsheet.core.dsp.Window;

/**
 * Peaks of short spectra, linked from one to the next. A peak counts where its power is so much
 * above the median of the bins about it that noise alone does so less often than once in four
 * thousand bins; a track counts where it holds for most of the capture.
 */
final class PeakTracks {

  /** Noise powers are exponential: {@code exp(-12 ln 2)} is 2.4e-4. */
  private static final double OVER_MEDIAN = 12;

  /** Below, side lobes of the window and rounding can look like lines, as in other spectra here. */
  private static final double SMALLEST_SHARE = 1e-3;

  private static final double SMALLEST_PERCENT = 0.0002;

  private static final double SHARE_OF_CAPTURE = 1 / 5.0;
  private static final double SHORTEST_SECONDS = 5;
  private static final double LONGEST_SECONDS = 12;
  private static final int HOPS_PER_WINDOW = 8;
  private static final int LONGEST_BREAK = HOPS_PER_WINDOW / 2;
  private static final double LEAST_SHARE = 0.6;

  /** A line moves less than this much of a window's resolution from one hop to the next. */
  private static final double REACH = 0.6;

  private static final int BESIDE_BINS = 24;
  private static final int PADDING = 4;
  private static final double LOWEST_TURNS = 3;

  private final double windowSeconds;
  private final List<List<MovingLine.Place>> tracks = new ArrayList<>();

  /**
   * @param samples percent
   * @param startSeconds time of the first one
   */
  PeakTracks(double[] samples, double rateHertz, double startSeconds, double toHertz) {
    double seconds = samples.length / rateHertz;
    windowSeconds =
        Math.min(
            seconds / 2,
            Math.max(SHORTEST_SECONDS, Math.min(LONGEST_SECONDS, SHARE_OF_CAPTURE * seconds)));
    int window = (int) (windowSeconds * rateHertz);
    int hop = Math.max(1, window / HOPS_PER_WINDOW);
    int columns = (samples.length - window) / hop + 1;
    Fft fft = new Fft(Fft.lengthFor(PADDING * window));
    double[] shape = Window.HANN.values(window);
    double scale = 2 / (window * Window.HANN.coherentGain());
    List<Open> open = new ArrayList<>();
    for (int c = 0; c < columns; c++) {
      double[] work =
          Arrays.copyOf(Arrays.copyOfRange(samples, c * hop, c * hop + window), fft.length());
      for (int i = 0; i < window; i++) {
        work[i] *= shape[i] * scale;
      }
      fft.real(work);
      double middle = startSeconds + (c * hop + window / 2.0) / rateHertz;
      link(open, peaks(work, rateHertz / fft.length(), toHertz, middle), c);
    }
    open.stream()
        .map(o -> o.places)
        .filter(p -> p.size() >= Math.max(4, LEAST_SHARE * columns))
        .forEach(tracks::add);
  }

  /** Length of one short spectrum. */
  double windowSeconds() {
    return windowSeconds;
  }

  List<List<MovingLine.Place>> tracks() {
    return tracks;
  }

  private static final class Open {
    final List<MovingLine.Place> places = new ArrayList<>();
    int lastColumn;

    double hertz() {
      return places.get(places.size() - 1).hertz();
    }
  }

  /** The strongest peaks choose first. */
  private void link(List<Open> open, List<MovingLine.Place> peaks, int column) {
    for (MovingLine.Place peak : peaks) {
      Open nearest = null;
      for (Open o : open) {
        boolean alive = o.lastColumn < column && o.lastColumn >= column - LONGEST_BREAK;
        double off = Math.abs(o.hertz() - peak.hertz());
        if (alive
            && off <= REACH / windowSeconds
            && (nearest == null || off < Math.abs(nearest.hertz() - peak.hertz()))) {
          nearest = o;
        }
      }
      if (nearest == null) {
        nearest = new Open();
        open.add(nearest);
      }
      nearest.places.add(peak);
      nearest.lastColumn = column;
    }
  }

  private List<MovingLine.Place> peaks(
      double[] bins, double stepHertz, double toHertz, double seconds) {
    int last = Math.min(bins.length / 2 - 2, (int) (toHertz / stepHertz));
    double[] power = new double[last + 2];
    for (int k = 1; k < power.length; k++) {
      power[k] = bins[2 * k] * bins[2 * k] + bins[2 * k + 1] * bins[2 * k + 1];
    }
    int lobe = (int) Math.ceil(2 / windowSeconds / stepHertz);
    double[] middles = middles(power, BESIDE_BINS * lobe / 2);
    double strongest = Math.sqrt(Arrays.stream(power).max().orElse(0));
    double least = Math.pow(Math.max(SMALLEST_PERCENT, SMALLEST_SHARE * strongest), 2);
    List<MovingLine.Place> peaks = new ArrayList<>();
    for (int k = Math.max(2, (int) (LOWEST_TURNS / windowSeconds / stepHertz)); k <= last; k++) {
      if (power[k] > power[k - 1]
          && power[k] >= power[k + 1]
          && power[k] >= least
          && power[k] > OVER_MEDIAN * middles[2 * k / (BESIDE_BINS * lobe)]) {
        double a = Math.log(power[k - 1]);
        double b = Math.log(power[k]);
        double c = Math.log(power[k + 1]);
        double shift = 0.5 * (a - c) / (a - 2 * b + c);
        peaks.add(
            new MovingLine.Place(
                seconds, (k + shift) * stepHertz, Math.exp((b - 0.25 * (a - c) * shift) / 2)));
      }
    }
    peaks.sort(java.util.Comparator.comparingDouble(MovingLine.Place::peakPercent).reversed());
    return peaks;
  }

  /**
   * Medians of the bins about each stretch of spectrum, as long again to either side: a line's lobe
   * is a twelfth of that and hardly moves them.
   */
  private static double[] middles(double[] power, int stretch) {
    double[] middles = new double[power.length / stretch + 1];
    for (int i = 0; i < middles.length; i++) {
      double[] near =
          Arrays.copyOfRange(
              power,
              Math.max(1, (i - 1) * stretch),
              Math.max(2, Math.min(power.length, (i + 2) * stretch)));
      Arrays.sort(near);
      middles[i] = near[near.length / 2];
    }
    return middles;
  }
}
