package turnsheet.core.diagnose.filter;

import java.io.IOException;
import java.util.List;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** A waveform behind a filter, up to a limit of time; tells its progress against that limit. */
final class FilteredReader implements SampleReader {

  private final SampleReader samples;
  private final DiscreteFilter filter;
  private final long limit;
  private final Progress progress;
  private long count;

  FilteredReader(
      SampleReader samples, DiscreteFilter filter, double limitSeconds, Progress progress) {
    this.samples = samples;
    this.filter = filter;
    this.limit = (long) (limitSeconds * samples.sampleRateHertz());
    this.progress = progress;
  }

  @Override
  public double sampleRateHertz() {
    return samples.sampleRateHertz();
  }

  @Override
  public int read(double[] into) throws IOException, RejectedException {
    int read = count >= limit ? 0 : samples.read(into);
    int kept = (int) Math.min(read, limit - count);
    filter.process(into, kept);
    count += kept;
    progress.reached((double) count / limit);
    return kept;
  }

  /** Samples handed out so far. */
  long count() {
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
