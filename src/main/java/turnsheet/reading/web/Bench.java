package turnsheet.reading.web;

import java.util.List;
import java.util.Map;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.Verdict;
import turnsheet.reading.CaptureResult;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Sorts what is on the bench by what it needs. */
final class Bench {
  private final List<VisitSummary> stays;
  private final Map<VisitId, List<CaptureResult>> byVisit;
  private final Standing standing;
  private final Wording words;
  private final Times times;

  Bench(
      List<VisitSummary> stays,
      Map<VisitId, List<CaptureResult>> byVisit,
      Standing standing,
      Wording words,
      Times times) {
    this.stays = stays;
    this.byVisit = byVisit;
    this.standing = standing;
    this.words = words;
    this.times = times;
  }

  List<BenchPage.Recording> recordings(CaptureState... states) {
    return stays.stream()
        .flatMap(
            stay ->
                captures(stay).stream()
                    .filter(c -> List.of(states).contains(c.state()))
                    .map(c -> recording(stay, c)))
        .toList();
  }

  List<BenchPage.Stay> stays(Need need) {
    return stays.stream().filter(s -> need.has(this, captures(s))).map(this::stay).toList();
  }

  /** The last capture of some speed setting breaks a limit. */
  boolean isOutside(List<CaptureResult> captures) {
    return Standing.latest(captures).stream().anyMatch(c -> standing.worst(c) == Verdict.OUTSIDE);
  }

  /** Last measured after the work at every speed setting, nothing outside, nothing on its way. */
  boolean isReady(List<CaptureResult> captures) {
    return !isOutside(captures)
        && captures.stream()
            .noneMatch(
                c -> c.state() == CaptureState.RECOGNISED || c.state() == CaptureState.QUEUED)
        && !Standing.latest(captures).isEmpty()
        && Standing.latest(captures).stream()
            .noneMatch(c -> c.condition().equals(CaptureKey.AS_RECEIVED));
  }

  private List<CaptureResult> captures(VisitSummary stay) {
    return byVisit.getOrDefault(stay.visit().id(), List.of());
  }

  private BenchPage.Recording recording(VisitSummary stay, CaptureResult capture) {
    return new BenchPage.Recording(
        stay.visit().id().toString(),
        nameOf(stay),
        capture.settingLabel(),
        capture.condition(),
        ResultItem.of(capture, standing, words));
  }

  private BenchPage.Stay stay(VisitSummary stay) {
    List<CaptureResult> captures = captures(stay);
    return new BenchPage.Stay(
        stay.visit().id().toString(),
        stay.visit().unitId().toString(),
        nameOf(stay),
        stay.customerName(),
        times.day(stay.visit().openedAt()),
        stay.visit().complaint(),
        captures.size(),
        Standing.latest(captures).stream()
            .map(
                c ->
                    new BenchPage.Latest(
                        c.settingLabel(), c.condition(), ResultItem.of(c, standing, words)))
            .toList());
  }

  private static String nameOf(VisitSummary stay) {
    return stay.modelName() + " " + stay.serialNumber();
  }

  /** A question to the captures of one visit. */
  interface Need {
    boolean has(Bench bench, List<CaptureResult> captures);
  }
}
