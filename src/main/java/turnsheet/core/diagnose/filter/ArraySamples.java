package turnsheet.core.diagnose.filter;

import java.util.List;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Samples that are in memory. */
final class ArraySamples implements SampleSource {

  private final double[] samples;
  private final double rateHertz;

  /** Takes the array over. */
  ArraySamples(double[] samples, double rateHertz) {
    this.samples = samples;
    this.rateHertz = rateHertz;
  }

  @Override
  public SampleReader open() {
    return new Reader(samples, rateHertz);
  }

  private static final class Reader implements SampleReader {
    private final double[] samples;
    private final double rateHertz;
    private int taken;

    Reader(double[] samples, double rateHertz) {
      this.samples = samples;
      this.rateHertz = rateHertz;
    }

    @Override
    public double sampleRateHertz() {
      return rateHertz;
    }

    @Override
    public int read(double[] into) {
      int count = Math.min(into.length, samples.length - taken);
      System.arraycopy(samples, taken, into, 0, count);
      taken += count;
      return count;
    }

    @Override
    public List<Warning> warnings() {
      return List.of();
    }

    @Override
    public void close() {}
  }
}
