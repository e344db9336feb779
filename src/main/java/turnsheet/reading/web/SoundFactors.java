package turnsheet.reading.web;

import java.util.List;
import java.util.stream.IntStream;
import turnsheet.core.signal.Fluctuation;

/** How many times faster a fluctuation can be played. */
final class SoundFactors {

  private static final int[] FACTORS = {5, 10, 20, 50, 100};

  /** Every browser plays up to this; beyond, most do. */
  private static final double MOST_HERTZ = 96_000;

  /** And from this. */
  private static final double LEAST_HERTZ = 3000;

  private SoundFactors() {}

  static List<Integer> of(Fluctuation fluctuation) {
    return IntStream.of(FACTORS)
        .filter(f -> f * fluctuation.rateHertz() <= MOST_HERTZ)
        .filter(f -> f * fluctuation.rateHertz() >= LEAST_HERTZ || f == FACTORS[FACTORS.length - 1])
        .boxed()
        .toList();
  }

  /** The offered factor that comes nearest to the one asked for. */
  static int offered(Fluctuation fluctuation, int wanted) {
    return of(fluctuation).stream()
        .min((a, b) -> Integer.compare(Math.abs(a - wanted), Math.abs(b - wanted)))
        .orElse(1);
  }
}
