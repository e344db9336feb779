package turnsheet.reading.web;

import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.diagnose.Verdict;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.Judged;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;

/** How captures stand against the limits of their speed settings. */
final class Standing {

  private final Map<SpeedSettingId, List<ServiceLimit>> limits;
  private final DecisionRule rule;

  Standing(Map<SpeedSettingId, List<ServiceLimit>> limits, DecisionRule rule) {
    this.limits = limits;
    this.rule = rule;
  }

  List<Judged> judged(CaptureResult result) {
    return Judged.all(limits.getOrDefault(result.settingId(), List.of()), result::figure, rule);
  }

  /** The worst of all verdicts of a capture; null where nothing is limited. */
  @Nullable Verdict worst(CaptureResult result) {
    return worst(judged(result).stream().map(j -> j.judgement().verdict()).toList());
  }

  /** The last measured capture of each speed setting: how the machine runs now. */
  static Collection<CaptureResult> latest(List<CaptureResult> inOrderOfArrival) {
    Map<SpeedSettingId, CaptureResult> latest = new LinkedHashMap<>();
    inOrderOfArrival.stream()
        .filter(r -> r.state() == CaptureState.MEASURED)
        .forEach(r -> latest.put(r.settingId(), r));
    return latest.values();
  }

  private static @Nullable Verdict worst(List<Verdict> verdicts) {
    if (verdicts.contains(Verdict.OUTSIDE)) {
      return Verdict.OUTSIDE;
    }
    if (verdicts.contains(Verdict.UNDECIDED)) {
      return Verdict.UNDECIDED;
    }
    return verdicts.isEmpty() ? null : Verdict.WITHIN;
  }
}
