package turnsheet.shop;

import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/** What must be true of the settings, parts and limits of one model together. */
final class ModelRules {

  private ModelRules() {}

  static void check(
      List<SpeedSetting> settings, List<RotatingPart> parts, List<ServiceLimit> limits) {
    labelsAreSingle(settings);
    partsReferToParts(parts);
    limitsBoundEachFigureOnce(settings, limits);
  }

  private static void labelsAreSingle(List<SpeedSetting> settings) {
    Set<String> labels = new HashSet<>();
    for (SpeedSetting setting : settings) {
      if (!labels.add(setting.label())) {
        throw new RefusedChangeException("settingLabelTaken", setting.label());
      }
    }
  }

  private static void partsReferToParts(List<RotatingPart> parts) {
    Map<String, RotatingPart> named = new HashMap<>();
    for (RotatingPart part : parts) {
      if (named.put(part.name(), part) != null) {
        throw new RefusedChangeException("partNameTaken", part.name());
      }
    }
    for (RotatingPart part : parts) {
      String reference = part.referencePart();
      if (reference != null && !named.containsKey(reference)) {
        throw new RefusedChangeException("partUnknown", part.name(), reference);
      }
      refuseCircle(part, named);
    }
  }

  private static void refuseCircle(RotatingPart start, Map<String, RotatingPart> named) {
    Set<String> seen = new HashSet<>();
    @Nullable RotatingPart part = start;
    while (part != null) {
      if (!seen.add(part.name())) {
        throw new RefusedChangeException("partCircle", start.name());
      }
      String reference = part.referencePart();
      part = reference == null ? null : named.get(reference);
    }
  }

  private static void limitsBoundEachFigureOnce(
      List<SpeedSetting> settings, List<ServiceLimit> limits) {
    Map<SpeedSettingId, SpeedSetting> known = new HashMap<>();
    settings.forEach(s -> known.put(s.id(), s));
    Set<List<Object>> bounded = new HashSet<>();
    for (ServiceLimit limit : limits) {
      SpeedSetting setting = known.get(limit.settingId());
      if (setting == null) {
        throw new RefusedChangeException("limitSettingUnknown", limit.figure());
      }
      if (!bounded.add(List.of(limit.settingId(), limit.figure()))) {
        throw new RefusedChangeException("limitTaken", limit.figure(), setting.label());
      }
    }
  }
}
