package turnsheet.report;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.springframework.stereotype.Service;
import turnsheet.access.ShopProfiles;
import turnsheet.access.ShopProfiles.ShopProfile;
import turnsheet.capture.CaptureKey;
import turnsheet.core.measure.CaptureKind;
import turnsheet.reading.Readings;
import turnsheet.reading.VisitReading;
import turnsheet.shop.Customers;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ShopRules;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.shop.Visits;

/** Puts the sheet of a visit together as things stand. */
@Service
public class Sheets {

  private final Visits visits;
  private final Customers customers;
  private final MachineModels models;
  private final Readings readings;
  private final ShopProfiles profiles;
  private final ShopRules rules;

  Sheets(
      Visits visits,
      Customers customers,
      MachineModels models,
      Readings readings,
      ShopProfiles profiles,
      ShopRules rules) {
    this.visits = visits;
    this.customers = customers;
    this.models = models;
    this.readings = readings;
    this.profiles = profiles;
    this.rules = rules;
  }

  /** The sheet of a visit; empty where there is no such visit. */
  public Optional<Sheet> of(VisitId id) {
    return visits.summary(id).map(this::sheet);
  }

  private Sheet sheet(VisitSummary visit) {
    MachineModel model = models.find(visit.modelId()).orElseThrow();
    ShopRules.Rules inForce = rules.get();
    List<VisitReading> measured = readings.ofVisit(visit.visit().id());
    List<VisitReading> all = measured.stream().filter(r -> r.leftOut() == null).toList();
    List<SheetPair> pairs = new ArrayList<>();
    List<SheetSingle> singles = new ArrayList<>();
    for (SpeedSetting setting : model.settings()) {
      for (CaptureKind kind : CaptureKind.values()) {
        Map<String, List<VisitReading>> conditions = conditions(all, setting, kind);
        Conditions here =
            new Conditions(
                setting.label(),
                kind,
                model.limitsAt(setting.id()),
                inForce,
                reading -> readings.blocks(reading).orElse(null),
                reading -> FrozenSpectrum.of(readings, reading.stored().id()));
        List<VisitReading> before = conditions.get(CaptureKey.AS_RECEIVED);
        List<VisitReading> after = conditions.get(CaptureKey.AFTER_REPAIR);
        if (before != null && after != null) {
          pairs.add(here.pair(before, after));
          conditions.remove(CaptureKey.AS_RECEIVED);
          conditions.remove(CaptureKey.AFTER_REPAIR);
        }
        conditions.values().forEach(runs -> singles.add(here.single(runs)));
      }
    }
    return new Sheet(
        letterhead(),
        item(visit),
        new Sheet.Terms(
            inForce.rule(), inForce.leastFlutterChangePercent(), inForce.leastSpeedChangePercent()),
        pairs,
        singles,
        leftOut(model, measured));
  }

  private static List<Sheet.LeftOut> leftOut(MachineModel model, List<VisitReading> measured) {
    List<Sheet.LeftOut> leftOut = new ArrayList<>();
    for (VisitReading r : measured) {
      if (r.leftOut() != null) {
        leftOut.add(
            new Sheet.LeftOut(
                model.setting(r.settingId()).map(SpeedSetting::label).orElse(""),
                r.condition(),
                r.fileName(),
                r.leftOut()));
      }
    }
    return leftOut;
  }

  /** The captures of each condition, oldest first. */
  private static Map<String, List<VisitReading>> conditions(
      List<VisitReading> all, SpeedSetting setting, CaptureKind kind) {
    return all.stream()
        .filter(r -> r.settingId().equals(setting.id()))
        .filter(r -> r.stored().reading().source().kind() == kind)
        .collect(
            Collectors.groupingBy(
                VisitReading::condition, LinkedHashMap::new, Collectors.toList()));
  }

  private Sheet.Letterhead letterhead() {
    ShopProfile shop = profiles.get().orElse(new ShopProfile("", ""));
    return new Sheet.Letterhead(shop.name(), shop.address(), profiles.logo().orElse(null));
  }

  private Sheet.Item item(VisitSummary summary) {
    Visit visit = summary.visit();
    return new Sheet.Item(
        summary.modelName(),
        summary.serialNumber(),
        summary.customerName(),
        customers.find(summary.customerId()).orElseThrow().contact(),
        visit.openedAt(),
        visit.closedAt(),
        visit.complaint(),
        visit.workDone(),
        visit.notes().parts(),
        visit.notes().sensorReplaced() ? visit.notes().sensorNote() : null);
  }
}
