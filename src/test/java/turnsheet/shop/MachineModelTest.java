package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
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
    assertThat(model.rateHertzAt(part, setting).getAsDouble())
        .isCloseTo(rateHertz, within(HALF_A_DIGIT));
  }

  /** Common practice, no source: a ring of 120 teeth on a capstan shaft of 9.096 mm. */
  @ParameterizedTest
  @CsvSource({"9.525, 400", "19.05, 800", "38.1, 1600"})
  void ringOf120TeethGivesItsCommonPulseRates(double cmPerS, double pulsesPerSecond) {
    RotatingPart capstan = new RotatingPart("capstan", PartBasis.DIAMETER_MM, 9.096, null);
    MachineModel model = MachineModel.named("Transport", 120, "").withPart(capstan);
    double rate = model.rateHertzAt(capstan, ShopFixture.tape("play", cmPerS, null)).getAsDouble();
    // the diameter is given to 0.001 mm, so to 5.5e-5 of itself
    assertThat(120 * rate).isCloseTo(pulsesPerSecond, within(pulsesPerSecond * 5.5e-5));
  }

  /** 33 1/3, 45 and 78 per minute are 0.5556, 0.75 and 1.3 Hz (computed), four digits printed. */
  @ParameterizedTest
  @CsvSource({"33.333333333333336, 0.5556", "45, 0.75", "78, 1.3"})
  void platterTurnsAtItsNominalRotation(double revPerMin, double rateHertz) {
    RotatingPart platter = new RotatingPart("platter", PartBasis.TURNS_PER_TURN, 1, null);
    MachineModel model = MachineModel.named("Player", null, "").withPart(platter);
    assertThat(model.rateHertzAt(platter, ShopFixture.platter("play", revPerMin)).getAsDouble())
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
    assertThat(model.partRatesAt(setting))
        .extracting(PartRate::part)
        .containsExactly("capstan", "flywheel", "motor", "fan");
    assertThat(model.partRatesAt(setting))
        .extracting(PartRate::rateHertz)
        .satisfies(
            rates -> {
              double[] expected = DoubleStream.of(capstan, capstan, 4 * capstan, 25).toArray();
              for (int i = 0; i < expected.length; i++) {
                // a few roundings of double
                assertThat(rates.get(i)).isCloseTo(expected[i], within(1e-12));
              }
            });
  }

  @Test
  void knowsNoRateWhereTheSettingLacksWhatItFollowsFrom() {
    RotatingPart roller = new RotatingPart("roller", PartBasis.DIAMETER_MM, 8, null);
    RotatingPart platter = new RotatingPart("platter", PartBasis.TURNS_PER_TURN, 1, null);
    MachineModel model = MachineModel.named("Odd", null, "").withPart(roller).withPart(platter);
    assertThat(model.partRatesAt(ShopFixture.platter("33", 33)))
        .extracting(PartRate::part)
        .containsExactly("platter");
    assertThat(model.partRatesAt(ShopFixture.tape("19", 19.05, null)))
        .extracting(PartRate::part)
        .containsExactly("roller");
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
    assertThat(model.withoutPart("flywheel idler").withoutPart("capstan").parts()).hasSize(1);
  }

  private static void assertRefused(
      String code, org.assertj.core.api.ThrowableAssert.ThrowingCallable call) {
    assertThatThrownBy(call)
        .isInstanceOfSatisfying(
            RefusedChangeException.class, e -> assertThat(e.code()).isEqualTo(code));
  }
}
