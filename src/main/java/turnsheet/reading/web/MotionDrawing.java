package turnsheet.reading.web;

import java.util.List;
import turnsheet.core.diagnose.motion.MovingLine;
import turnsheet.core.diagnose.motion.RateMap;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.Cells;
import turnsheet.reading.chart.SvgChart;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** Draws the map of rate over time. */
final class MotionDrawing {

  private static final int HEIGHT = 360;

  /** Each step of darkness is that much more. */
  private static final double STEP = 3;

  /** Noise exceeds three times its median once in 500 cells (Rayleigh: 2^-9). */
  private static final double OVER_MIDDLE = 3;

  private final Wording words;

  MotionDrawing(Wording words) {
    this.words = words;
  }

  String map(RateMap map, List<MovingLine> moving) {
    Axis x =
        Axis.linear(
            words.text("reading.chart.time"), "s", map.seconds(0), map.seconds(map.columns()));
    Axis y =
        Axis.logarithmic(words.text("motion.map.rate"), "Hz", map.hertz(0), map.hertz(map.rows()));
    SvgChart chart =
        new SvgChart(
                x,
                y,
                HEIGHT,
                words.text("motion.map.title"),
                words.text("motion.map.more", words.numbers().fixed(x.to() - x.from(), 0)))
            .decimalSign(words.numbers().decimalSign());
    double[] middle = new double[map.rows()];
    for (int r = 0; r < middle.length; r++) {
      middle[r] = map.middlePercent(r);
    }
    chart.mark(
        Cells.of(
            map.columns(),
            map.rows(),
            map::seconds,
            map::hertz,
            (c, r) -> level(map.peakPercent(c, r), middle[r], map.largestPercent())));
    for (MovingLine line : moving) {
      MovingLine.Place last = line.track().get(line.track().size() - 1);
      if (y.holds(last.hertz())) {
        chart.flag(
            Math.min(last.seconds(), x.to()),
            last.hertz(),
            words.text("motion.how." + line.motion().name().toLowerCase(java.util.Locale.ROOT)));
      }
    }
    return chart.toSvg();
  }

  private static int level(double peak, double middle, double largest) {
    if (!(peak > OVER_MIDDLE * middle) || largest == 0) {
      return 0;
    }
    int steps = (int) Math.floor(Math.log(largest / peak) / Math.log(STEP));
    return Math.max(1, Cells.LEVELS - steps);
  }

  /** What darkness means and over which time each column looks. */
  String explained(RateMap map) {
    Numbers numbers = words.numbers();
    return words.text(
        "motion.map.explained",
        numbers.show(map.largestPercent(), null, "%", Numbers.Sign.PLAIN).valueAndUnit(),
        numbers.fixed(map.windowSeconds(), 1));
  }
}
