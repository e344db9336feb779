package turnsheet.core.diagnose;

import java.util.List;
import java.util.Random;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.SampleSource;
import turnsheet.core.signal.Warning;

/** Waveforms put together line by line. */
public final class Waves {

  private Waves() {}

  /** Adds a sine. */
  public static void add(double[] x, double rate, double hertz, double peak, double phase) {
    for (int i = 0; i < x.length; i++) {
      double turns = hertz * i / rate;
      x[i] += peak * Math.sin(2 * Math.PI * (turns - Math.rint(turns)) + phase);
    }
  }

  /** Adds white Gaussian noise. */
  public static void addNoise(double[] x, double rms, long seed) {
    Random random = new Random(seed);
    for (int i = 0; i < x.length; i++) {
      x[i] += rms * random.nextGaussian();
    }
  }

  /** Rounds to 16 bits. */
  public static void round16(double[] x) {
    for (int i = 0; i < x.length; i++) {
      x[i] = Math.max(-32768, Math.min(32767, Math.rint(x[i] * 32768))) / 32768;
    }
  }

  /** A recording that can be opened again and again. */
  public static SampleSource source(double[] x, double rate) {
    return () ->
        new SampleReader() {
          private int at;

          @Override
          public double sampleRateHertz() {
            return rate;
          }

          @Override
          public int read(double[] into) {
            int n = Math.min(into.length, x.length - at);
            System.arraycopy(x, at, into, 0, n);
            at += n;
            return n;
          }

          @Override
          public List<Warning> warnings() {
            return List.of();
          }

          @Override
          public void close() {}
        };
  }

  /** A reading at nominal speed of which only source and speed are ever asked. */
  public static Reading reading(MeasureSettings settings, double seconds) {
    Figure none = Figure.absent("not measured");
    return new Reading(
        new Reading.Source("ab", "made", settings.kind(), 1, null, seconds),
        new Reading.Method("0", settings),
        new Reading.Speed(
            settings.nominalHz(), Figure.of(settings.nominalHz(), 0.001), none, none, none, none),
        new Reading.Flutter(none, none, none, none, List.of()),
        List.of(),
        null,
        new Reading.Signal(none, List.of(), 0, List.of(), none),
        List.of());
  }
}
