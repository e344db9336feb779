package turnsheet.core.diagnose.wheel;

import java.util.List;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** A waveform in memory, as 16 bits would have kept it. */
final class Samples implements SampleReader {

  private final double[] samples;
  private final double rateHertz;
  private int next;

  Samples(double[] samples, double rateHertz) {
    this.samples = samples;
    this.rateHertz = rateHertz;
  }

  @Override
  public double sampleRateHertz() {
    return rateHertz;
  }

  @Override
  public int read(double[] block) {
    int n = Math.min(block.length, samples.length - next);
    for (int i = 0; i < n; i++) {
      block[i] = Math.rint(samples[next++] * 32768) / 32768;
    }
    return n;
  }

  @Override
  public List<Warning> warnings() {
    return List.of();
  }

  @Override
  public void close() {
    // nothing is open
  }
}
