package turnsheet.core.diagnose.sensor;

import java.io.IOException;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.dsp.CrossingReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.SampleSource;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.Quantiles;

/**
 * The beginning of a tachometer's waveform with its levels and edges, found as the measurement
 * finds them. Arrays are handed out as they are, to be read only.
 */
final class Wave {

  /** 21 s at 96 kHz. */
  private static final int MOST_SAMPLES = 2_000_000;

  private static final int FEWEST_EDGES = 20;
  private static final int PROBE_SAMPLES = 400_000;
  private static final double LEVEL_SHARE = 0.005;
  private static final double BAND_SHARE = 0.11;

  private final double[] samples;
  private final double rateHertz;
  private final double low;
  private final double high;
  private final double[] rises;
  private final double[] falls;

  private Wave(
      double[] samples, double rateHertz, double low, double high, double[] rises, double[] falls) {
    this.samples = samples;
    this.rateHertz = rateHertz;
    this.low = low;
    this.high = high;
    this.rises = rises;
    this.falls = falls;
  }

  /** Reads the beginning; the source is opened once. */
  static Wave read(SampleSource source, double clockErrorPpm)
      throws IOException, RejectedException {
    try (SampleReader reader = source.open()) {
      double rate = reader.sampleRateHertz() * (1 + clockErrorPpm * 1e-6);
      double[] kept = new double[1 << 16];
      double[] block = new double[8192];
      int used = 0;
      int n;
      while (used < MOST_SAMPLES && (n = reader.read(block)) > 0) {
        int part = Math.min(n, MOST_SAMPLES - used);
        if (used + part > kept.length) {
          kept = Arrays.copyOf(kept, Math.min(MOST_SAMPLES, 2 * kept.length + part));
        }
        System.arraycopy(block, 0, kept, used, part);
        used += part;
      }
      return of(Arrays.copyOf(kept, used), rate);
    }
  }

  static Wave of(double[] samples, double rateHertz) throws IOException, RejectedException {
    int every = Math.max(1, samples.length / PROBE_SAMPLES);
    double[] some = new double[samples.length / every];
    for (int i = 0; i < some.length; i++) {
      some[i] = samples[i * every];
    }
    if (some.length < 2) {
      throw new RejectedException(
          "tooShort", "The recording is too short to look at its waveform: record 10 s or more.");
    }
    Quantiles levels = new Quantiles(some);
    double low = levels.at(LEVEL_SHARE);
    double high = levels.at(1 - LEVEL_SHARE);
    double[] rises = new double[1024];
    double[] falls = new double[1024];
    int up = 0;
    int down = 0;
    double[] times = new double[1024];
    boolean[] rising = new boolean[1024];
    try (CrossingReader edges =
        new CrossingReader(new Again(samples), (low + high) / 2, BAND_SHARE * (high - low))) {
      int n;
      while ((n = edges.read(times, rising)) > 0) {
        for (int i = 0; i < n; i++) {
          if (rising[i]) {
            rises = up == rises.length ? Arrays.copyOf(rises, 2 * up) : rises;
            rises[up++] = times[i];
          } else {
            falls = down == falls.length ? Arrays.copyOf(falls, 2 * down) : falls;
            falls[down++] = times[i];
          }
        }
      }
    }
    if (up < FEWEST_EDGES) {
      throw new RejectedException(
          "fewPulses",
          "The beginning of the recording holds fewer than 20 pulses, too few to judge the signal:"
              + " record more of them.");
    }
    return new Wave(
        samples, rateHertz, low, high, Arrays.copyOf(rises, up), Arrays.copyOf(falls, down));
  }

  double[] samples() {
    return samples;
  }

  double rateHertz() {
    return rateHertz;
  }

  double low() {
    return low;
  }

  double high() {
    return high;
  }

  /** Places of the rising edges in samples from the first, in order. */
  double[] rises() {
    return rises;
  }

  /** Places of the falling edges, in order. */
  double[] falls() {
    return falls;
  }

  double seconds() {
    return samples.length / rateHertz;
  }

  double swing() {
    return high - low;
  }

  double level() {
    return (low + high) / 2;
  }

  /** Middle distance of rising edges in samples. */
  double periodSamples() {
    double[] periods = new double[rises.length - 1];
    for (int i = 0; i < periods.length; i++) {
      periods[i] = rises[i + 1] - rises[i];
    }
    return new Quantiles(periods).median();
  }

  /** Mean pulse rate. */
  double pulsesPerSecond() {
    return rateHertz / periodSamples();
  }

  /**
   * The widest band about the crossing level that every pulse still leaves on both sides: a
   * comparator with more hysteresis would lose an edge.
   */
  double widestHysteresis() {
    double least = swing();
    int f = 0;
    for (int r = 0; r + 1 < rises.length; r++) {
      while (f < falls.length && falls[f] < rises[r]) {
        f++;
      }
      if (f < falls.length && falls[f] < rises[r + 1]) {
        least = Math.min(least, 2 * (extreme(rises[r], falls[f], 1) - level()));
        least = Math.min(least, 2 * (level() + extreme(falls[f], rises[r + 1], -1)));
      }
    }
    return Math.max(0, least);
  }

  /** Highest of the samples times a sign between two places. */
  private double extreme(double from, double to, int sign) {
    double most = Double.NEGATIVE_INFINITY;
    for (int i = (int) Math.ceil(from); i <= to && i < samples.length; i++) {
      most = Math.max(most, sign * samples[i]);
    }
    return most;
  }

  /** The samples once more, one a second, so that times are places. */
  private static final class Again implements SampleReader {
    private final double[] samples;
    private int at;

    Again(double[] samples) {
      this.samples = samples;
    }

    @Override
    public double sampleRateHertz() {
      return 1;
    }

    @Override
    public int read(double[] into) {
      int n = Math.min(into.length, samples.length - at);
      System.arraycopy(samples, at, into, 0, n);
      at += n;
      return n;
    }

    @Override
    public List<Warning> warnings() {
      return List.of();
    }

    @Override
    public void close() {}
  }
}
