package turnsheet.reading.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.ReadingId;
import turnsheet.shop.CustomerId;
import turnsheet.shop.FittedPart;
import turnsheet.shop.ModelId;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.UnitId;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitNotes;
import turnsheet.shop.VisitSummary;

class NextStepTest {

  private static final Instant DAY = Instant.parse("2026-03-02T09:30:00Z");
  private static final SpeedSettingId SLOW = SpeedSettingId.next();
  private static final SpeedSettingId FAST = SpeedSettingId.next();

  private final VisitSummary untouched = visit(VisitNotes.complaint("hums"), null);
  private final VisitSummary worked =
      visit(new VisitNotes("", "", List.of(new FittedPart("belt", 1)), false, ""), null);

  @Test
  void aVisitGoesThroughItsSteps() {
    CaptureResult before = measured(SLOW, "as received", 0.09);
    CaptureResult after = measured(SLOW, "after repair", 0.03);
    assertThat(step(untouched)).isEqualTo(NextStep.RECORD);
    assertThat(step(untouched, in(CaptureState.RECOGNISED))).isEqualTo(NextStep.CONFIRM);
    assertThat(step(untouched, in(CaptureState.QUEUED))).isEqualTo(NextStep.WAIT);
    assertThat(step(untouched, in(CaptureState.REFUSED))).isEqualTo(NextStep.RECORD);
    assertThat(step(untouched, before)).isEqualTo(NextStep.WORK);
    assertThat(step(worked, before)).isEqualTo(NextStep.AGAIN);
    assertThat(step(worked, before, after)).isEqualTo(NextStep.REPORT);
    assertThat(step(reported(DAY.minusSeconds(1)), before, after)).isEqualTo(NextStep.REVISE);
    assertThat(step(reported(DAY.plusSeconds(1)), before, after)).isEqualTo(NextStep.READY);
    assertThat(step(visit(worked.visit().notes(), DAY), before, after)).isEqualTo(NextStep.CLOSED);
  }

  @Test
  void everySettingIsMeasuredAgainBeforeTheUnitIsReady() {
    CaptureResult slow = measured(SLOW, "after repair", 0.03);
    CaptureResult fast = measured(FAST, "as received", 0.03);
    assertThat(step(worked, slow, fast)).isEqualTo(NextStep.AGAIN);
    assertThat(step(worked, fast, slow, measured(FAST, "after repair", 0.03)))
        .isEqualTo(NextStep.REPORT);
  }

  @Test
  void whatIsStillOutsideIsNotReady() {
    CaptureResult bad = measured(SLOW, "after repair", 0.09);
    assertThat(step(worked, bad)).isEqualTo(NextStep.OUTSIDE);
    assertThat(step(worked, bad, measured(SLOW, "after repair", 0.03))).isEqualTo(NextStep.REPORT);
  }

  @Test
  void eachStepButTheLastIsDoneSomewhere() {
    for (NextStep step : NextStep.values()) {
      assertThat(step.hrefOn(worked).isEmpty()).isEqualTo(step == NextStep.CLOSED);
    }
    assertThat(NextStep.READY.hrefOn(reported(DAY))).isEqualTo("/reports/7/links");
  }

  private static NextStep step(VisitSummary visit, CaptureResult... captures) {
    ServiceLimit limit =
        new ServiceLimit(SLOW, FigureName.WEIGHTED_TWO_SIGMA, 0.06, "invented manual");
    Standing standing = new Standing(Map.of(SLOW, List.of(limit)), DecisionRule.SIMPLE);
    return NextStep.of(visit, List.of(captures), standing);
  }

  private static VisitSummary visit(VisitNotes notes, @Nullable Instant closedAt) {
    return summary(new Visit(VisitId.next(), UnitId.next(), DAY, closedAt, notes), null);
  }

  private VisitSummary reported(Instant at) {
    return summary(worked.visit(), at);
  }

  private static VisitSummary summary(Visit visit, @Nullable Instant reportedAt) {
    return new VisitSummary(
        visit,
        "0042",
        ModelId.next(),
        "Invented transport",
        CustomerId.next(),
        "A. Customer",
        reportedAt == null ? null : 7L,
        reportedAt);
  }

  private static CaptureResult measured(SpeedSettingId setting, String condition, double flutter) {
    return capture(setting, condition, CaptureState.MEASURED, Figure.of(flutter, 0.001));
  }

  private static CaptureResult in(CaptureState state) {
    return capture(SLOW, "as received", state, null);
  }

  private static CaptureResult capture(
      SpeedSettingId setting, String condition, CaptureState state, @Nullable Figure flutter) {
    return new CaptureResult(
        CaptureId.next(),
        VisitId.next(),
        setting,
        "19 cm/s",
        condition,
        "tone.wav",
        DAY,
        state,
        null,
        null,
        null,
        0,
        flutter == null ? null : ReadingId.next(),
        flutter == null ? null : DAY,
        flutter == null ? Map.of() : Map.of(FigureName.WEIGHTED_TWO_SIGMA, flutter));
  }
}
