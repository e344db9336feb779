package turnsheet.cost;

import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import turnsheet.core.dsp.ToneBand;
import turnsheet.core.dsp.ToneDemodulator;

/** The kernel at the rate of the recording: time per sample. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@Fork(
    value = 1,
    jvmArgsAppend = {"-XX:+UseSerialGC", "-Xmx256m"})
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class KernelBenchmark {

  private static final int SAMPLES = 8192;

  /** Samples per second. */
  @Param({"44100", "96000", "192000"})
  public int rateHertz;

  private double[] samples = new double[0];
  private ToneDemodulator demodulator = demodulator(44_100);

  /** Fills the block with noise; the kernel's time does not depend on what it is fed. */
  @Setup
  public void fill() {
    samples = new Random(1).doubles(SAMPLES, -1, 1).toArray();
    demodulator = demodulator(rateHertz);
  }

  private static ToneDemodulator demodulator(double rateHertz) {
    return new ToneDemodulator(ToneBand.of(Recordings.TONE_HERTZ, rateHertz));
  }

  /** Mixing and both decimations. */
  @Benchmark
  @OperationsPerInvocation(SAMPLES)
  public int demodulate() {
    return demodulator.process(samples, SAMPLES);
  }
}
