package turnsheet.core.measure;

import java.util.List;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Edges and samples out of memory, for the tests of the plans. */
final class EdgeLists {

  private EdgeLists() {}

  static EdgeOpener rising(double[] times) {
    boolean[] all = new boolean[times.length];
    java.util.Arrays.fill(all, true);
    return of(times, all, 0);
  }

  static EdgeOpener of(double[] times, boolean[] isRising, double stepSeconds) {
    return () ->
        new EdgeReader() {
          private int next;

          @Override
          public int read(double[] into, boolean[] rising) {
            int n = Math.min(into.length, times.length - next);
            System.arraycopy(times, next, into, 0, n);
            System.arraycopy(isRising, next, rising, 0, n);
            next += n;
            return n;
          }

          @Override
          public double timeStepSeconds() {
            return stepSeconds;
          }

          @Override
          public List<Warning> warnings() {
            return List.of();
          }

          @Override
          public void close() {}
        };
  }

  static SampleReader samples(double[] values, double rate) {
    return new SampleReader() {
      private int next;

      @Override
      public double sampleRateHertz() {
        return rate;
      }

      @Override
      public int read(double[] into) {
        int n = Math.min(into.length, values.length - next);
        System.arraycopy(values, next, into, 0, n);
        next += n;
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
}
