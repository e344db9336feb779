package turnsheet.reading.web;

import java.util.UUID;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.CaptureResults;
import turnsheet.reading.Populations;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.Unit;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Histories for programs. */
@RestController
class HistoryApi {

  private final Units units;
  private final MachineModels models;
  private final CaptureResults results;
  private final Populations populations;

  HistoryApi(Units units, MachineModels models, CaptureResults results, Populations populations) {
    this.units = units;
    this.models = models;
    this.results = results;
    this.populations = populations;
  }

  /**
   * One figure of one unit over the years, with its limit, its trend and what is typical.
   *
   * @param setting id of a speed setting of the unit's model
   * @param figure path in the result contract: {@code flutter.weightedTwoSigmaPercent}
   */
  @GetMapping("/api/v1/units/{id}/history")
  HistoryDocument history(
      @PathVariable UUID id, @RequestParam UUID setting, @RequestParam String figure) {
    FigureName name =
        FigureName.ofPath(figure)
            .orElseThrow(
                () ->
                    new RefusedRequestException(
                        "unknownFigure", "There is no figure " + figure + " to follow."));
    Unit unit = units.find(new UnitId(id)).orElseThrow(() -> new NotFoundException("unit"));
    MachineModel model = models.find(unit.modelId()).orElseThrow();
    SpeedSettingId settingId = new SpeedSettingId(setting);
    if (model.setting(settingId).isEmpty()) {
      throw new NotFoundException("speed setting");
    }
    return HistoryDocument.of(
        unit.id(),
        settingId,
        FigureHistory.of(
            results.ofUnit(unit.id()), model, settingId, name, populations.ofSetting(settingId)));
  }
}
