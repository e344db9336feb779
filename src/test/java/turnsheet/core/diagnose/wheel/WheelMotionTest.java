package turnsheet.core.diagnose.wheel;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Objects;
import org.assertj.core.data.Percentage;
import org.junit.jupiter.api.Test;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WheelSynth;

/** A true speed variation once a turn beside a wheel that is off its middle. */
class WheelMotionTest {

  private static final double TURN_HERTZ = 400 / 60.0;
  private static final WheelSynth WHEEL = WheelSynth.uneven(60, 0.002, 4).eccentric(0.004, 1);

  @Test
  void whatKeepsItsRateWhileTheSpeedDriftsIsMotion() throws Exception {
    SpeedFunction drifting =
        new SpeedFunction(-0.005, 0.01 / 60, List.of())
            .plusLine(0.91, 0.05, 1)
            .plusLine(TURN_HERTZ, 0.08, 2);
    WheelFinding finding = found(WHEEL.risingEdges(drifting, 400, 60, 1e-6, 0, 5));
    WheelHarmonic once = finding.harmonics().get(0);
    assertThat(once.standing()).isEqualTo(Standing.MOTION);
    // one line over 48 blocks, in which the wow beside it scatters
    assertThat(once.motionPeakPercent()).isCloseTo(0.08, Percentage.withPercentage(5));
    assertThat(rms(finding)).isCloseTo(100 * WHEEL.rmsPeriods(), Percentage.withPercentage(5));
    double[] even = WheelSynth.even(60).risingEdges(drifting, 400, 60, 1e-6, 0, 5);
    assertFlutter(finding, FlutterTrio.of(Wheels.measured(even, 400)));
  }

  @Test
  void whatSlipsByOneTurnInTheCaptureIsMotion() throws Exception {
    SpeedFunction beside =
        SpeedFunction.constant(0).plusLine(0.91, 0.05, 1).plusLine(TURN_HERTZ + 0.02, 0.08, 2);
    WheelFinding finding = found(WHEEL.risingEdges(beside, 400, 60, 1e-6, 0, 5));
    assertThat(finding.harmonics().get(0).standing()).isEqualTo(Standing.MOTION);
    assertThat(rms(finding)).isCloseTo(100 * WHEEL.rmsPeriods(), Percentage.withPercentage(5));
  }

  @Test
  void whatFallsWithTheSquareOfTheSpeedIsMotion() throws Exception {
    Torque torque = new Torque(60, 400, 30, 0.1, 0.001);
    WheelFinding finding = found(torque.edges(WHEEL.latePeriods()));
    WheelHarmonic once = finding.harmonics().get(0);
    assertThat(once.standing()).isEqualTo(Standing.MOTION);
    assertThat(once.motionPeakPercent()).isCloseTo(0.1, Percentage.withPercentage(2));
    assertThat(rms(finding)).isCloseTo(100 * WHEEL.rmsPeriods(), Percentage.withPercentage(2));
  }

  @Test
  void whatStaysTheSameInAngleWhileTheSpeedChangesIsTheWheel() throws Exception {
    WheelSynth wheel = WheelSynth.uneven(60, 0.002, 4).eccentric(0.01, 1);
    SpeedFunction rising = new SpeedFunction(-0.05, 0.10 / 30, List.of()).plusLine(0.91, 0.05, 1);
    WheelFinding finding = found(wheel.risingEdges(rising, 400, 30, 1e-6, 0, 5));
    assertThat(finding.harmonics().get(0).standing()).isEqualTo(Standing.WHEEL);
    assertThat(finding.open()).isFalse();
    assertThat(rms(finding)).isCloseTo(100 * wheel.rmsPeriods(), Percentage.withPercentage(1));
    assertThat(finding.speedRangePercent()).isCloseTo(10, Percentage.withPercentage(5));
  }

  @Test
  void atASteadySpeedTheTwoCoincideAndThatIsSaid() throws Exception {
    SpeedFunction locked =
        SpeedFunction.constant(0).plusLine(0.91, 0.05, 1).plusLine(TURN_HERTZ, 0.08, 2);
    WheelSynth wheel = WheelSynth.uneven(60, 0.002, 4);
    WheelFinding finding = found(wheel.risingEdges(locked, 400, 30, 1e-6, 0, 5));
    assertThat(finding.harmonics().get(0).standing()).isEqualTo(Standing.OPEN);
    assertThat(finding.open()).isTrue();
    // 0.08 % of the speed once a turn
    assertThat(finding.harmonics().get(0).sameSpeedPeakPercent())
        .isCloseTo(0.08, Percentage.withPercentage(10)); // the spacing has a first harmonic too
    // with the once-a-turn part left in, the flutter is the true one but for that of the spacing
    double[] even = WheelSynth.even(60).risingEdges(locked, 400, 30, 1e-6, 0, 5);
    FlutterTrio truth = FlutterTrio.of(Wheels.measured(even, 400));
    FlutterTrio left = Objects.requireNonNull(finding.flutterWithoutSpacing());
    assertThat(left.weightedRmsPercent().value())
        .isCloseTo(truth.weightedRmsPercent().value(), Percentage.withPercentage(5));
    assertThat(finding.flutterWithout().weightedRmsPercent().value())
        .isLessThan(0.6 * Objects.requireNonNull(truth.weightedRmsPercent().value()));
    // what is the wheel's for certain lacks nothing but the first harmonic of the spacing
    assertThat(finding.certainRmsPercentOfPeriod().value())
        .isCloseTo(100 * wheel.rmsPeriods(), Percentage.withPercentage(5));
  }

  private static WheelFinding found(double[] rises) throws Exception {
    return Wheels.look(rises, 400, 60);
  }

  private static double rms(WheelFinding finding) {
    return Objects.requireNonNull(finding.patternRmsPercentOfPeriod().value());
  }

  private static void assertFlutter(WheelFinding finding, FlutterTrio truth) {
    assertThat(finding.flutterWithout().weightedTwoSigmaPercent().value())
        .isCloseTo(truth.weightedTwoSigmaPercent().value(), Percentage.withPercentage(3));
    assertThat(finding.flutterWithout().weightedRmsPercent().value())
        .isCloseTo(truth.weightedRmsPercent().value(), Percentage.withPercentage(3));
  }
}
