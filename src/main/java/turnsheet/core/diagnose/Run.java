package turnsheet.core.diagnose;

import java.util.Set;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Causes;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Series;
import turnsheet.core.stats.BlockResampling;
import turnsheet.core.stats.Budget;
import turnsheet.core.stats.MagnitudeBlocks;

/**
 * One figure of one capture, as comparing sees it: without what both sides of the comparison have
 * in common.
 *
 * @param figure as it was measured
 * @param standardUncertainty of what the other side does not share, in the unit of the figure; NaN
 *     where the figure has no value or no uncertainty
 * @param degreesOfFreedom of it; infinite where it does not come from a few blocks
 * @param resampled whether the chance part comes from block resampling
 */
public record Run(
    Figure figure, double standardUncertainty, double degreesOfFreedom, boolean resampled) {

  private static final double SHARE = 0.95;

  /** Clock and medium are not quite the same on another day; how much, is our own estimate. */
  private static final double SHARED_LEFT = 0.1;

  /** What two captures can have in common. */
  public enum Common {
    /** recorded by the same bench instrument */
    CLOCK,
    /** played from the same test tape or record */
    MEDIUM
  }

  /**
   * A figure with the part of its uncertainty that a comparison must reckon with.
   *
   * <p>Of what both sides share a tenth is left, of the realisation of the weighting always.
   *
   * @param blocks of the capture; null where they were not kept
   * @param common to all captures compared
   */
  public static Run of(
      FigureName name, Figure figure, Series.@Nullable Blocks blocks, Set<Common> common) {
    Double value = figure.value();
    Double expanded = figure.expandedUncertainty();
    Double k = figure.k();
    if (value == null || expanded == null || k == null) {
      return new Run(figure, Double.NaN, Double.POSITIVE_INFINITY, false);
    }
    if (figure.budget().isEmpty()) {
      return new Run(figure, expanded / k, Double.POSITIVE_INFINITY, false);
    }
    double relative = blocks == null ? Double.NaN : relativeStandardError(name, blocks);
    boolean resampled = !Double.isNaN(relative);
    double squares = 0;
    for (Budget.Contribution c : figure.budget()) {
      double share =
          switch (c.cause()) {
            case Causes.WEIGHTING -> SHARED_LEFT;
            case Causes.CLOCK -> common.contains(Common.CLOCK) ? SHARED_LEFT : 1;
            case Causes.MEDIUM -> common.contains(Common.MEDIUM) ? SHARED_LEFT : 1;
            case Causes.LENGTH -> resampled ? 0 : 1;
            default -> 1;
          };
      squares += Math.pow(share * c.standardUncertainty(), 2);
    }
    if (blocks == null || !resampled) {
      return new Run(figure, Math.sqrt(squares), Double.POSITIVE_INFINITY, false);
    }
    double chance = relative * Math.abs(value);
    double all = squares + chance * chance;
    double freedom = blocks.fluctuation().size() - 1;
    return new Run(
        figure,
        Math.sqrt(all),
        chance > 0 ? freedom * Math.pow(all / (chance * chance), 2) : Double.POSITIVE_INFINITY,
        true);
  }

  /** NaN where the figure does not come from the weighted trace or the blocks are too few. */
  private static double relativeStandardError(FigureName name, Series.Blocks blocks) {
    MagnitudeBlocks fluctuation = blocks.fluctuation();
    MagnitudeBlocks indication = blocks.indication();
    int count = fluctuation.size();
    if (count < BlockResampling.FEWEST_BLOCKS) {
      return Double.NaN;
    }
    return switch (name) {
      case WEIGHTED_TWO_SIGMA ->
          BlockResampling.relativeStandardError(count, d -> fluctuation.quantile(SHARE, d));
      case WEIGHTED_QUASI_PEAK ->
          BlockResampling.relativeStandardError(count, d -> indication.quantile(SHARE, d));
      case WEIGHTED_RMS -> BlockResampling.relativeStandardError(count, fluctuation::rms);
      default -> Double.NaN;
    };
  }
}
