package turnsheet.report;

import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Judgement;
import turnsheet.core.measure.Figure;

/**
 * A figure of one condition as the sheet states it.
 *
 * @param figure of the only capture, or the mean of all
 * @param spread standard deviation between captures, in the unit of the figure; null for one
 * @param worst value of the largest magnitude among captures; null for one
 * @param limit null where the figure has none, or no value to hold against it
 */
public record StatedFigure(
    Figure figure, @Nullable Double spread, @Nullable Double worst, @Nullable Limit limit) {

  /**
   * The bound that the figure was held against.
   *
   * @param upperBound of the magnitude, in the unit of the figure
   * @param origin where the bound comes from
   */
  public record Limit(double upperBound, String origin, Judgement judgement) {}
}
