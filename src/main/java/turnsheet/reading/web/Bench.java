package turnsheet.reading.web;

import java.time.Instant;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.Verdict;
import turnsheet.reading.CaptureResult;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Sorts what is on the bench by what it needs. */
final class Bench {
  private final List<VisitSummary> all;
  private final List<VisitSummary> stays;
  private final Map<VisitId, List<CaptureResult>> byVisit;
  private final Standing standing;
  private final Wording words;
  private final Times times;

  /**
   * @param all the open visits, and those that were closed since what {@link #measuredSince} asks
   */
  Bench(
      List<VisitSummary> all,
      Map<VisitId, List<CaptureResult>> byVisit,
      Standing standing,
      Wording words,
      Times times) {
    this.all = all;
    this.stays = all.stream().filter(stay -> stay.visit().isOpen()).toList();
    this.byVisit = byVisit;
    this.standing = standing;
    this.words = words;
    this.times = times;
  }

  /** How many visits are open. */
  int open() {
    return stays.size();
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

  /** The visits whose next step is one of these. */
  List<BenchPage.Stay> stays(NextStep... steps) {
    return stays.stream().filter(s -> List.of(steps).contains(next(s))).map(this::stay).toList();
  }

  /** The visits where the last capture of some speed setting breaks a limit. */
  List<BenchPage.Stay> outside() {
    return stays.stream().filter(s -> isOutside(captures(s))).map(this::stay).toList();
  }

  /** What was measured since an instant, the last first; also where the unit has left since. */
  List<BenchPage.Recording> measuredSince(Instant start) {
    return all.stream()
        .flatMap(stay -> captures(stay).stream().map(c -> new Measured(stay, c)))
        .filter(m -> !m.at().isBefore(start))
        .sorted(Comparator.comparing(Measured::at).reversed())
        .map(m -> recording(m.stay(), m.capture()))
        .toList();
  }

  private record Measured(VisitSummary stay, CaptureResult capture) {
    Instant at() {
      Instant measured = capture.measuredAt();
      return measured == null ? Instant.MIN : measured;
    }
  }

  private NextStep next(VisitSummary stay) {
    return NextStep.of(stay, captures(stay), standing);
  }

  private boolean isOutside(List<CaptureResult> captures) {
    return Standing.latest(captures).stream().anyMatch(c -> standing.worst(c) == Verdict.OUTSIDE);
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
        words.text("reading.next." + next(stay).word()),
        next(stay).hrefOn(stay),
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
}
