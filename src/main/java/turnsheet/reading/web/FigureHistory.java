package turnsheet.reading.web;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.Population;
import turnsheet.reading.Populations;
import turnsheet.reading.Trend;
import turnsheet.reading.Trends;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;

/**
 * One figure of one unit at one speed setting over the years.
 *
 * @param shown the captures that have the figure, in the order of their arrival
 * @param population the newest of each unit of the model; empty where no unit has the figure
 */
record FigureHistory(
    FigureName figure,
    List<CaptureResult> shown,
    @Nullable ServiceLimit limit,
    Trend trend,
    Optional<Population> population) {

  /**
   * Picks it out.
   *
   * @param all captures of the unit in the order of their arrival
   * @param typical populations at that setting
   */
  static FigureHistory of(
      List<CaptureResult> all,
      MachineModel model,
      SpeedSettingId settingId,
      FigureName figure,
      List<Population> typical) {
    List<CaptureResult> shown =
        all.stream()
            .filter(r -> r.settingId().equals(settingId) && r.figures().containsKey(figure))
            .toList();
    ServiceLimit limit =
        model.limitsAt(settingId).stream()
            .filter(l -> l.figure() == figure)
            .findFirst()
            .orElse(null);
    return new FigureHistory(
        figure, shown, limit, Trends.of(shown, figure, limit), Populations.of(typical, figure));
  }

  /** Each has a mark of its own in the drawing. */
  List<String> conditions() {
    return shown.stream().map(CaptureResult::condition).distinct().toList();
  }

  Optional<CaptureResult> newest() {
    return shown.isEmpty() ? Optional.empty() : Optional.of(shown.get(shown.size() - 1));
  }
}
