package turnsheet.core.measure;

import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.stats.MagnitudeBlocks;

/**
 * The curves behind a reading, for drawing, and its fluctuation in blocks, for comparing.
 *
 * @param trace unweighted speed relative to nominal, in percent
 * @param spectrum of the speed, relative to the mean
 * @param histogram of the periods; null for a tone
 * @param blocks of the weighted fluctuation
 * @param fluctuation up to 200 Hz, of the first hour at most; made when asked for, as only some ask
 *     and it takes memory of its own
 */
public record Series(
    SpeedTrace trace,
    Spectrum spectrum,
    @Nullable Histogram histogram,
    Blocks blocks,
    Supplier<Fluctuation> fluctuation) {

  /**
   * The weighted fluctuation of a capture in blocks of 2.5 s or more.
   *
   * @param fluctuation percent of the mean speed
   * @param indication what the quasi-peak indicator read, in percent
   */
  public record Blocks(MagnitudeBlocks fluctuation, MagnitudeBlocks indication) {}

  /** Amplitude spectrum: bin k is at {@code k * stepHz} and reads the peak of a line in percent. */
  public static final class Spectrum {
    private final double stepHz;
    private final double[] peakPercent;

    public Spectrum(double stepHz, double[] peakPercent) {
      this.stepHz = stepHz;
      this.peakPercent = peakPercent.clone();
    }

    public double stepHz() {
      return stepHz;
    }

    public int size() {
      return peakPercent.length;
    }

    public double peakPercent(int bin) {
      return peakPercent[bin];
    }
  }

  /** Counts in equal classes; class k spans {@code from + k * width} to {@code + width}. */
  public static final class Histogram {
    private final double fromMicroseconds;
    private final double widthMicroseconds;
    private final long[] counts;

    public Histogram(double fromMicroseconds, double widthMicroseconds, long[] counts) {
      this.fromMicroseconds = fromMicroseconds;
      this.widthMicroseconds = widthMicroseconds;
      this.counts = counts.clone();
    }

    public double fromMicroseconds() {
      return fromMicroseconds;
    }

    public double widthMicroseconds() {
      return widthMicroseconds;
    }

    public int size() {
      return counts.length;
    }

    public long count(int index) {
      return counts[index];
    }
  }
}
