package turnsheet.evidence.web;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.wheel.Standing;
import turnsheet.core.diagnose.wheel.WheelFinding;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** What must be known beside the pattern of a wheel. */
final class WheelNotes {

  private final WheelFinding finding;
  private final Wording words;

  WheelNotes(WheelFinding finding, Wording words) {
    this.finding = finding;
    this.words = words;
  }

  List<String> all() {
    List<String> notes = new ArrayList<>();
    notes.add(number(finding.statedTeeth()));
    Integer repeats = finding.repeatsAfter();
    if (repeats != null) {
      notes.add(
          words.text(
              repeats > finding.places() ? "wheel.repeats.later" : "wheel.repeats.earlier",
              Integer.toString(repeats),
              places()));
    }
    notes.add(numbering());
    if (finding.lostEdges() + finding.extraEdges() > 0) {
      notes.add(
          words.text(
              finding.markMissing() > 0 ? "wheel.repaired" : "wheel.repaired.noMark",
              Long.toString(finding.lostEdges()),
              Long.toString(finding.extraEdges())));
    }
    if (finding.miscountedTurns() > 0) {
      notes.add(words.text("wheel.miscounted", Integer.toString(finding.miscountedTurns())));
    }
    if (finding.open()) {
      notes.add(words.text("wheel.open", percent(finding.speedRangePercent())));
    }
    if (finding.harmonics().stream().anyMatch(h -> h.standing() == Standing.WHEEL)) {
      notes.add(words.text("wheel.same", percent(finding.speedRangePercent())));
    }
    if (finding.harmonics().stream().anyMatch(h -> h.standing() == Standing.MOTION)) {
      notes.add(words.text("wheel.motion"));
    }
    return notes;
  }

  private String number(@Nullable Integer stated) {
    if (stated == null) {
      return finding.origin() == WheelFinding.Origin.MARK
          ? words.text("wheel.number.mark", places())
          : words.text("wheel.number.found", places());
    }
    String said = Integer.toString(stated);
    return switch (finding.origin()) {
      case STATED -> words.text("wheel.number.stated", places());
      case REPETITION -> words.text("wheel.number.other", places(), said);
      case MARK ->
          stated == finding.places() - finding.markMissing()
              ? words.text("wheel.number.teeth", places(), said)
              : words.text("wheel.number.markOther", places(), said);
    };
  }

  private String numbering() {
    return switch (finding.markMissing()) {
      case 0 -> words.text("wheel.numbering.first");
      case 1 -> words.text("wheel.numbering.one");
      default -> words.text("wheel.numbering.mark", Integer.toString(finding.markMissing()));
    };
  }

  private String places() {
    return Integer.toString(finding.places());
  }

  private String percent(double value) {
    return words.numbers().show(value, null, "%", Numbers.Sign.PLAIN).valueAndUnit();
  }
}
