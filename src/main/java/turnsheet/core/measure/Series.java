package turnsheet.core.measure;

import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.SpeedTrace;

/**
 * The curves behind a reading, for drawing.
 *
 * @param trace unweighted speed relative to nominal, in percent
 * @param spectrum of the speed, relative to the mean
 * @param histogram of the periods; null for a tone
 */
public record Series(SpeedTrace trace, Spectrum spectrum, @Nullable Histogram histogram) {

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
