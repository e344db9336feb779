package turnsheet.reading.web;

import java.time.Instant;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.stats.TrendLine;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.Outlook;
import turnsheet.reading.Population;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Trend;
import turnsheet.reading.Trends;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.UnitId;

/**
 * One figure of one unit over the years in JSON.
 *
 * @param unit symbol of all values
 * @param points in the order of the captures
 * @param limit null where there is none
 * @param population null where no unit of the model has the figure
 */
record HistoryDocument(
    UUID unitId,
    UUID speedSettingId,
    String figure,
    String unit,
    List<Point> points,
    @Nullable Limit limit,
    TrendEntry trend,
    @Nullable Typical population) {

  static HistoryDocument of(UnitId unit, SpeedSettingId setting, FigureHistory history) {
    ServiceLimit limit = history.limit();
    Set<CaptureResult> inTrend = new HashSet<>(Trends.lastOfEachVisit(history.shown()));
    return new HistoryDocument(
        unit.value(),
        setting.value(),
        history.figure().path(),
        history.figure().unit(),
        history.shown().stream()
            .map(r -> Point.of(r, r.figure(history.figure()), inTrend.contains(r)))
            .toList(),
        limit == null ? null : new Limit(limit.upperBound(), limit.origin()),
        TrendEntry.of(history.trend()),
        history.population().map(Typical::of).orElse(null));
  }

  /**
   * One reading.
   *
   * @param expandedUncertainty null where it cannot be stated
   * @param inTrend whether it is the last of its visit, through which the trend runs
   */
  record Point(
      Instant receivedAt,
      UUID visitId,
      UUID captureId,
      @Nullable UUID readingId,
      String condition,
      @Nullable Double value,
      @Nullable Double expandedUncertainty,
      boolean inTrend) {

    static Point of(CaptureResult result, Figure figure, boolean inTrend) {
      ReadingId reading = result.readingId();
      return new Point(
          result.receivedAt(),
          result.visitId().value(),
          result.captureId().value(),
          reading == null ? null : reading.value(),
          result.condition(),
          figure.value(),
          figure.expandedUncertainty(),
          inTrend);
    }
  }

  /** Bounds hold for the size of the figure. */
  record Limit(double upperBound, String origin) {}

  /**
   * The straight line through the last reading of each visit; intervals hold 95 of 100.
   *
   * @param shown whether the slope differs from none
   * @param why null where it is shown, else {@code tooFewVisits}, {@code tooShort} or {@code
   *     notSignificant}
   * @param perYear slope in the unit of the figure; null where no line was drawn
   * @param perYearHalfWidth of its interval
   * @param outlook null where no trend is shown, else {@code noLimit}, {@code away}, {@code
   *     reached}, {@code meets} or {@code beyond}
   * @param meetsAt when the line meets the limit, with {@code earliest} and {@code latest}
   * @param latest null also where it lies beyond the horizon
   * @param horizon nothing is told about what lies beyond
   */
  record TrendEntry(
      boolean shown,
      @Nullable String why,
      int visits,
      @Nullable Double perYear,
      @Nullable Double perYearHalfWidth,
      @Nullable String outlook,
      @Nullable Instant meetsAt,
      @Nullable Instant earliest,
      @Nullable Instant latest,
      @Nullable Instant horizon) {

    static TrendEntry of(Trend trend) {
      if (trend instanceof Trend.Shown shown) {
        return shown(shown);
      }
      if (trend instanceof Trend.Unshown unshown) {
        TrendLine line = unshown.line();
        return without("notSignificant", trend, line.slope(), line.slopeHalfWidth());
      }
      String why = trend instanceof Trend.TooFew ? "tooFewVisits" : "tooShort";
      return without(why, trend, null, null);
    }

    private static TrendEntry without(
        String why, Trend trend, @Nullable Double perYear, @Nullable Double halfWidth) {
      return new TrendEntry(
          false, why, trend.visits(), perYear, halfWidth, null, null, null, null, null);
    }

    private static TrendEntry shown(Trend.Shown trend) {
      Outlook outlook = trend.outlook();
      String word =
          outlook instanceof Outlook.Unlimited
              ? "noLimit"
              : outlook instanceof Outlook.Away
                  ? "away"
                  : outlook instanceof Outlook.Reached
                      ? "reached"
                      : outlook instanceof Outlook.Beyond ? "beyond" : "meets";
      Outlook.Meets meets = outlook instanceof Outlook.Meets m ? m : null;
      Instant horizon =
          outlook instanceof Outlook.Beyond beyond
              ? beyond.horizon()
              : meets == null ? null : meets.horizon();
      return new TrendEntry(
          true,
          null,
          trend.visits(),
          trend.line().slope(),
          trend.line().slopeHalfWidth(),
          word,
          meets == null ? null : meets.at(),
          meets == null ? null : meets.earliest(),
          meets == null ? null : meets.latest(),
          horizon);
    }
  }

  /**
   * The newest value of each unit of the model at this speed setting.
   *
   * @param lowerQuartile null for fewer than four units, as the upper one
   */
  record Typical(
      int units, double median, @Nullable Double lowerQuartile, @Nullable Double upperQuartile) {

    static Typical of(Population population) {
      return new Typical(
          population.units(),
          population.median(),
          population.hasQuartiles() ? population.lowerQuartile() : null,
          population.hasQuartiles() ? population.upperQuartile() : null);
    }
  }
}
