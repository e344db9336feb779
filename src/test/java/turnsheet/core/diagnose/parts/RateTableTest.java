package turnsheet.core.diagnose.parts;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

class RateTableTest {

  private static final Running STILL = Running.nominal(null, null, 50);

  private static List<ExpectedRate> turningOnce(PartKind kind, @Nullable Feature feature) {
    Drive once = new Drive.Own(60);
    return RateTable.of(List.of(new MachinePart("it", kind, once, feature, 0.0)), STILL);
  }

  private static Turning rate(List<ExpectedRate> rates, Cause cause, int harmonic, int side) {
    return rates.stream()
        .filter(r -> r.cause() == cause && r.harmonic() == harmonic && r.sideband() == side)
        .findFirst()
        .orElseThrow()
        .rate();
  }

  /**
   * The deep-groove bearing of the public bearing recordings of Case Western Reserve University: 9
   * balls of 0.3126 in on 1.537 in; published with them, per turn: inner 5.4152, outer 3.5848, cage
   * 0.39828, and 4.7135 for the ball, which strikes both rings in a turn of 2.3567 (from memory).
   */
  @Test
  void ratesOfABearingAreThePublishedOnes() {
    var rates = turningOnce(PartKind.BEARING, new Feature.Balls(9, 0.3126 * 25.4, 1.537 * 25.4, 0));
    // the last digit of what is published
    assertThat(rate(rates, Cause.INNER_RACE, 1, 0).hertz()).isCloseTo(5.4152, within(6e-5));
    assertThat(rate(rates, Cause.OUTER_RACE, 1, 0).hertz()).isCloseTo(3.5848, within(6e-5));
    assertThat(rate(rates, Cause.CAGE, 1, 0).hertz()).isCloseTo(0.39828, within(6e-5));
    assertThat(rate(rates, Cause.BALL, 2, 0).hertz()).isCloseTo(4.7135, within(6e-5));
    // inner and outer add up to all the balls
    assertThat(
            rate(rates, Cause.INNER_RACE, 1, 0).hertz()
                + rate(rates, Cause.OUTER_RACE, 1, 0).hertz())
        .isCloseTo(9, within(1e-12));
    assertThat(rate(rates, Cause.INNER_RACE, 1, -1).hertz()).isCloseTo(4.4152, within(6e-5));
    assertThat(rate(rates, Cause.BALL, 1, 1).hertz()).isCloseTo(2.3567 + 0.39828, within(2e-4));
  }

  /** The uncertainty of each rate of a bearing is what moving its ball by one percent does. */
  @Test
  void uncertaintyOfABearingFollowsFromItsDiameters() {
    Drive once = new Drive.Geared(1, null);
    Running turning = Running.nominal(null, 1.0, 50);
    var exact = new MachinePart("b", PartKind.BEARING, once, new Feature.Balls(8, 5, 22, 15), 0.0);
    var off = new MachinePart("b", PartKind.BEARING, once, new Feature.Balls(8, 5.05, 22, 15), 0.0);
    var usual = new MachinePart("b", PartKind.BEARING, once, exact.feature(), null);
    for (Cause cause : List.of(Cause.CAGE, Cause.OUTER_RACE, Cause.INNER_RACE, Cause.BALL)) {
      double moved =
          rate(RateTable.of(List.of(off), turning), cause, 1, 0).hertz()
              / rate(RateTable.of(List.of(exact), turning), cause, 1, 0).hertz();
      double limit = rate(RateTable.of(List.of(usual), turning), cause, 1, 0).limit();
      // ball and pitch diameter may both be off, and balls slide by up to 2 %; 2 % of the share of
      // the diameters for the curvature of the formula over one percent
      double share = 2 * Math.abs(moved - 1);
      assertThat(limit - 0.02).as("%s", cause).isCloseTo(share, within(0.02 * share));
    }
  }

  @Test
  void teethHaveSideLinesAtTheTurningRate() {
    var rates = turningOnce(PartKind.GEAR, new Feature.Teeth(24));
    assertThat(rate(rates, Cause.TEETH, 1, 0).hertz()).isEqualTo(24);
    assertThat(rate(rates, Cause.TEETH, 1, -2).hertz()).isEqualTo(22);
    assertThat(rate(rates, Cause.TEETH, 2, 1).hertz()).isEqualTo(49);
    assertThat(rate(rates, Cause.TURN, 4, 0).hertz()).isEqualTo(4);
  }

  @Test
  void polesCountPairs() {
    var rates = turningOnce(PartKind.MOTOR, new Feature.Poles(6));
    assertThat(rate(rates, Cause.POLES, 1, 0).hertz()).isEqualTo(6);
    assertThat(rate(rates, Cause.POLES, 2, 0).hertz()).isEqualTo(12);
  }

  @Test
  void humIsListedOnceWhetherAMotorRunsOnTheMainsOrNot() {
    assertThat(turningOnce(PartKind.ROLLER, null))
        .filteredOn(r -> r.cause() == Cause.HUM)
        .extracting(r -> r.rate().hertz())
        .containsExactly(50.0, 100.0, 150.0, 200.0);
    var motor = MachinePart.of("motor", PartKind.MOTOR, new Drive.Supply(2, 0, 0));
    assertThat(RateTable.of(List.of(motor), STILL))
        .noneMatch(r -> r.cause() == Cause.HUM)
        .anyMatch(r -> r.cause() == Cause.SUPPLY && r.rate().hertz() == 100);
  }
}
