package turnsheet.report;

import java.util.List;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.LineChange;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.FigureName;

/**
 * Before against after at one speed setting, from captures of one kind.
 *
 * @param setting its label
 * @param before as received
 * @param after after the repair
 * @param figures those that at least one side has, in the order of the result contract
 * @param cautions what makes the two less comparable than they look
 * @param lines of the newest captures: which stayed, went and came
 */
public record SheetPair(
    String setting,
    CaptureKind kind,
    SheetSide before,
    SheetSide after,
    List<Comparison> figures,
    List<Caution> cautions,
    List<LineChange> lines) {

  public SheetPair {
    figures = List.copyOf(figures);
    cautions = List.copyOf(cautions);
    lines = List.copyOf(lines);
  }

  /**
   * One figure on both sides.
   *
   * @param difference after minus before
   */
  public record Comparison(
      FigureName name, StatedFigure before, StatedFigure after, Difference difference) {}

  /** What makes a pair less comparable than it looks. */
  public enum Caution {
    /** captures differ in length by more than a factor of two */
    LENGTH,
    /** figures were made by different method versions */
    METHOD,
    /** recorded by different bench instruments, or it is not known by which */
    INSTRUMENT,
    /** played from different tapes or records, or it is not known from which */
    MEDIUM,
    /** the tone was only replayed on one side, recorded and replayed on the other, or not known */
    TONE_METHOD,
    /** measured with other expectations, such as another tone */
    SETTINGS
  }
}
