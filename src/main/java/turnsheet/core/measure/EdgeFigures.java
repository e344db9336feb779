package turnsheet.core.measure;

import org.jspecify.annotations.Nullable;
import turnsheet.core.stats.Budget;
import turnsheet.core.stats.Moments;
import turnsheet.core.stats.PeriodStatistics;
import turnsheet.core.stats.StabilityLadder;
import turnsheet.core.stats.WheelPattern;

/** The figures of single periods with their uncertainties. */
final class EdgeFigures {

  private final EdgeScan scan;
  private final MeasureSettings settings;
  private final EdgeNoise noise;
  private final double clock;

  EdgeFigures(EdgeScan scan, MeasureSettings settings, EdgeNoise noise) {
    this.scan = scan;
    this.settings = settings;
    this.noise = noise;
    this.clock = settings.clockStandardUncertaintyPpm() * 1e-6;
  }

  Reading.Edges edges() {
    PeriodStatistics periods = scan.periods;
    return new Reading.Edges(
        scan.rises(),
        scan.missing(),
        scan.extra(),
        meanPeriod(),
        spread(periods.periods()),
        cycleToCycle(periods),
        duty(),
        noise.microseconds(),
        wheel(),
        scan.stability.rungs().stream().map(this::stability).toList());
  }

  /** Of the stretch recorded: what the unit does at other times is not in its uncertainty. */
  private Figure meanPeriod() {
    double mean = scan.periods.meanSeconds() * 1e6;
    double ends = mean * Math.sqrt(2) / scan.periods.spanSeconds();
    return Figure.of(
        mean,
        Budget.empty()
            .plus(Causes.CLOCK, mean * clock)
            .plus("noise of the first and last edge", ends * noise.beyondGridSeconds())
            .plus("step of the timer", ends * noise.gridSeconds()));
  }

  private Figure spread(Moments periods) {
    if (periods.count() < 2) {
      return Figure.absent("fewer than two periods needed no repair");
    }
    // each end of a period lies somewhere in its step
    return scattered(periods.sampleStdDev(), scan.spread.relativeUncertainty(), 2);
  }

  private Figure cycleToCycle(PeriodStatistics periods) {
    double value = periods.cycleToCycleSeconds();
    return Double.isNaN(value)
        ? Figure.absent("no two periods follow each other without a repair")
        : scattered(value, scan.steps.relativeUncertainty(), 6); // the edge between counts twice
  }

  /**
   * A scatter of the edges.
   *
   * @param gridParts how many times the variance of one step of the timer is in its square
   */
  private Figure scattered(double seconds, double relative, int gridParts) {
    double value = seconds * 1e6;
    double grid = gridParts * noise.gridSeconds() * noise.gridSeconds();
    double without = Math.sqrt(Math.max(0, seconds * seconds - grid)) * 1e6;
    return Double.isNaN(relative)
        ? Figure.withoutUncertainty(value, "the recording is too short to tell how it varies")
        : Figure.of(
            value,
            Budget.empty()
                .plus(Causes.LENGTH, relative * value)
                .plus(Causes.CLOCK, clock * value)
                .plusRectangular("step of the timer", value - without));
  }

  /** Scatter of the mean, and how far the crossing level may be off where it is unknown. */
  private @Nullable Figure duty() {
    Moments high = scan.highShare;
    if (high.count() < 2) {
      return null;
    }
    return Figure.of(
        100 * high.mean(),
        Budget.empty()
            .plus(
                "scatter of the mean",
                100 * high.sampleStdDev() / Math.sqrt((double) high.count())));
  }

  private Reading.@Nullable Wheel wheel() {
    Integer teeth = settings.teeth();
    if (teeth == null) {
      return null;
    }
    WheelPattern wheel = scan.wheel;
    Figure pattern =
        wheel == null || !wheel.known()
            ? Figure.absent("fewer than four whole turns without a repair, or a single tooth")
            : Figure.of(
                100 * wheel.rmsPeriods(),
                Budget.empty().plus("scatter of the turns", 100 * wheel.rmsUncertaintyPeriods()));
    return new Reading.Wheel(teeth, pattern);
  }

  /**
   * Relative standard uncertainty 1 / sqrt(2 n) for n terms that share no data: too careful where
   * terms overlap (NIST SP 1065 section 5.3).
   */
  private Reading.Stability stability(StabilityLadder.Rung rung) {
    double relative = 1 / Math.sqrt(2 * rung.independentTerms());
    return new Reading.Stability(
        rung.tauSeconds(),
        Figure.of(
            rung.deviation(), Budget.empty().plus(Causes.LENGTH, relative * rung.deviation())));
  }
}
