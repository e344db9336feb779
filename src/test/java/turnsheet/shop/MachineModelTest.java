package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.diagnose.parts.Drive;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.measure.FigureName;

class MachineModelTest {

  /** The rates below are printed with three decimals. */
  private static final double HALF_A_DIGIT = 0.0005;

  /** f = v / (pi d), textbook; the rates were computed independently of this code. */
  @ParameterizedTest
  @CsvSource({
    "4.7625, 2.0, 7.580",
    "4.7625, 2.5, 6.064",
    "4.7625, 3.0, 5.053",
    "4.7625, 10, 1.516",
    "19.05, 6, 10.106",
    "19.05, 8, 7.580",
    "19.05, 10, 6.064",
    "38.1, 10, 12.128"
  })
  void rimAtTapeSpeedTurnsAtSpeedOverCircumference(
      double cmPerS, double diameterMm, double rateHertz) {
    RotatingPart part = new RotatingPart("capstan", PartBasis.DIAMETER_MM, diameterMm, null);
    SpeedSetting setting = ShopFixture.tape("play", cmPerS, null);
    MachineModel model = MachineModel.named("Transport", null, "").withPart(part);
    assertThat(rate(model, part, setting)).isCloseTo(rateHertz, within(HALF_A_DIGIT));
  }

  /** Common practice, no source: a ring of 120 teeth on a capstan shaft of 9.096 mm. */
  @ParameterizedTest
  @CsvSource({"9.525, 400", "19.05, 800", "38.1, 1600"})
  void ringOf120TeethGivesItsCommonPulseRates(double cmPerS, double pulsesPerSecond) {
    RotatingPart capstan = new RotatingPart("capstan", PartBasis.DIAMETER_MM, 9.096, null);
    MachineModel model = MachineModel.named("Transport", 120, "").withPart(capstan);
    double rate = rate(model, capstan, ShopFixture.tape("play", cmPerS, null));
    // the diameter is given to 0.001 mm, so to 5.5e-5 of itself
    assertThat(120 * rate).isCloseTo(pulsesPerSecond, within(pulsesPerSecond * 5.5e-5));
  }

  /** 33 1/3, 45 and 78 per minute are 0.5556, 0.75 and 1.3 Hz (computed), four digits printed. */
  @ParameterizedTest
  @CsvSource({"33.333333333333336, 0.5556", "45, 0.75", "78, 1.3"})
  void platterTurnsAtItsNominalRotation(double revPerMin, double rateHertz) {
    RotatingPart platter = new RotatingPart("platter", PartBasis.TURNS_PER_TURN, 1, null);
    MachineModel model = MachineModel.named("Player", null, "").withPart(platter);
    assertThat(rate(model, platter, ShopFixture.platter("play", revPerMin)))
        .isCloseTo(rateHertz, within(0.00005));
  }

  /** Common practice, no source: 400 pulses per second from 120 teeth are 200 rev/min. */
  @Test
  void pulseRateFollowsFromPulsesPerTurn() {
    MachineModel model = MachineModel.named("Player", 120, "");
    assertThat(model.pulsesPerSecond(ShopFixture.platter("200", 200)).getAsDouble()).isEqualTo(400);
    assertThat(model.pulsesPerSecond(ShopFixture.tape("9.5", 9.525, 401.0)).getAsDouble())
        .isEqualTo(401);
    assertThat(model.pulsesPerSecond(ShopFixture.tape("9.5", 9.525, null))).isEmpty();
    assertThat(
            MachineModel.named("No wheel", null, "").pulsesPerSecond(ShopFixture.platter("33", 33)))
        .isEmpty();
  }

  @Test
  void gearedPartsFollowThroughSeveralParts() {
    SpeedSetting setting = ShopFixture.tape("play", 4.7625, null);
    MachineModel model =
        MachineModel.named("Transport", null, "")
            .withSetting(setting)
            .withPart(new RotatingPart("capstan", PartBasis.DIAMETER_MM, 2, null))
            .withPart(new RotatingPart("flywheel", PartBasis.TURNS_PER_TURN, 1, "capstan"))
            .withPart(new RotatingPart("motor", PartBasis.TURNS_PER_TURN, 4, "flywheel"))
            .withPart(new RotatingPart("fan", PartBasis.FIXED_PER_MINUTE, 1500, null));
    double capstan = 47.625 / (Math.PI * 2);
    double[] expected = {capstan, capstan, 4 * capstan, 25};
    for (int i = 0; i < expected.length; i++) {
      // a few roundings of double
      assertThat(rate(model, model.parts().get(i), setting)).isCloseTo(expected[i], within(1e-12));
    }
  }

  @Test
  void knowsNoRateWhereTheSettingLacksWhatItFollowsFrom() {
    RotatingPart roller = new RotatingPart("roller", PartBasis.DIAMETER_MM, 8, null);
    RotatingPart platter = new RotatingPart("platter", PartBasis.TURNS_PER_TURN, 1, null);
    MachineModel model = MachineModel.named("Odd", null, "").withPart(roller).withPart(platter);
    SpeedSetting turning = ShopFixture.platter("33", 33);
    SpeedSetting tape = ShopFixture.tape("19", 19.05, null);
    assertThat(model.turningAt(roller, turning, 50)).isEmpty();
    assertThat(model.turningAt(platter, turning, 50)).isPresent();
    assertThat(model.turningAt(roller, tape, 50)).isPresent();
    assertThat(model.turningAt(platter, tape, 50)).isEmpty();
  }

