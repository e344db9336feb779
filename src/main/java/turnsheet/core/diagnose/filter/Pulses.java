package turnsheet.core.diagnose.filter;

import java.io.IOException;
import java.util.Arrays;
import turnsheet.core.dsp.CrossingReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.stats.EdgeRepair;
import turnsheet.core.stats.PeriodStatistics;

/**
 * Rising edges of one waveform, made whole: what is missing and what is too many, and the noise of
 * single edges by fourth differences ({@link PeriodStatistics}).
 */
final class Pulses {

  private static final int BLOCK = 4096;

  private final double[] times;
  private final boolean[] real;
  private final long counted;
  private final long missing;
  private final long extra;
  private final double noiseSeconds;

  private Pulses(Kept kept, long counted, EdgeRepair repair, double noiseSeconds) {
    this.times = Arrays.copyOf(kept.times, kept.count);
    this.real = Arrays.copyOf(kept.real, kept.count);
    this.counted = counted;
    this.missing = repair.missing();
    this.extra = repair.extra();
    this.noiseSeconds = noiseSeconds;
  }

  /**
   * Reads everything.
   *
   * @param periodSeconds expected
   * @param fromSeconds what comes before is left out
   * @param keep whether the times are wanted
   */
  static Pulses of(
      SampleReader samples,
      Threshold threshold,
      double periodSeconds,
      double fromSeconds,
      boolean keep)
      throws IOException, RejectedException {
    Kept kept = new Kept(keep);
    PeriodStatistics statistics = new PeriodStatistics(periodSeconds, 0.1);
    EdgeRepair repair =
        new EdgeRepair(
            periodSeconds,
            (seconds, real) -> {
              statistics.edge(seconds, real);
              kept.add(seconds, real);
            },
            (from, to, missing) -> {});
    long counted = 0;
    double[] times = new double[BLOCK];
    boolean[] rising = new boolean[BLOCK];
    CrossingReader reader = threshold.on(samples);
    int count;
    while ((count = reader.read(times, rising)) > 0) {
      for (int i = 0; i < count; i++) {
        if (rising[i] && times[i] >= fromSeconds) {
          counted++;
          repair.edge(times[i]);
        }
      }
    }
    repair.finish();
    return new Pulses(kept, counted, repair, statistics.edgeNoiseSeconds());
  }

  /** Of all pulses, repaired ones included; the first and the last only where not kept. */
  double[] times() {
    return times;
  }

  /** False for a pulse that was put where one is missing. */
  boolean[] real() {
    return real;
  }

  /** Rising edges found, before any repair. */
  long counted() {
    return counted;
  }

  long missing() {
    return missing;
  }

  long extra() {
    return extra;
  }

  /** NaN where fewer than six edges follow each other. */
  double noiseSeconds() {
    return noiseSeconds;
  }

  double first() {
    return times[0];
  }

  double last() {
    return times[times.length - 1];
  }

  boolean none() {
    return times.length == 0;
  }

  double meanPeriodSeconds() {
    return (last() - first()) / (times.length - 1);
  }

  /** The times, or of all of them the first and the last only. */
  private static final class Kept {
    private final boolean all;
    private double[] times = new double[2];
    private boolean[] real = new boolean[2];
    private int count;

    Kept(boolean all) {
      this.all = all;
    }

    void add(double seconds, boolean isReal) {
      if (!all && count == 2) {
        count = 1;
      }
      if (count == times.length) {
        times = Arrays.copyOf(times, 2 * count);
        real = Arrays.copyOf(real, 2 * count);
      }
      times[count] = seconds;
      real[count++] = isReal;
    }
  }
}
