package turnsheet.core.measure;

import java.io.IOException;
import java.util.List;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Hands samples on and counts those at full scale. */
final class ClipCountingReader implements SampleReader {

  private final SampleReader samples;
  private final ClipCounter clips;

  ClipCountingReader(SampleReader samples, ClipCounter clips) {
    this.samples = samples;
    this.clips = clips;
  }

  @Override
  public double sampleRateHertz() {
    return samples.sampleRateHertz();
  }

  @Override
  public int read(double[] into) throws IOException, RejectedException {
    int count = samples.read(into);
    clips.add(into, count);
    return count;
  }

  @Override
  public List<Warning> warnings() {
    return samples.warnings();
  }

  @Override
  public void close() throws IOException {
    samples.close();
  }
}
