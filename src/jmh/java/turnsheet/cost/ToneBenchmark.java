package turnsheet.cost;

import java.io.IOException;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/** Ten minutes of a tone, 96 kHz, 24 bits, one channel. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SingleShotTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(
    value = 1,
    jvmArgsAppend = {"-XX:+UseSerialGC", "-Xmx1g"})
@Warmup(iterations = 8)
@Measurement(iterations = 8)
public class ToneBenchmark {

  private static final ReadOptions OPTIONS = new ReadOptions(1, null, null, null);

  private Path file = Path.of("");

  /** Makes the recording where it is not there yet. */
  @Setup
  public void makeRecording() {
    file = Recordings.tone(10, 96_000, 1);
  }

  /** From the bytes to all figures. */
  @Benchmark
  public Reading all() throws IOException {
    return Measuring.tone(file);
  }

  /** Reading and decoding alone. */
  @Benchmark
  public double decodingOnly() throws IOException, RejectedException {
    double[] block = new double[8192];
    double sum = 0;
    try (SampleReader reader =
        CaptureFormats.standard().openSamples(FileSource.of(file), OPTIONS)) {
      while (reader.read(block) > 0) {
        sum += block[0];
      }
    }
    return sum;
  }
}
