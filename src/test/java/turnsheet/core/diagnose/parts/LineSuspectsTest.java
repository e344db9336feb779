package turnsheet.core.diagnose.parts;

import static java.util.Objects.requireNonNull;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

class LineSuspectsTest {

  private static final MachinePart MOTOR =
      MachinePart.of("motor", PartKind.MOTOR, new Drive.Supply(2, 0, 0));

  private static LineFinding finding(Running running, double line, MachinePart... parts) {
    return findings(running, List.of(parts), line).get(0);
  }

  private static List<LineFinding> findings(
      Running running, List<MachinePart> parts, double... rates) {
    List<Reading.Line> lines = new ArrayList<>();
    for (double rate : rates) {
      lines.add(new Reading.Line(Figure.of(rate, 0.01), Figure.of(0.1, 0.01), List.of()));
    }
    return new LineSuspects(RateTable.of(parts, running), running, 60).of(lines);
  }

  private static Running tape(double deviationPercent) {
    return new Running(190.5, null, deviationPercent, 0.01, 50, 0.02);
  }

  private static MachinePart roller(String name, double millimetres) {
    return MachinePart.of(name, PartKind.ROLLER, new Drive.Rim(millimetres));
  }

  private static double turns(double millimetres) {
    return 190.5 / (Math.PI * millimetres);
  }

  @Test
  void saysTheMismatchAndHowLargeItMayBe() {
    LineFinding found = finding(tape(0), turns(30) + 0.01, roller("roller", 30));
    assertThat(found.suspects().get(0).mismatchHz()).isCloseTo(0.01, within(1e-9));
    // 1.5 / 60 s, 1 % of the diameter, 0.01 % of the speed
    assertThat(found.suspects().get(0).toleranceHz())
        .isCloseTo(0.025 + 0.0101 * turns(30), within(1e-9));
    assertThat(found.firstProbability()).isGreaterThan(0.95).isLessThan(1);
    assertThat(found.unknownProbability() + found.firstProbability()).isCloseTo(1, within(1e-9));
    assertThat(found.ambiguous()).isFalse();
    assertThat(found.advice()).isEqualTo(Advice.ROLLER);
  }

  @Test
  void twoRollersOfNearlyOneSizeAreNotToldApart() {
    LineFinding found =
        finding(tape(0), turns(30), roller("left", 30), roller("right", 30.1), roller("far", 34));
    assertThat(found.ambiguous()).isTrue();
    assertThat(found.suspects().get(0).part()).isEqualTo("left");
    assertThat(found.rivals()).containsExactly("right");
  }

  /** Twice the rate of a roller of 60 mm is the rate of one of 30 mm. */
  @Test
  void aHarmonicGainsWhereThePartsOwnLineIsThere() {
    List<MachinePart> parts = List.of(roller("large", 60), roller("small", 30));
    double alone = findings(tape(0), parts, turns(30)).get(0).firstProbability();
    LineFinding beside = findings(tape(0), parts, turns(30), turns(60)).get(0);
    assertThat(beside.firstProbability()).isLessThan(alone);
    assertThat(findings(tape(0), parts, turns(30)).get(0).suspects().get(0).part())
        .isEqualTo("small");
    assertThat(beside.rivals()).hasSize(1);
  }

  /** The motor stands at 25 Hz while the unit, and a capstan of 25 Hz with it, is 2 % fast. */
  @Test
  void tellsTheMainsFromTheShaftWhereTheUnitIsOffSpeed() {
    MachinePart capstan =
        new MachinePart(
            "capstan", PartKind.CAPSTAN, new Drive.Rim(190.5 / Math.PI / 25), null, 0.2);
    LineFinding still = finding(tape(2), 25, MOTOR, capstan);
    assertThat(still.lock()).isEqualTo(LockVerdict.MAINS);
    assertThat(still.suspects().get(0).part()).isEqualTo("motor");
    LineFinding moved = finding(tape(2), 25.5, MOTOR, capstan);
    assertThat(moved.lock()).isEqualTo(LockVerdict.SHAFT);
    assertThat(moved.suspects().get(0).part()).isEqualTo("capstan");
    LineFinding either = finding(tape(0), 25, MOTOR, capstan);
    assertThat(either.lock()).isEqualTo(LockVerdict.UNDECIDED);
    assertThat(either.ambiguous()).isTrue();
  }

  @Test
  void humInTheSignalIsNoPartOfTheMachine() {
    LineFinding found = finding(tape(1), 100.01, roller("roller", 30));
    assertThat(found.suspects().get(0).expected().cause()).isEqualTo(Cause.HUM);
    assertThat(found.lock()).isEqualTo(LockVerdict.MAINS);
    assertThat(found.advice()).isEqualTo(Advice.HUM);
  }

  @Test
  void anUnnamedLineSaysWhichDiameterOrRatioWouldExplainIt() {
    LineFinding found = finding(tape(1), 1.01 * turns(12.3), roller("roller", 30), MOTOR);
    assertThat(found.suspects()).isEmpty();
    Explanation explanation = requireNonNull(found.explanation());
    assertThat(explanation.diameterMm()).isCloseTo(12.3, within(1e-6));
    // 0.01 Hz of 4.98 Hz and 0.01 % of the speed
    assertThat(explanation.diameterUncertaintyMm()).isCloseTo(12.3 * 0.00201, within(1e-4));
    // the motor on the mains is known best
    assertThat(explanation.reference()).isEqualTo("motor");
    assertThat(explanation.ratio()).isCloseTo(1.01 * turns(12.3) / 25, within(1e-9));
    assertThat(explanation.wholeNumber()).isEmpty();
    assertThat(found.advice()).isEqualTo(Advice.UNNAMED);
    assertThat(found.lock()).isEqualTo(LockVerdict.NEITHER);
  }

  @Test
  void aWholeNumberOfTurnsIsToldWhereTheRatioIsFineEnough() {
    Running turning = new Running(null, 0.75, 0, 0.01, 50, 0.02);
    MachinePart platter = MachinePart.of("platter", PartKind.PLATTER, new Drive.Geared(1, null));
    LineFinding found = finding(turning, 0.75 * 48, platter);
    Explanation explanation = requireNonNull(found.explanation());
    assertThat(explanation.diameterMm()).isNull();
    assertThat(explanation.wholeNumber()).hasValue(48);
    LineFinding between = finding(turning, 0.75 * 48.3, platter);
    assertThat(requireNonNull(between.explanation()).wholeNumber()).isEmpty();
  }

  /** A reel can be anywhere in its range: a part of a sharp rate in there is more probable. */
  @Test
  void aReelIsNamedInItsRangeButAfterASharpRateInIt() {
    MachinePart reel =
        MachinePart.of("reel", PartKind.REEL, new Drive.Pack(260, 90, Drive.Winding.GIVES));
    assertThat(finding(tape(0), 0.5, reel).suspects().get(0).part()).isEqualTo("reel");
    LineFinding found = finding(tape(0), turns(120), reel, roller("roller", 120));
    assertThat(found.suspects()).extracting(RankedSuspect::part).contains("roller", "reel");
    assertThat(found.suspects().get(0).part()).isEqualTo("roller");
  }
}
