package turnsheet.evidence.web;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The section of the sensor wheel, texts already formatted.
 *
 * @param answer the sentence that answers
 * @param notes what must be known beside it
 * @param askTeeth whether the page asks for the pulses per turn
 * @param statedTeeth what was stated; empty where nothing was
 * @param flutterColumns heads of the table of flutter
 * @param damage sentences, one for each tooth that stands out
 */
record WheelPage(
    String captureId,
    String answer,
    List<String> notes,
    boolean askTeeth,
    String statedTeeth,
    @Nullable Picture picture,
    String scale,
    List<String> flutterColumns,
    List<Row> flutter,
    List<Row> harmonics,
    List<String> damage,
    boolean damageJudged) {

  WheelPage {
    notes = List.copyOf(notes);
    flutterColumns = List.copyOf(flutterColumns);
    flutter = List.copyOf(flutter);
    harmonics = List.copyOf(harmonics);
    damage = List.copyOf(damage);
  }

  /** One row of a table. */
  record Row(String name, List<String> cells) {
    Row {
      cells = List.copyOf(cells);
    }
  }
}
