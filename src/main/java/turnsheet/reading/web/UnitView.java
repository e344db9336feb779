package turnsheet.reading.web;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.Intake;
import turnsheet.capture.PlatePhotos;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.CaptureResults;
import turnsheet.reading.Population;
import turnsheet.reading.Populations;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ShopRules;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.UnitId;
import turnsheet.shop.UnitSummary;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.web.Crumb;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Gathers what the page of a unit shows. */
@Component
class UnitView {

  private final Units units;
  private final Visits visits;
  private final MachineModels models;
  private final CaptureResults results;
  private final PlatePhotos photos;
  private final ShopRules rules;
  private final Populations populations;
  private final MessageSource messages;
  private final Times times;

  UnitView(
      Units units,
      Visits visits,
      MachineModels models,
      CaptureResults results,
      PlatePhotos photos,
      ShopRules rules,
      Populations populations,
      MessageSource messages,
      Times times) {
    this.units = units;
    this.visits = visits;
    this.models = models;
    this.results = results;
    this.photos = photos;
    this.rules = rules;
    this.populations = populations;
    this.messages = messages;
    this.times = times;
  }

  /**
   * The page with the chart that was asked for.
   *
   * @param settingId chosen speed setting; null or unknown for the one measured most often
   * @param path chosen figure; null or unknown for one that has a limit, else two-sigma
   */
  Optional<UnitPage> find(
      UnitId id, @Nullable String settingId, @Nullable String path, Locale locale) {
    return units
        .summary(id)
        .map(unit -> page(unit, settingId, path, new Wording(messages, locale)));
  }

  private UnitPage page(
      UnitSummary summary, @Nullable String settingId, @Nullable String path, Wording words) {
    UnitId id = summary.unit().id();
    MachineModel model = models.find(summary.unit().modelId()).orElseThrow();
    List<CaptureResult> all = results.ofUnit(id);
    List<Visit> stays = visits.ofUnit(id);
    Standing standing = new Standing(VisitView.limits(List.of(model)), rules.get().rule());
    UnitHistory history = new UnitHistory(model, all, stays, standing, words, times);
    SpeedSetting setting = history.chosenSetting(settingId);
    List<Population> typical = setting == null ? List.of() : populations.ofSetting(setting.id());
    return new UnitPage(
        id.toString(),
        List.of(new Crumb(words.text("reading.trail.units"), "/units")),
        summary.modelName() + " " + summary.unit().serialNumber(),
        summary.unit().modelId().toString(),
        summary.modelName(),
        summary.unit().serialNumber(),
        summary.unit().code().grouped(),
        summary.unit().customerId().toString(),
        summary.customerName(),
        summary.unit().note(),
        stays.stream().filter(Visit::isOpen).map(v -> v.id().toString()).findFirst().orElse(null),
        stays.stream()
            .filter(Visit::isOpen)
            .map(Intake::usualCondition)
            .findFirst()
            .orElse(CaptureKey.AS_RECEIVED),
        photos.latestOf(id).map(p -> p.visit().toString()).orElse(null),
        visitRows(stays, all, standing, words),
        history.page(setting, path, typical));
  }

  private List<UnitPage.VisitRow> visitRows(
      List<Visit> stays, List<CaptureResult> all, Standing standing, Wording words) {
    Map<VisitId, List<CaptureResult>> byVisit =
        all.stream().collect(Collectors.groupingBy(CaptureResult::visitId));
    return stays.stream()
        .map(
            visit ->
                new UnitPage.VisitRow(
                    visit.id().toString(),
                    times.day(visit.openedAt()),
                    visit.closedAt() == null ? "" : times.day(visit.closedAt()),
                    visit.complaint(),
                    visit.workDone(),
                    Standing.latest(byVisit.getOrDefault(visit.id(), List.of())).stream()
                        .map(
                            r ->
                                new BenchPage.Latest(
                                    r.settingLabel(),
                                    r.condition(),
                                    ResultItem.of(r, standing, words)))
                        .toList()))
        .toList();
  }
}
