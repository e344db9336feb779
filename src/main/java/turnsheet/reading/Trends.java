package turnsheet.reading;

import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.stats.TrendLine;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.VisitId;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/**
 * Draws a line through the last reading of each visit: how the unit left, or how it stands while it
 * is here. Earlier readings of a visit show what was put right, not how the unit ages.
 */
public final class Trends {

  /** A year of the Julian calendar. */
  public static final double SECONDS_PER_YEAR = 365.25 * 86_400;

  /** Nothing is said about what lies further ahead, however long the readings go back. */
  private static final double FURTHEST_YEARS = 10;

  private static final double LEAST_YEARS = 1;

  private Trends() {}

  /**
   * The readings that a line runs through.
   *
   * @param shown captures of one speed setting that have the figure, in the order of their arrival
   */
  public static List<CaptureResult> lastOfEachVisit(List<CaptureResult> shown) {
    Map<VisitId, CaptureResult> last = new LinkedHashMap<>();
    for (CaptureResult result : shown) {
      last.remove(result.visitId());
      last.put(result.visitId(), result);
    }
    return new ArrayList<>(last.values());
  }

  /**
   * What they say.
   *
   * @param shown as for {@link #lastOfEachVisit}
   */
  public static Trend of(List<CaptureResult> shown, FigureName name, @Nullable ServiceLimit limit) {
    List<CaptureResult> last = lastOfEachVisit(shown);
    int visits = last.size();
    if (visits < Trend.LEAST_VISITS) {
      return new Trend.TooFew(visits);
    }
    Instant first = last.get(0).receivedAt();
    double[] years = last.stream().mapToDouble(r -> years(first, r.receivedAt())).toArray();
    double reach = years[visits - 1];
    if (reach < LEAST_YEARS) {
      return new Trend.TooShort(visits);
    }
    TrendLine line =
        TrendLine.of(
            years,
            last.stream().mapToDouble(r -> value(r.figure(name))).toArray(),
            last.stream().mapToDouble(r -> standardUncertainty(r.figure(name))).toArray());
    return line.isSignificant()
        ? new Trend.Shown(
            visits,
            line,
            first,
            last.get(visits - 1).receivedAt(),
            outlook(line, first, reach, name, limit))
        : new Trend.Unshown(visits, line);
  }

  /** A time on the axis of the line. */
  public static double years(Instant first, Instant at) {
    return (at.toEpochMilli() - first.toEpochMilli()) / 1000.0 / SECONDS_PER_YEAR;
  }

  /** As far ahead as the readings go back, and never more than ten years. */
  private static Outlook outlook(
      TrendLine line, Instant first, double reach, FigureName name, @Nullable ServiceLimit limit) {
    if (limit == null) {
      return new Outlook.Unlimited();
    }
    double bound = limit.upperBound();
    if (Math.abs(line.at(reach)) >= bound) {
      return new Outlook.Reached();
    }
    boolean falls = line.slope() < 0;
    if (falls && Wording.signOf(name) == Numbers.Sign.PLAIN) {
      return new Outlook.Away();
    }
    double horizon = reach + Math.min(reach, FURTHEST_YEARS);
    TrendLine.Crossing crossing = line.crossing(falls ? -bound : bound).orElseThrow();
    if (crossing.at() > horizon) {
      return new Outlook.Beyond(instant(first, horizon));
    }
    return new Outlook.Meets(
        instant(first, crossing.at()),
        instant(first, crossing.from()),
        crossing.to() > horizon ? null : instant(first, crossing.to()),
        instant(first, horizon));
  }

  private static Instant instant(Instant first, double years) {
    return first.plusSeconds(Math.round(years * SECONDS_PER_YEAR));
  }

  private static double value(Figure figure) {
    Double value = figure.value();
    if (value == null) {
      throw new IllegalArgumentException("a capture without the figure");
    }
    return value;
  }

  /** 0 where it is not stated; the line is then drawn without weights. */
  private static double standardUncertainty(Figure figure) {
    Double expanded = figure.expandedUncertainty();
    Double k = figure.k();
    return expanded == null || k == null ? 0 : expanded / k;
  }
}
