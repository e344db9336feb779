package turnsheet.pair.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.evidence.web.Picture;
import turnsheet.web.Crumb;

/**
 * The sheet of two sensors, texts already formatted.
 *
 * @param underway null where nothing is being worked out
 * @param failed why the work was given up; null where it was not
 * @param refusal why the recordings cannot be compared; null where they can
 * @param answer which sensor is quieter and by how much
 * @param common what both show; empty where they were not recorded together
 * @param cautions what the figures cannot show
 * @param picture null where there are no spectra
 */
record PairSheetPage(
    String id,
    List<Crumb> trail,
    String title,
    String made,
    @Nullable Underway underway,
    @Nullable String failed,
    @Nullable String refusal,
    boolean together,
    String answer,
    String common,
    List<Row> rows,
    List<String> cautions,
    @Nullable Picture picture,
    List<Line> lines,
    List<Fact> facts,
    String loop,
    List<Fact> details,
    int openLinks) {

  /** Work that is under way. */
  record Underway(boolean running, double progress) {}

  /** One figure of both. */
  record Row(String name, String original, String replacement, String change) {}

  /** A rate at which the sensors differ. */
  record Line(String rate, String original, String replacement, String cause) {}

  /** Something said in two words. */
  record Fact(String name, String value) {}

  /** Whether there is a sheet to show. */
  public boolean finished() {
    return underway == null && failed == null && refusal == null && !answer.isEmpty();
  }
}
