package turnsheet.reading.web;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.CaptureResults;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ServiceLimit;
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
  private final ShopRules rules;
  private final MessageSource messages;
  private final Times times;

  UnitView(
      Units units,
      Visits visits,
      MachineModels models,
      CaptureResults results,
      ShopRules rules,
      MessageSource messages,
      Times times) {
    this.units = units;
    this.visits = visits;
    this.models = models;
    this.results = results;
    this.rules = rules;
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
    SpeedSetting setting = chosenSetting(model, all, settingId);
    FigureName figure = chosenFigure(model, setting, path);
    History history = new History(words, times, standing);
    List<CaptureResult> shown =
        setting == null ? List.of() : History.with(all, setting.id(), figure);
    ServiceLimit limit = limit(model, setting, figure);
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
        visitRows(stays, all, standing, words),
        settingChoices(model, setting),
        figureChoices(all, figure, words),
        shown.isEmpty() || setting == null
            ? null
            : history.draw(shown, figure, limit, setting.label()),
        History.conditions(shown),
        history.points(shown, figure),
        limit == null
            ? ""
            : words.text(
                "reading.unit.limit", words.limit(figure, limit.upperBound()), limit.origin()));
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

  private static @Nullable SpeedSetting chosenSetting(
      MachineModel model, List<CaptureResult> all, @Nullable String settingId) {
    List<SpeedSetting> settings = model.settings();
    Optional<SpeedSetting> asked =
        settings.stream().filter(s -> s.id().toString().equals(settingId)).findFirst();
    // of equals the first on the selector
    Optional<SpeedSetting> measured =
        settings.stream().reduce((a, b) -> measured(all, b) > measured(all, a) ? b : a);
    return asked.or(() -> measured).orElse(null);
  }

  private static FigureName chosenFigure(
      MachineModel model, @Nullable SpeedSetting setting, @Nullable String path) {
    Optional<FigureName> asked = path == null ? Optional.empty() : FigureName.ofPath(path);
    return asked
        .or(
            () ->
                setting == null
                    ? Optional.empty()
                    : model.limitsAt(setting.id()).stream()
                        .map(ServiceLimit::figure)
                        .filter(f -> f != FigureName.DEVIATION)
                        .findFirst())
        .orElse(FigureName.WEIGHTED_TWO_SIGMA);
  }

  private static @Nullable ServiceLimit limit(
      MachineModel model, @Nullable SpeedSetting setting, FigureName figure) {
    return setting == null
        ? null
        : model.limitsAt(setting.id()).stream()
            .filter(l -> l.figure() == figure)
            .findFirst()
            .orElse(null);
  }

  private static long measured(List<CaptureResult> all, SpeedSetting at) {
    return all.stream().filter(r -> r.readingId() != null && r.settingId().equals(at.id())).count();
  }

  private static List<UnitPage.Choice> settingChoices(
      MachineModel model, @Nullable SpeedSetting chosen) {
    return model.settings().stream()
        .map(s -> new UnitPage.Choice(s.id().toString(), s.label(), s.equals(chosen)))
        .toList();
  }

  private static List<UnitPage.Choice> figureChoices(
      List<CaptureResult> all, FigureName chosen, Wording words) {
    return Arrays.stream(FigureName.values())
        .filter(f -> f == chosen || all.stream().anyMatch(r -> r.figures().containsKey(f)))
        .map(f -> new UnitPage.Choice(f.path(), words.nameOf(f), f == chosen))
        .toList();
  }
}
