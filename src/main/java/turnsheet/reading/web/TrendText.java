package turnsheet.reading.web;

import java.time.Instant;
import turnsheet.core.measure.FigureName;
import turnsheet.core.stats.TrendLine;
import turnsheet.reading.Outlook;
import turnsheet.reading.Trend;
import turnsheet.shop.ServiceLimit;
import turnsheet.web.Numbers;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Says in a sentence what a trend is, or why none is shown. */
final class TrendText {

  private final Wording words;
  private final Times times;

  TrendText(Wording words, Times times) {
    this.words = words;
    this.times = times;
  }

  String sentence(FigureHistory history) {
    Trend trend = history.trend();
    if (trend instanceof Trend.Shown shown) {
      return shown(shown, history);
    }
    if (trend instanceof Trend.Unshown unshown) {
      return words.text(
          "history.trend.unshown",
          rate(unshown.line(), history.figure(), Numbers.Sign.SHOWN),
          Integer.toString(unshown.visits()));
    }
    return trend instanceof Trend.TooShort
        ? words.text("history.trend.tooShort")
        : words.text("history.trend.tooFew", Integer.toString(trend.visits()));
  }

  /** For a table: the rate, or that there is none. */
  String brief(FigureHistory history) {
    return history.trend() instanceof Trend.Shown shown
        ? rate(shown.line(), history.figure(), Numbers.Sign.SHOWN)
        : words.text("history.trend.none");
  }

  private String shown(Trend.Shown trend, FigureHistory history) {
    String way = trend.line().slope() < 0 ? "falls." : "rises.";
    String rate = rate(trend.line(), history.figure(), Numbers.Sign.PLAIN);
    String visits = Integer.toString(trend.visits());
    String since = month(trend.first());
    ServiceLimit limit = history.limit();
    String bound = limit == null ? "" : words.limit(history.figure(), limit.upperBound());
    Outlook outlook = trend.outlook();
    if (outlook instanceof Outlook.Meets meets) {
      Instant latest = meets.latest();
      return latest == null
          ? words.text(
              "history.trend." + way + "meetsFrom",
              visits,
              since,
              rate,
              bound,
              month(meets.at()),
              month(meets.earliest()),
              month(meets.horizon()))
          : words.text(
              "history.trend." + way + "meets",
              visits,
              since,
              rate,
              bound,
              month(meets.at()),
              month(meets.earliest()),
              month(latest));
    }
    if (outlook instanceof Outlook.Beyond beyond) {
      return words.text(
          "history.trend." + way + "beyond", visits, since, rate, bound, month(beyond.horizon()));
    }
    String word =
        outlook instanceof Outlook.Unlimited
            ? "unlimited"
            : outlook instanceof Outlook.Away ? "away" : "reached";
    return words.text("history.trend." + way + word, visits, since, rate, bound);
  }

  private String rate(TrendLine line, FigureName figure, Numbers.Sign sign) {
    double slope = sign == Numbers.Sign.PLAIN ? Math.abs(line.slope()) : line.slope();
    return words.numbers().show(slope, line.slopeHalfWidth(), figure.unit(), sign).text();
  }

  /** A day would claim more than a line can tell. */
  private String month(Instant at) {
    return times.month(at);
  }
}
