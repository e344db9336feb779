package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.MagnitudeBlocks;

/**
 * What many pulses within less than a second tell: their periods, the step of the clock that
 * stamped them, the rate of the stretch. How the speed fluctuates is not in it.
 */
final class BriefReading {

  /** Periods tell their scatter to 2 % then; of fewer a mistake in the recording is likelier. */
  static final int FEWEST_EDGES = 2000;

  private static final String TOO_SHORT = "the recording is too short to tell how the speed varies";

  private BriefReading() {}

  static Reading.Speed speed(double rateHertz, MeasureSettings settings) {
    double nominal = settings.nominalHz();
    return new Reading.Speed(
        nominal,
        Figure.withoutUncertainty(rateHertz, TOO_SHORT),
        Figure.withoutUncertainty(100 * (rateHertz / nominal - 1), TOO_SHORT),
        Figure.absent(TOO_SHORT),
        Figure.absent(TOO_SHORT),
        Figure.absent(TOO_SHORT));
  }

  static Reading.Flutter flutter() {
    Figure none = Figure.absent(TOO_SHORT);
    return new Reading.Flutter(none, none, none, none, List.of());
  }

  static Figure floor() {
    return Figure.absent(TOO_SHORT);
  }

  /** No curves but the histogram. */
  static Series series(Series.Histogram histogram) {
    MagnitudeBlocks none = new MagnitudeBlocks(0, new int[0][0], new double[0]);
    return new Series(
        SpeedTrace.of(0, 1, new float[0]),
        new Series.Spectrum(1, new double[0]),
        histogram,
        new Series.Blocks(none, none),
        () -> Fluctuation.of(0, 1, new double[0]));
  }

  static List<Warning> and(List<Warning> others) {
    List<Warning> all = new ArrayList<>();
    all.add(
        new Warning(
            "periodsOnly",
            "Less than a second could be used: the pulses are measured one by one, and how the"
                + " speed fluctuates is told by none of them, so record 30 s or more for that."));
    all.addAll(others);
    return all;
  }
}
