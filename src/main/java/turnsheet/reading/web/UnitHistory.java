package turnsheet.reading.web;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.Judged;
import turnsheet.reading.Population;
import turnsheet.reading.Trend;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.Visit;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Makes the part of a unit's page that shows it over the years. */
final class UnitHistory {

  private final MachineModel model;
  private final List<CaptureResult> all;
  private final List<Visit> stays;
  private final Standing standing;
  private final Wording words;
  private final Times times;

  UnitHistory(
      MachineModel model,
      List<CaptureResult> all,
      List<Visit> stays,
      Standing standing,
      Wording words,
      Times times) {
    this.model = model;
    this.all = all;
    this.stays = stays;
    this.standing = standing;
    this.words = words;
    this.times = times;
  }

  /** The setting that was asked for, or the one measured most often; null where there is none. */
  @Nullable SpeedSetting chosenSetting(@Nullable String asked) {
    List<SpeedSetting> settings = model.settings();
    // of equals the first on the selector
    Optional<SpeedSetting> measured =
        settings.stream().reduce((a, b) -> measured(b) > measured(a) ? b : a);
    return settings.stream()
        .filter(s -> s.id().toString().equals(asked))
        .findFirst()
        .or(() -> measured)
        .orElse(null);
  }

  /** The part with the figure that was asked for, else one that has a limit, else two-sigma. */
  UnitPage.History page(
      @Nullable SpeedSetting setting, @Nullable String path, List<Population> typical) {
    FigureName figure = chosenFigure(setting, path);
    List<UnitPage.Choice> settings =
        model.settings().stream()
            .map(s -> new UnitPage.Choice(s.id().toString(), s.label(), s.equals(setting)))
            .toList();
    if (setting == null) {
      return UnitPage.History.empty(settings, figures(figure));
    }
    FigureHistory chosen = FigureHistory.of(all, model, setting.id(), figure, typical);
    TrendText trend = new TrendText(words, times);
    ServiceLimit limit = chosen.limit();
    return new UnitPage.History(
        settings,
        figures(figure),
        setting.id().toString(),
        setting.label(),
        words.nameOf(figure),
        chosen.shown().isEmpty() ? null : new History(words, stays).draw(chosen, setting.label()),
        chosen.conditions(),
        trend.sentence(chosen),
        chosen.trend() instanceof Trend.Shown,
        typical(chosen),
        limit == null
            ? ""
            : words.text(
                "reading.unit.limit", words.limit(figure, limit.upperBound()), limit.origin()),
        chosen.shown().stream().map(r -> point(r, figure)).toList(),
        overview(setting, figure, typical, trend));
  }

  private String typical(FigureHistory chosen) {
    Double newest = chosen.newest().map(r -> r.figure(chosen.figure()).value()).orElse(null);
    return newest == null || chosen.population().isEmpty()
        ? ""
        : new TypicalText(words).sentence(chosen.population().get(), newest);
  }

  private UnitPage.PointRow point(CaptureResult result, FigureName figure) {
    return new UnitPage.PointRow(
        times.day(result.receivedAt()),
        result.condition(),
        words.show(figure, result.figure(figure)),
        standing.judged(result).stream()
            .filter(j -> j.limit().figure() == figure)
            .map((Judged j) -> FigureRow.word(j.judgement().verdict()))
            .findFirst()
            .orElse(null),
        String.valueOf(result.readingId()));
  }

  private List<UnitPage.FigureLine> overview(
      SpeedSetting setting, FigureName chosen, List<Population> typical, TrendText trend) {
    TypicalText model = new TypicalText(words);
    return Arrays.stream(FigureName.values())
        .map(f -> FigureHistory.of(all, this.model, setting.id(), f, typical))
        .filter(h -> h.newest().isPresent())
        .map(
            h ->
                new UnitPage.FigureLine(
                    h.figure().path(),
                    words.nameOf(h.figure()),
                    h.figure() == chosen,
                    words.show(h.figure(), h.newest().orElseThrow().figure(h.figure())),
                    trend.brief(h),
                    h.population().map(p -> model.median(p).value()).orElse(""),
                    h.population().map(model::middleHalf).orElse(""),
                    h.population().map(p -> Integer.toString(p.units())).orElse("")))
        .toList();
  }

  private FigureName chosenFigure(@Nullable SpeedSetting setting, @Nullable String path) {
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

  private List<UnitPage.Choice> figures(FigureName chosen) {
    return Arrays.stream(FigureName.values())
        .filter(f -> f == chosen || all.stream().anyMatch(r -> r.figures().containsKey(f)))
        .map(f -> new UnitPage.Choice(f.path(), words.nameOf(f), f == chosen))
        .toList();
  }

  private long measured(SpeedSetting at) {
    return all.stream().filter(r -> r.readingId() != null && r.settingId().equals(at.id())).count();
  }
}
