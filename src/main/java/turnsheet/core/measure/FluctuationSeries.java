package turnsheet.core.measure;

import java.util.function.DoubleConsumer;
import turnsheet.core.dsp.FirDecimator;
import turnsheet.core.dsp.KaiserFir;
import turnsheet.core.signal.Fluctuation;

/**
 * The fluctuation of a capture for looking at it over time and for listening to it: up to 200 Hz,
 * at least 500 values a second where the trace has them. Short gaps are bridged, long ones silent.
 */
final class FluctuationSeries {

  /** Longer captures keep their first hour. */
  static final double LONGEST_SECONDS = 3600;

  private static final double SLOWEST_HERTZ = 500;
  private static final double PASS_HERTZ = 205;
  private static final double ATTENUATION_DB = 80;
  private static final int BLOCK = 4096;

  private FluctuationSeries() {}

  /** Runs over the trace twice, so that nothing but the result is held. */
  static Fluctuation of(Residual residual) {
    double rate = residual.clean().rateHertz();
    int factor = Math.max(1, (int) (rate / SLOWEST_HERTZ));
    double[] taps =
        factor == 1
            ? new double[] {1}
            : KaiserFir.lowPass(PASS_HERTZ, rate / factor - PASS_HERTZ, ATTENUATION_DB, rate);
    double[] largest = new double[1];
    int[] count = new int[1];
    run(
        residual,
        new FirDecimator(taps, factor),
        value -> {
          largest[0] = Math.max(largest[0], Math.abs(value));
          count[0]++;
        });
    Fluctuation.Builder builder = new Fluctuation.Builder(count[0], largest[0]);
    FirDecimator filter = new FirDecimator(taps, factor);
    run(residual, filter, builder::add);
    double start = residual.clean().trace().startSeconds() + filter.delaySamples() / rate;
    return builder.build(start, rate / factor);
  }

  private static void run(Residual residual, FirDecimator filter, DoubleConsumer sink) {
    CleanTrace clean = residual.clean();
    int end = (int) Math.min(clean.trace().length(), LONGEST_SECONDS * clean.rateHertz());
    double[] in = new double[BLOCK];
    double[] out = new double[filter.roomFor(BLOCK)];
    int at = 0;
    for (CleanTrace.Piece piece : clean.pieces()) {
      at = silence(filter, at, Math.min(end, piece.from()), in, out, sink);
      while (at < Math.min(end, piece.to())) {
        int part = Math.min(BLOCK, Math.min(end, piece.to()) - at);
        residual.copy(at, in, part);
        give(filter, in, part, out, sink);
        at += part;
      }
    }
    silence(filter, at, end, in, out, sink);
  }

  private static int silence(
      FirDecimator filter, int from, int to, double[] in, double[] out, DoubleConsumer sink) {
    int at = from;
    java.util.Arrays.fill(in, 0);
    while (at < to) {
      int part = Math.min(BLOCK, to - at);
      give(filter, in, part, out, sink);
      at += part;
    }
    return Math.max(from, to);
  }

  private static void give(
      FirDecimator filter, double[] in, int count, double[] out, DoubleConsumer sink) {
    int made = filter.process(in, count, out);
    for (int i = 0; i < made; i++) {
      sink.accept(out[i]);
    }
  }
}
