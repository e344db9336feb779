package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.VisitId;

class TrendsTest {

  private static final Instant FIRST = Instant.parse("2016-01-01T12:00:00Z");
  private static final SpeedSettingId SETTING = SpeedSettingId.next();
  private static final FigureName FLUTTER = FigureName.WEIGHTED_TWO_SIGMA;

  /** 0.03 % and 0.004 % more each year, with U = 0.002: the limit of 0.08 % is met in year 12.5. */
  private static final double[] RISING = {0.03, 0.038, 0.046, 0.054, 0.062};

  private final List<CaptureResult> captures = new ArrayList<>();

  @Test
  void aStraightLineMeetsItsLimitWhereTheArithmeticSays() {
    everyOtherYear(FLUTTER, RISING);
    Trend.Shown trend = shown(FLUTTER, limit(FLUTTER, 0.08));

    assertThat(trend.visits()).isEqualTo(5);
    assertThat(trend.line().slope()).isCloseTo(0.004, within(1e-12));
    // by hand: u = 0.001 and Sxx = 40, both sides 1.96 standard uncertainties
    assertThat(trend.line().slopeHalfWidth())
        .isCloseTo(1.95996 * 0.001 / Math.sqrt(40), within(1e-8));
    Outlook.Meets meets = (Outlook.Meets) trend.outlook();
    assertThat(years(meets.at())).isCloseTo(12.5, within(1e-6));
    // by hand: (0.004 d - 0.034)^2 = 1.95996^2 * 1e-6 (1/5 + d^2/40), d from year 4
    assertThat(years(meets.earliest())).isCloseTo(11.8533, within(0.001));
    Instant latest = Objects.requireNonNull(meets.latest());
    assertThat(years(latest)).isCloseTo(13.2493, within(0.001));
  }

  @Test
  void aLimitFurtherAheadThanTheReadingsGoBackHasNoDate() {
    everyOtherYear(FLUTTER, RISING);
    // met in year 17.5; the readings cover 8 years, so the horizon is year 16
    assertThat(shown(FLUTTER, limit(FLUTTER, 0.1)).outlook())
        .isInstanceOfSatisfying(
            Outlook.Beyond.class, b -> assertThat(years(b.horizon())).isCloseTo(16, within(1e-6)));
    // met in year 15.5, the latest date after year 16
    assertThat(shown(FLUTTER, limit(FLUTTER, 0.092)).outlook())
        .isInstanceOfSatisfying(Outlook.Meets.class, m -> assertThat(m.latest()).isNull());
    assertThat(shown(FLUTTER, limit(FLUTTER, 0.06)).outlook()).isInstanceOf(Outlook.Reached.class);
    assertThat(shown(FLUTTER, null).outlook()).isInstanceOf(Outlook.Unlimited.class);
  }

  @Test
  void readingsOverThirtyYearsLookAheadTenAtMost() {
    for (int i = 0; i < 4; i++) {
      add(VisitId.next(), 10.0 * i, FLUTTER, Figure.of(0.02 + 0.01 * i, 0.002));
    }
    // 0.001 % a year from 0.05 % in year 30: 0.065 % is met in year 45
    assertThat(shown(FLUTTER, limit(FLUTTER, 0.065)).outlook())
        .isInstanceOfSatisfying(
            Outlook.Beyond.class, b -> assertThat(years(b.horizon())).isCloseTo(40, within(1e-6)));
  }

  @Test
  void whatFallsLeadsAwayUnlessItCanBeNegative() {
    double[] falling = {0.062, 0.054, 0.046, 0.038, 0.03};
    everyOtherYear(FLUTTER, falling);
    assertThat(shown(FLUTTER, limit(FLUTTER, 0.08)).outlook()).isInstanceOf(Outlook.Away.class);
    captures.clear();
    everyOtherYear(FigureName.DEVIATION, new double[] {0, -0.08, -0.16, -0.24, -0.32});
    // 0.04 points a year down from 0: -0.4 in year 10
    assertThat(shown(FigureName.DEVIATION, limit(FigureName.DEVIATION, 0.4)).outlook())
        .isInstanceOfSatisfying(
            Outlook.Meets.class, m -> assertThat(years(m.at())).isCloseTo(10, within(1e-6)));
  }

  @Test
  void threeVisitsShowNoTrendHoweverStraight() {
    everyOtherYear(FLUTTER, new double[] {0.03, 0.04, 0.05});
    assertThat(Trends.of(captures, FLUTTER, null)).isEqualTo(new Trend.TooFew(3));
  }

  @Test
  void fourVisitsWithinAYearShowNoTrend() {
    for (int i = 0; i < 4; i++) {
      add(VisitId.next(), 0.3 * i, FLUTTER, Figure.of(0.03 + 0.01 * i, 0.002));
    }
    assertThat(Trends.of(captures, FLUTTER, null)).isEqualTo(new Trend.TooShort(4));
  }

  @Test
  void aSlopeWithinTheScatterIsNotShown() {
    everyOtherYear(FLUTTER, new double[] {0.05, 0.03, 0.055, 0.035, 0.052});
    assertThat(Trends.of(captures, FLUTTER, null)).isInstanceOf(Trend.Unshown.class);
  }

  /** As received 0.1 % each time, after repair as ever: what was put right does not count. */
  @Test
  void onlyTheLastReadingOfAVisitCounts() {
    for (int i = 0; i < RISING.length; i++) {
      VisitId visit = VisitId.next();
      add(visit, 2.0 * i, FLUTTER, Figure.of(0.1, 0.02));
      add(visit, 2.0 * i + 0.01, FLUTTER, Figure.of(RISING[i], 0.002));
    }
    assertThat(Trends.lastOfEachVisit(captures)).hasSize(5);
    assertThat(shown(FLUTTER, null).line().slope()).isCloseTo(0.004, within(1e-12));
  }

  @Test
  void withoutStatedUncertaintiesTheScatterAloneDecides() {
    double[] rising = {0.03, 0.0381, 0.0459, 0.0541, 0.0619};
    for (int i = 0; i < rising.length; i++) {
      add(VisitId.next(), 2.0 * i, FLUTTER, Figure.withoutUncertainty(rising[i], "short"));
    }
    Trend.Shown trend = shown(FLUTTER, null);
    assertThat(trend.line().slope()).isCloseTo(0.00399, within(1e-9));
    assertThat(trend.line().commonVariance()).isZero();
  }

  private Trend.Shown shown(FigureName name, @Nullable ServiceLimit limit) {
    Trend trend = Trends.of(captures, name, limit);
    assertThat(trend).isInstanceOf(Trend.Shown.class);
    return (Trend.Shown) trend;
  }

  private void everyOtherYear(FigureName name, double[] values) {
    for (int i = 0; i < values.length; i++) {
      add(VisitId.next(), 2.0 * i, name, Figure.of(values[i], 0.002));
    }
  }

  private void add(VisitId visit, double years, FigureName name, Figure figure) {
    Instant at = FIRST.plus(Duration.ofSeconds(Math.round(years * Trends.SECONDS_PER_YEAR)));
    captures.add(
        new CaptureResult(
            CaptureId.next(),
            visit,
            SETTING,
            "19 cm/s",
            "as received",
            "tone.wav",
            at,
            CaptureState.MEASURED,
            null,
            null,
            null,
            0,
            ReadingId.next(),
            at,
            Map.of(name, figure)));
  }

  private static ServiceLimit limit(FigureName name, double bound) {
    return new ServiceLimit(SETTING, name, bound, "rule of the shop");
  }

  private static double years(Instant at) {
    return Trends.years(FIRST, at);
  }
}
