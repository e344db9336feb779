package turnsheet.core.diagnose.filter;

import turnsheet.core.dsp.CrossingReader;
import turnsheet.core.signal.SampleReader;

/**
 * Where a waveform becomes edges.
 *
 * @param band how far beyond the level it must go before an edge counts
 * @param half how far above the level a rise is timed; 0 or the band
 */
record Threshold(double level, double band, double half) {

  /** What counts as an edge of a waveform that is measured by itself, as a share of its swing. */
  private static final double BAND_SHARE = 0.11;

  /** The middle of the waveform. */
  static Threshold middle(double low, double high) {
    return new Threshold((low + high) / 2, BAND_SHARE * (high - low), 0);
  }

  static Threshold comparator(double level, double hysteresis) {
    return new Threshold(level, hysteresis / 2, hysteresis / 2);
  }

  CrossingReader on(SampleReader samples) {
    return half == 0
        ? new CrossingReader(samples, level, band)
        : CrossingReader.comparator(samples, level, 2 * half);
  }
}
