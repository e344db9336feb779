package turnsheet.report;

import java.time.Clock;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Service;
import turnsheet.access.ShopProfiles;
import turnsheet.access.ShopProfiles.ShopProfile;
import turnsheet.capture.CaptureKey;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.measure.CaptureKind;
import turnsheet.reading.Judged;
import turnsheet.reading.Readings;
import turnsheet.reading.VisitReading;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.ShopRules;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.shop.Visits;

/** Puts the sheet of a visit together. */
@Service
public class Sheets {

  private final Visits visits;
  private final MachineModels models;
  private final Readings readings;
  private final ShopProfiles profiles;
  private final ShopRules rules;
  private final Clock clock;

  Sheets(
      Visits visits,
      MachineModels models,
      Readings readings,
      ShopProfiles profiles,
      ShopRules rules,
      Clock clock) {
    this.visits = visits;
    this.models = models;
    this.readings = readings;
    this.profiles = profiles;
    this.rules = rules;
    this.clock = clock;
  }

  /** The sheet of a visit as things stand; empty where there is no such visit. */
  public Optional<Sheet> of(VisitId id) {
    return visits.summary(id).map(this::sheet);
  }

  private Sheet sheet(VisitSummary visit) {
    MachineModel model = models.find(visit.modelId()).orElseThrow();
    List<VisitReading> all = readings.ofVisit(visit.visit().id());
    List<SheetPair> pairs = new ArrayList<>();
    List<SheetSingle> singles = new ArrayList<>();
    for (SpeedSetting setting : model.settings()) {
      List<ServiceLimit> limits = model.limitsAt(setting.id());
      for (CaptureKind kind : CaptureKind.values()) {
        List<VisitReading> here =
            all.stream()
                .filter(r -> r.settingId().equals(setting.id()) && kind(r) == kind)
                .toList();
        VisitReading before = newest(here, CaptureKey.AS_RECEIVED);
        VisitReading after = newest(here, CaptureKey.AFTER_REPAIR);
        if (before != null && after != null) {
          pairs.add(SheetPair.of(setting, limits, rules.get().rule(), before, after));
        }
        here.stream()
            .filter(r -> before == null || after == null || isFreeLabel(r))
            .map(r -> single(setting, limits, rules.get().rule(), r))
            .forEach(singles::add);
      }
    }
    ShopProfile shop = profiles.get().orElse(new ShopProfile("", ""));
    return new Sheet(shop, visit, clock.instant(), pairs, singles);
  }

  private static SheetSingle single(
      SpeedSetting setting, List<ServiceLimit> limits, DecisionRule rule, VisitReading reading) {
    return new SheetSingle(
        setting, reading, Judged.all(limits, name -> name.of(reading.stored().reading()), rule));
  }

  private static boolean isFreeLabel(VisitReading reading) {
    return !reading.condition().equals(CaptureKey.AS_RECEIVED)
        && !reading.condition().equals(CaptureKey.AFTER_REPAIR);
  }

  private static CaptureKind kind(VisitReading reading) {
    return reading.stored().reading().source().kind();
  }

  private static @Nullable VisitReading newest(List<VisitReading> readings, String condition) {
    return readings.stream()
        .filter(r -> r.condition().equals(condition))
        .max(Comparator.comparing(VisitReading::receivedAt))
        .orElse(null);
  }
}
