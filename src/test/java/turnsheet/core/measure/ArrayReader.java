package turnsheet.core.measure;

import java.util.List;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Hands out samples of an array in blocks of a given length. */
final class ArrayReader implements SampleReader {

  private final double[] samples;
  private final double rate;
  private final int block;
  private int at;

  ArrayReader(double[] samples, double rate, int block) {
    this.samples = samples;
    this.rate = rate;
    this.block = block;
  }

  @Override
  public double sampleRateHertz() {
    return rate;
  }

  @Override
  public int read(double[] into) {
    int n = Math.min(Math.min(into.length, block), samples.length - at);
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
