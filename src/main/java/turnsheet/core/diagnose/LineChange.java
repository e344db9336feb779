package turnsheet.core.diagnose;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

/**
 * A line of the spectrum before and after.
 *
 * @param rateHz rate after the repair, or before where it went
 * @param before peak in percent; null for a new line
 * @param after peak in percent; null for one that went, or fell below what can be found
 * @param part most probable suspect; null where no part comes near
 */
public record LineChange(
    double rateHz, @Nullable Figure before, @Nullable Figure after, @Nullable String part) {

  // half the width of the main lobe of the finder's window: closer lines are one
  private static final double RESOLUTION_BINS = 2;

  /** What became of the line. */
  public enum Fate {
    STAYED,
    WENT,
    CAME
  }

  public Fate fate() {
    return before == null ? Fate.CAME : after == null ? Fate.WENT : Fate.STAYED;
  }

  /**
   * Pairs lines of equal rate, each with the nearest, strongest first.
   *
   * <p>Two rates are equal where they differ by no more than both their uncertainties and the
   * resolution of the shorter capture. A unit whose mean speed was set right moves all its lines:
   * rates before are brought to the speed after.
   *
   * @param speedRatio mean speed after over mean speed before
   * @param shorterSeconds length of the shorter capture
   */
  public static List<LineChange> of(
      List<Reading.Line> before,
      List<Reading.Line> after,
      double speedRatio,
      double shorterSeconds) {
    List<Reading.Line> left = new ArrayList<>(before);
    List<LineChange> changes = new ArrayList<>();
    for (Reading.Line line : after) {
      Reading.Line partner = nearest(left, line, speedRatio, shorterSeconds);
      left.remove(partner);
      changes.add(
          new LineChange(
              rate(line),
              partner == null ? null : partner.peakPercent(),
              line.peakPercent(),
              part(line)));
    }
    for (Reading.Line gone : left) {
      changes.add(new LineChange(rate(gone), gone.peakPercent(), null, part(gone)));
    }
    return changes;
  }

  private static Reading.@Nullable Line nearest(
      List<Reading.Line> lines, Reading.Line line, double speedRatio, double seconds) {
    Reading.Line nearest = null;
    double least = Double.POSITIVE_INFINITY;
    for (Reading.Line candidate : lines) {
      double distance = Math.abs(rate(candidate) * speedRatio - rate(line));
      double allowed =
          RESOLUTION_BINS / seconds + uncertainty(candidate.rateHz()) + uncertainty(line.rateHz());
      if (distance <= allowed && distance < least) {
        nearest = candidate;
        least = distance;
      }
    }
    return nearest;
  }

  private static double rate(Reading.Line line) {
    Double value = line.rateHz().value();
    return value == null ? Double.NaN : value;
  }

  private static double uncertainty(Figure figure) {
    Double expanded = figure.expandedUncertainty();
    return expanded == null ? 0 : expanded;
  }

  private static @Nullable String part(Reading.Line line) {
    return line.suspects().isEmpty() ? null : line.suspects().get(0).part();
  }
}
