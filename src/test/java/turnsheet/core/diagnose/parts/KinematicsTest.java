package turnsheet.core.diagnose.parts;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class KinematicsTest {

  /** 38.1 cm/s and mains of 50 Hz. */
  private static final Running TAPE = Running.nominal(381.0, null, 50);

  private static Turning rate(Running running, MachinePart... parts) {
    return new Kinematics(List.of(parts), running).of(parts[0]).orElseThrow();
  }

  private static MachinePart part(String name, Drive drive) {
    return MachinePart.of(name, PartKind.OTHER, drive);
  }

  /** 12.128 Hz for 10 mm at 38.1 cm/s, and 1 % of it, computed in print to five digits. */
  @Test
  void aRimTurnsWithTheTape() {
    Turning turning = rate(TAPE, part("capstan", new Drive.Rim(10)));
    assertThat(turning.hertz()).isCloseTo(12.128, within(5e-4));
    assertThat(turning.limitHertz()).isCloseTo(0.12128, within(5e-6));
    // half width of a rectangle over root three
    assertThat(turning.standardHertz()).isCloseTo(0.07002, within(5e-6));
    assertThat(turning.lock()).isEqualTo(Lock.SHAFT);
  }

  @Test
  void aReelTurnsWithinTheRangeOfItsPack() {
    Turning turning = rate(TAPE, part("reel", new Drive.Pack(250, 100, Drive.Winding.TAKES_UP)));
    // v / (pi d), by hand
    assertThat(turning.lowHertz()).isCloseTo(0.48510, within(5e-6));
    assertThat(turning.highHertz()).isCloseTo(1.21276, within(5e-6));
    assertThat(turning.distance(0.8)).isZero();
    assertThat(turning.distance(1.3)).isCloseTo(0.08724, within(5e-6));
    assertThat(turning.distance(0.4)).isCloseTo(-0.08510, within(5e-6));
  }

  /** A belt of 500 mm on a rim of 20 mm comes round pi 20 / 500 times per turn of that rim. */
  @Test
  void aBeltComesRoundInItsLength() {
    MachinePart motor = part("motor", new Drive.Supply(2, 0, 0));
    Turning belt = rate(TAPE, part("belt", new Drive.Loop(500, "motor", 20.0)), motor);
    assertThat(belt.hertz()).isCloseTo(25 * Math.PI * 20 / 500, within(1e-12));
    // length and rim, one percent each: limits add, variances add
    assertThat(belt.limit()).isCloseTo(0.02, within(1e-12));
    assertThat(belt.variance()).isCloseTo(2e-4 / 3, within(1e-12));
    assertThat(belt.lock()).isEqualTo(Lock.MAINS);
    assertThat(rate(TAPE, part("loop", new Drive.Loop(500, null, null))).hertz())
        .isCloseTo(381.0 / 500, within(1e-12));
  }

  /**
   * Synchronous speeds at 50 and 60 Hz as in any textbook: 3000, 1500, 1000; 3600, 1800 a minute.
   */
  @ParameterizedTest
  @CsvSource({"50,1,3000", "50,2,1500", "50,3,1000", "60,1,3600", "60,2,1800"})
  void aSynchronousMotorTurnsWithTheMains(double mains, int pairs, double perMinute) {
    Turning turning =
        rate(Running.nominal(381.0, null, mains), part("m", new Drive.Supply(pairs, 0, 0)));
    assertThat(turning.hertz() * 60).isCloseTo(perMinute, within(1e-9));
    assertThat(turning.limit()).isZero();
  }

  @Test
  void anInductionMotorFallsBehind() {
    Turning turning = rate(TAPE, part("motor", new Drive.Supply(2, 0.02, 0.06)));
    assertThat(turning.lowHertz()).isCloseTo(23.5, within(1e-12));
    assertThat(turning.highHertz()).isCloseTo(24.5, within(1e-12));
    assertThat(turning.lock()).isEqualTo(Lock.FREE);
  }

  @Test
  void theUnitsSpeedMovesWhatTheTapeOrTheNominalRotationDrivesAndNothingElse() {
    Running fast = new Running(381.0, null, 2, 0.01, 50.05, 0.2);
    assertThat(rate(fast, part("capstan", new Drive.Rim(10))).hertz())
        .isCloseTo(1.02 * 12.12761, within(1e-5));
    assertThat(rate(fast, part("motor", new Drive.Supply(2, 0, 0))).hertz())
        .isCloseTo(25.025, within(1e-12));
    assertThat(rate(fast, part("motor", new Drive.Supply(2, 0, 0))).limit())
        .isCloseTo(0.2 / 50.05, within(1e-12));
    // whether it moves along is not known
    assertThat(rate(fast, part("fan", new Drive.Own(1500))).lowHertz()).isEqualTo(25);
    assertThat(rate(fast, part("fan", new Drive.Own(1500))).highHertz())
        .isCloseTo(25.5, within(1e-12));
    Running turning = new Running(null, 100.0 / 180, -1, 0, 50, 0);
    Turning platter = rate(turning, part("platter", new Drive.Geared(1, null)));
    assertThat(platter.hertz()).isCloseTo(0.99 * 100 / 180, within(1e-12));
    // on the shaft itself: nothing is added to the uncertainty of the speed
    assertThat(platter.limit()).isZero();
  }

  @Test
  void aToleranceThatWasEnteredTakesThePlaceOfTheUsualOne() {
    MachinePart gauged = new MachinePart("roller", PartKind.ROLLER, new Drive.Rim(30), null, 0.1);
    assertThat(rate(TAPE, gauged).limit()).isCloseTo(0.001, within(1e-12));
    assertThat(
            rate(TAPE, part("geared", new Drive.Geared(3, "r")), part("r", new Drive.Rim(9)))
                .limit())
        .isCloseTo(0.02, within(1e-12));
  }

  @Test
  void whatTheSettingDoesNotHaveGivesNoRate() {
    MachinePart roller = part("roller", new Drive.Rim(30));
    MachinePart follower = part("follower", new Drive.Geared(2, "roller"));
    Running turning = Running.nominal(null, 0.75, 50);
    assertThat(new Kinematics(List.of(roller, follower), turning).of(roller)).isEmpty();
    assertThat(new Kinematics(List.of(roller, follower), turning).of(follower)).isEmpty();
    assertThatThrownBy(() -> rate(turning, part("a", new Drive.Geared(2, "a"))))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
