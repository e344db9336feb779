package turnsheet.core.measure;

import java.util.Arrays;
import java.util.Optional;
import java.util.function.Function;

/** The figures of a {@link Reading} that can be limited, compared and followed over time. */
public enum FigureName {
  DEVIATION("speed.deviationPercent", "%", r -> r.speed().deviationPercent()),
  DRIFT("speed.driftPercentPerMinute", "%/min", r -> r.speed().driftPercentPerMinute()),
  WEIGHTED_TWO_SIGMA(
      "flutter.weightedTwoSigmaPercent", "%", r -> r.flutter().weightedTwoSigmaPercent()),
  WEIGHTED_QUASI_PEAK(
      "flutter.weightedQuasiPeakPercent", "%", r -> r.flutter().weightedQuasiPeakPercent()),
  WEIGHTED_RMS("flutter.weightedRmsPercent", "%", r -> r.flutter().weightedRmsPercent()),
  UNWEIGHTED_RMS("flutter.unweightedRmsPercent", "%", r -> r.flutter().unweightedRmsPercent()),
  PERIOD_STD_DEV(
      "edges.periodStdDevMicroseconds",
      "µs",
      r -> edges(r, Reading.Edges::periodStdDevMicroseconds)),
  CYCLE_TO_CYCLE(
      "edges.cycleToCycleMicroseconds",
      "µs",
      r -> edges(r, Reading.Edges::cycleToCycleMicroseconds));

  private final String path;
  private final String unit;

  @SuppressWarnings("ImmutableEnumChecker") // the lambdas above hold no state
  private final Function<Reading, Figure> figure;

  FigureName(String path, String unit, Function<Reading, Figure> figure) {
    this.path = path;
    this.unit = unit;
    this.figure = figure;
  }

  /** Where the figure stands in the result contract; also its name in the database. */
  public String path() {
    return path;
  }

  public String unit() {
    return unit;
  }

  /** The figure of a reading; absent with a reason where this kind of capture has none. */
  public Figure of(Reading reading) {
    return figure.apply(reading);
  }

  /** The figure that stands at a path of the contract. */
  public static Optional<FigureName> ofPath(String path) {
    return Arrays.stream(values()).filter(f -> f.path.equals(path)).findFirst();
  }

  private static Figure edges(Reading reading, Function<Reading.Edges, Figure> figure) {
    Reading.Edges edges = reading.edges();
    return edges == null ? Figure.absent("a tone has no edges") : figure.apply(edges);
  }
}
