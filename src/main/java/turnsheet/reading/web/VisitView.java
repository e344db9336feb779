package turnsheet.reading.web;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Intake;
import turnsheet.capture.PlatePhotos;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.CaptureResults;
import turnsheet.shop.FittedPart;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.ShopRules;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.shop.Visits;
import turnsheet.web.Crumb;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Gathers what the page of a visit shows. */
@Component
class VisitView {

  private final Visits visits;
  private final MachineModels models;
  private final CaptureResults results;
  private final ShopRules rules;
  private final IncomingRows incoming;
  private final PlatePhotos photos;
  private final MessageSource messages;
  private final Times times;

  VisitView(
      Visits visits,
      MachineModels models,
      CaptureResults results,
      ShopRules rules,
      IncomingRows incoming,
      PlatePhotos photos,
      MessageSource messages,
      Times times) {
    this.visits = visits;
    this.models = models;
    this.results = results;
    this.rules = rules;
    this.incoming = incoming;
    this.photos = photos;
    this.messages = messages;
    this.times = times;
  }

  Optional<VisitPage> find(VisitId id, Locale locale) {
    return visits.summary(id).map(summary -> page(summary, new Wording(messages, locale)));
  }

  private VisitPage page(VisitSummary summary, Wording words) {
    Visit visit = summary.visit();
    MachineModel model = models.find(summary.modelId()).orElseThrow();
    List<CaptureResult> all = results.ofVisit(visit.id());
    List<String> conditions = conditions(all);
    Standing standing = new Standing(limits(List.of(model)), rules.get().rule());
    List<VisitPage.Row> rows =
        model.settings().stream().map(s -> row(s, conditions, all, standing, words)).toList();
    NextStep next = NextStep.of(summary, all, standing);
    String unitName = summary.modelName() + " " + summary.serialNumber();
    return new VisitPage(
        visit.id().toString(),
        List.of(new Crumb(unitName, "/units/" + visit.unitId())),
        visit.unitId().toString(),
        unitName,
        summary.customerId().toString(),
        summary.customerName(),
        summary.modelId().toString(),
        times.day(visit.openedAt()),
        visit.closedAt() == null ? "" : times.day(visit.closedAt()),
        visit.complaint(),
        visit.workDone(),
        visit.notes().parts().stream().map(FittedPart::toString).toList(),
        visit.notes().sensorReplaced() ? visit.notes().sensorNote() : null,
        conditions,
        rows,
        isMeasured(all),
        words.text("reading.next." + next.word()),
        next.hrefOn(summary),
        photos.of(visit.id()).isPresent(),
        Intake.usualCondition(visit),
        incoming.of(visit.id(), words));
  }

  static Map<SpeedSettingId, List<ServiceLimit>> limits(List<MachineModel> models) {
    return models.stream()
        .flatMap(model -> model.limits().stream())
        .collect(Collectors.groupingBy(ServiceLimit::settingId));
  }

  private static VisitPage.Row row(
      SpeedSetting setting,
      List<String> conditions,
      List<CaptureResult> all,
      Standing standing,
      Wording words) {
    return new VisitPage.Row(
        setting.id().toString(),
        setting.label(),
        conditions.stream()
            .map(
                condition ->
                    new VisitPage.Cell(
                        condition,
                        all.stream()
                            .filter(r -> r.settingId().equals(setting.id()))
                            .filter(r -> r.condition().equals(condition))
                            // what is not placed yet stands among the incoming
                            .filter(r -> r.fit() == null)
                            .map(r -> ResultItem.of(r, standing, words))
                            .toList()))
            .toList());
  }

  /** The two that every visit has, then others in the order of their first use. */
  private static List<String> conditions(List<CaptureResult> all) {
    Set<String> conditions = new LinkedHashSet<>();
    conditions.add(CaptureKey.AS_RECEIVED);
    conditions.add(CaptureKey.AFTER_REPAIR);
    all.forEach(result -> conditions.add(result.condition()));
    return List.copyOf(conditions);
  }

  private static boolean isMeasured(List<CaptureResult> all) {
    return all.stream().anyMatch(r -> r.state() == CaptureState.MEASURED);
  }
}
