package turnsheet.reading.web;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.CaptureResults;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.Unit;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.Visits;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** A unit over the years for those who have no account: figures and days, nothing of the stays. */
@Component
public class HistorySheets {

  private final Units units;
  private final Visits visits;
  private final MachineModels models;
  private final CaptureResults results;
  private final MessageSource messages;
  private final Times times;

  HistorySheets(
      Units units,
      Visits visits,
      MachineModels models,
      CaptureResults results,
      MessageSource messages,
      Times times) {
    this.units = units;
    this.visits = visits;
    this.models = models;
    this.results = results;
    this.messages = messages;
    this.times = times;
  }

  /**
   * One figure at one speed setting.
   *
   * @param svg finished drawing
   * @param conditions in the order of the marks that stand for them
   */
  public record Drawing(
      String setting,
      String figure,
      String svg,
      List<String> conditions,
      String trend,
      List<Row> rows) {}

  /** One reading. */
  public record Row(String day, String condition, String shown) {}

  /**
   * Speed and fluctuation at every setting that was measured.
   *
   * @param until what was recorded later is left out
   */
  public List<Drawing> of(UnitId id, Instant until, Locale locale) {
    Wording words = new Wording(messages, locale);
    Unit unit = units.find(id).orElseThrow();
    MachineModel model = models.find(unit.modelId()).orElseThrow();
    List<CaptureResult> all =
        results.ofUnit(id).stream().filter(r -> !r.receivedAt().isAfter(until)).toList();
    List<Visit> stays =
        visits.ofUnit(id).stream().filter(v -> !v.openedAt().isAfter(until)).toList();
    List<Drawing> drawings = new ArrayList<>();
    for (SpeedSetting setting : model.settings()) {
      Stream.of(FigureName.DEVIATION, steady(model, setting))
          .map(f -> FigureHistory.of(all, model, setting.id(), f, List.of()))
          .filter(h -> !h.shown().isEmpty())
          .map(h -> drawing(h, setting, stays, words))
          .forEach(drawings::add);
    }
    return drawings;
  }

  private Drawing drawing(
      FigureHistory history, SpeedSetting setting, List<Visit> stays, Wording words) {
    return new Drawing(
        setting.label(),
        words.nameOf(history.figure()),
        new History(words, stays).draw(history, setting.label()),
        history.conditions(),
        new TrendText(words, times).sentence(history),
        history.shown().stream()
            .map(
                r ->
                    new Row(
                        times.day(r.receivedAt()),
                        r.condition(),
                        words.show(history.figure(), r.figure(history.figure())).text()))
            .toList());
  }

  private static FigureName steady(MachineModel model, SpeedSetting setting) {
    return model.limitsAt(setting.id()).stream()
        .map(ServiceLimit::figure)
        .filter(f -> f != FigureName.DEVIATION)
        .findFirst()
        .orElse(FigureName.WEIGHTED_TWO_SIGMA);
  }
}
