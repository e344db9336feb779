package turnsheet.reading.chart;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;

/**
 * What one direction of a drawing stands for.
 *
 * @param name of the quantity, for people
 * @param unit its symbol; empty for a plain number
 * @param from value at the left or bottom edge
 * @param to value at the right or top edge
 * @param logarithmic whether equal ratios take equal room
 */
public record Axis(String name, String unit, double from, double to, boolean logarithmic) {

  private static final double[] STEPS = {1, 2, 5, 10};

  public Axis {
    if (!(from < to) || !Double.isFinite(from) || !Double.isFinite(to)) {
      throw new IllegalArgumentException(name + " from " + from + " to " + to);
    }
    if (logarithmic && !(from > 0)) {
      throw new IllegalArgumentException(name + " from " + from + " on a logarithmic axis");
    }
  }

  public static Axis linear(String name, String unit, double from, double to) {
    return new Axis(name, unit, from, to, false);
  }

  public static Axis logarithmic(String name, String unit, double from, double to) {
    return new Axis(name, unit, from, to, true);
  }

  /**
   * A linear axis with a little air about the values; NaN is passed over.
   *
   * <p>Values that are all alike get a tenth of themselves, or 1, on either side.
   */
  public static Axis around(String name, String unit, double... values) {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    for (double value : values) {
      if (Double.isFinite(value)) {
        lowest = Math.min(lowest, value);
        highest = Math.max(highest, value);
      }
    }
    if (lowest > highest) {
      return linear(name, unit, 0, 1);
    }
    double air = 0.08 * (highest - lowest);
    if (air == 0) {
      air = lowest == 0 ? 1 : Math.abs(lowest) / 10;
    }
    return linear(name, unit, lowest - air, highest + air);
  }

  /** Where on the axis a value lies: 0 at {@code from}, 1 at {@code to}. */
  public double share(double value) {
    return logarithmic
        ? Math.log(value / from) / Math.log(to / from)
        : (value - from) / (to - from);
  }

  public boolean holds(double value) {
    return value >= from && value <= to;
  }

  /** Name and unit as they stand beside the axis. */
  public String title() {
    return unit.isEmpty() ? name : name + ", " + unit;
  }

  /** Round values for marks, in rising order, about as many as asked for. */
  public List<Tick> ticks(int about) {
    return logarithmic ? decadeTicks() : evenTicks(about);
  }

  private List<Tick> evenTicks(int about) {
    double rough = (to - from) / about;
    double decade = Math.pow(10, Math.floor(Math.log10(rough)));
    double step = 10 * decade;
    for (double candidate : STEPS) {
      if (candidate * decade >= rough * 0.999) {
        step = candidate * decade;
        break;
      }
    }
    int decimals = Math.max(0, (int) -Math.floor(Math.log10(step) + 1e-9));
    List<Tick> ticks = new ArrayList<>();
    for (long k = (long) Math.ceil(from / step - 1e-9); k * step <= to + 1e-9 * step; k++) {
      ticks.add(new Tick(k * step, text(k * step, decimals)));
    }
    return ticks;
  }

  private List<Tick> decadeTicks() {
    boolean crowded = to / from > 2000;
    List<Tick> ticks = new ArrayList<>();
    for (int power = (int) Math.floor(Math.log10(from)); Math.pow(10, power) <= to; power++) {
      for (int digit : crowded ? new int[] {1} : new int[] {1, 2, 5}) {
        double value = digit * Math.pow(10, power);
        if (value >= from * (1 - 1e-9) && value <= to * (1 + 1e-9)) {
          ticks.add(new Tick(value, text(value, Math.max(0, -power))));
        }
      }
    }
    return ticks;
  }

  private static String text(double value, int decimals) {
    BigDecimal rounded = BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_EVEN);
    return rounded.signum() == 0 ? "0" : rounded.toPlainString().replace('-', '\u2212');
  }

  /** A mark on the axis and what is written beside it. */
  public record Tick(double value, String text) {}
}
