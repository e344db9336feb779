package turnsheet.core.diagnose.parts;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.jspecify.annotations.Nullable;

/**
 * What a part would have to be like to leave a line that no known part explains.
 *
 * @param diameterMm of something that runs at tape speed; null where nothing does or the diameter
 *     would be none of a roller
 * @param diameterUncertaintyMm at k = 2; null with it
 * @param reference the part whose rate is known best; null where there is none
 * @param ratio line over that part's rate; null with it
 * @param ratioUncertainty at k = 2; null with it
 */
public record Explanation(
    @Nullable Double diameterMm,
    @Nullable Double diameterUncertaintyMm,
    @Nullable String reference,
    @Nullable Double ratio,
    @Nullable Double ratioUncertainty) {

  private static final double SMALLEST_MM = 1;
  private static final double LARGEST_MM = 400;
  // half the distance of two whole numbers is 0.5: a whole number met by chance in less than one
  // of five cases
  private static final double TELLING = 0.1;

  /** The whole number that the ratio can be, as of teeth or poles; empty where it tells nothing. */
  public OptionalInt wholeNumber() {
    if (ratio == null || ratioUncertainty == null || ratioUncertainty > TELLING) {
      return OptionalInt.empty();
    }
    long nearest = Math.round(ratio);
    return nearest >= 2 && Math.abs(ratio - nearest) <= ratioUncertainty
        ? OptionalInt.of((int) nearest)
        : OptionalInt.empty();
  }

  /**
   * @param lineHertz rate of the line
   * @param lineExpanded its uncertainty at k = 2
   */
  static Explanation of(
      double lineHertz, double lineExpanded, List<ExpectedRate> rates, Running running) {
    double line = lineExpanded / lineHertz;
    Double tape = running.tapeMmPerS();
    double diameter =
        tape == null ? Double.NaN : tape * running.speedFactor() / (Math.PI * lineHertz);
    boolean sensible = diameter >= SMALLEST_MM && diameter <= LARGEST_MM;
    double speed = running.deviationLimitPercent() / 100;
    Optional<ExpectedRate> known = best(rates);
    double rate = known.map(r -> lineHertz / r.rate().hertz()).orElse(Double.NaN);
    return new Explanation(
        sensible ? diameter : null,
        sensible ? diameter * Math.hypot(line, speed) : null,
        known.map(r -> r.part().name()).orElse(null),
        known.isPresent() ? rate : null,
        known.map(r -> rate * Math.hypot(line, 2 * Math.sqrt(r.rate().variance()))).orElse(null));
  }

  /** The part with the least uncertain own rate, the first of equals. */
  private static Optional<ExpectedRate> best(List<ExpectedRate> rates) {
    ExpectedRate best = null;
    for (ExpectedRate rate : rates) {
      boolean own = rate.cause() == Cause.TURN && rate.harmonic() == 1 && !rate.rate().isRange();
      if (own && (best == null || rate.rate().variance() < best.rate().variance())) {
        best = rate;
      }
    }
    return Optional.ofNullable(best);
  }
}
