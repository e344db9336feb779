package turnsheet.core.dsp;

import java.util.Arrays;

/**
 * Noise density beside a tone, from the outer part of its band, where neither its own fluctuation
 * nor other tones of any width decide a median.
 *
 * <p>Units: two-sided density of the complex baseband, squared input unit per hertz.
 */
public final class NoiseProbe {

  private static final int LENGTH = 1024;
  private static final double INNER_SHARE = 0.5;
  private static final double OUTER_SHARE = 0.95;

  private final ToneBand band;
  private final Fft fft = new Fft(LENGTH);
  private final double[] window = Window.BLACKMAN_HARRIS.values(LENGTH);
  private final double[] work = new double[2 * LENGTH];
  private final double[] power = new double[LENGTH];
  private int filled;
  private int segments;

  public NoiseProbe(ToneBand band) {
    this.band = band;
  }

  /**
   * Takes baseband values.
   *
   * @param gone where the tone failed; the values since the last whole segment are then left out
   */
  public void add(double[] re, double[] im, boolean[] gone, int count) {
    for (int i = 0; i < count; i++) {
      if (gone[i]) {
        filled = 0;
      } else {
        add(re[i], im[i]);
      }
    }
  }

  private void add(double re, double im) {
    work[2 * filled] = re * window[filled];
    work[2 * filled + 1] = im * window[filled];
    if (++filled == LENGTH) {
      segment();
      filled = 0;
    }
  }

  private void segment() {
    fft.complex(work);
    for (int k = 0; k < LENGTH; k++) {
      power[k] += work[2 * k] * work[2 * k] + work[2 * k + 1] * work[2 * k + 1];
    }
    segments++;
  }

  /** Whether anything was seen yet. */
  public boolean ready() {
    return segments > 0;
  }

  /** The density. */
  public double density() {
    double step = band.phaseRateHertz() / LENGTH;
    int from = (int) Math.ceil(INNER_SHARE * band.passHertz() / step);
    int to = (int) Math.floor(OUTER_SHARE * band.passHertz() / step);
    double[] seen = new double[2 * (to - from + 1)];
    for (int k = from; k <= to; k++) {
      seen[2 * (k - from)] = power[k];
      seen[2 * (k - from) + 1] = power[LENGTH - k];
    }
    Arrays.sort(seen);
    double squares = 0;
    for (double w : window) {
      squares += w * w;
    }
    // the median of an average of exponentially distributed powers lies below their mean
    double v = 1 / (9.0 * segments);
    double medianOverMean = (1 - v) * (1 - v) * (1 - v);
    return seen[seen.length / 2] / segments / medianOverMean / squares / band.phaseRateHertz();
  }
}