  /**
   * 50 Hz on two pole pairs are 25 turns; 20 mm on a belt of 500 mm go round 0.1257 times a turn.
   */
  @Test
  void aMotorOnTheMainsTurnsABelt() {
    SpeedSetting setting = ShopFixture.tape("19", 19.05, null);
    MachineModel model =
        MachineModel.named("Belted", null, "")
            .withPart(
                new RotatingPart("motor", PartKind.MOTOR, PartBasis.MAINS_POLE_PAIRS, 2, null))
            .withPart(
                new RotatingPart(
                    "belt",
                    PartKind.BELT,
                    PartBasis.LENGTH_MM,
                    500,
                    "motor",
                    PartDetails.ofRim(20)));
    assertThat(rate(model, model.parts().get(0), setting)).isCloseTo(25, within(1e-12));
    assertThat(rate(model, model.parts().get(1), setting)).isCloseTo(3.1416, within(5e-5));
    assertThat(model.turningAt(model.parts().get(0), setting, 60).orElseThrow().hertz())
        .isCloseTo(30, within(1e-12));
  }

  @Test
  void refusesNumbersThatDoNotFitTogether() {
    assertRefused("partBasis", () -> part(PartKind.REEL, PartBasis.TURNS_PER_TURN, null));
    assertRefused("partBasis", () -> part(PartKind.ROLLER, PartBasis.LENGTH_MM, null));
    assertRefused(
        "partPack",
        () ->
            part(
                PartKind.REEL,
                PartBasis.DIAMETER_MM,
                PartDetails.ofPack(300, Drive.Winding.GIVES)));
    assertRefused("partBelt", () -> part(PartKind.BELT, PartBasis.LENGTH_MM, PartDetails.ofRim(8)));
    assertRefused(
        "partBalls",
        () -> part(PartKind.BEARING, PartBasis.FIXED_PER_MINUTE, PartDetails.ofCount(8)));
    assertRefused(
        "partBalls",
        () -> part(PartKind.BEARING, PartBasis.FIXED_PER_MINUTE, PartDetails.ofBalls(8, 9, 8)));
    assertRefused(
        "partCount", () -> part(PartKind.GEAR, PartBasis.FIXED_PER_MINUTE, PartDetails.ofCount(0)));
    assertRefused(
        "partPoles",
        () -> new RotatingPart("m", PartKind.MOTOR, PartBasis.MAINS_POLE_PAIRS, 1.5, null));
  }

  private static RotatingPart part(PartKind kind, PartBasis basis, @Nullable PartDetails details) {
    return new RotatingPart(
        "it", kind, basis, 250, null, details == null ? PartDetails.NONE : details);
  }

  @Test
  void refusesPartsThatTurnEachOther() {
    MachineModel model =
        MachineModel.named("Loop", null, "")
            .withPart(new RotatingPart("a", PartBasis.DIAMETER_MM, 2, null))
            .withPart(new RotatingPart("b", PartBasis.TURNS_PER_TURN, 2, "a"));
    assertRefused(
        "partCircle",
        () -> model.changePart("a", new RotatingPart("a", PartBasis.TURNS_PER_TURN, 2, "b")));
    assertRefused(
        "partCircle",
        () -> model.withPart(new RotatingPart("c", PartBasis.TURNS_PER_TURN, 2, "c")));
  }

  @Test
  void refusesWhatIsThereTwiceOrRefersToNothing() {
    MachineModel model = ShopFixture.transport("Transport");
    assertRefused(
        "settingLabelTaken", () -> model.withSetting(ShopFixture.tape("19", 19.05, null)));
    assertRefused("partNameTaken", () -> model.withPart(model.parts().get(0)));
    assertRefused("limitTaken", () -> model.withLimit(model.limits().get(0)));
    assertRefused(
        "partUnknown",
        () -> model.withPart(new RotatingPart("d", PartBasis.TURNS_PER_TURN, 2, "nothing")));
    assertRefused(
        "limitSettingUnknown",
        () ->
            model.withLimit(
                new ServiceLimit(SpeedSettingId.next(), FigureName.DEVIATION, 1, "manual")));
  }

  @Test
  void keepsAPartThatAnotherFollows() {
    MachineModel model = ShopFixture.transport("Transport");
    assertRefused("partReferred", () -> model.withoutPart("capstan"));
    MachineModel alone = model.withoutPart("flywheel idler").withoutPart("bearing");
    assertThat(alone.withoutPart("capstan").parts())
        .extracting(RotatingPart::name)
        .containsExactly("motor", "reel");
  }

  private static void assertRefused(
      String code, org.assertj.core.api.ThrowableAssert.ThrowingCallable call) {
    assertThatThrownBy(call)
        .isInstanceOfSatisfying(
            RefusedChangeException.class, e -> assertThat(e.code()).isEqualTo(code));
  }

  private static double rate(MachineModel model, RotatingPart part, SpeedSetting setting) {
    return model.turningAt(part, setting, 50).orElseThrow().hertz();
  }
}
