package turnsheet.report;

import java.util.List;
import turnsheet.reading.Judged;
import turnsheet.reading.VisitReading;
import turnsheet.shop.SpeedSetting;

/** A reading without a partner of the same speed setting and kind. */
public record SheetSingle(SpeedSetting setting, VisitReading reading, List<Judged> judged) {

  public SheetSingle {
    judged = List.copyOf(judged);
  }
}
