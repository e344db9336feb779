package turnsheet.report;

import java.util.List;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.FigureName;

/** A condition without a partner of the same speed setting and kind. */
public record SheetSingle(String setting, CaptureKind kind, SheetSide side, List<Entry> figures) {

  public SheetSingle {
    figures = List.copyOf(figures);
  }

  /** One figure. */
  public record Entry(FigureName name, StatedFigure stated) {}
}
