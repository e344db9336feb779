package turnsheet.core.diagnose.filter;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

class CircuitTest {

  private static final Circuit.Parts PARTS = new Circuit.Parts(ESeries.E96, 10e-9, 1, 5);

  /** IEC 60063 as remembered: the places where the rule of rounding and the list part. */
  @Test
  void seriesHoldTheirValues() {
    assertThat(ESeries.E24.list()).hasSize(24).contains(2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 8.2);
    assertThat(ESeries.E96.list())
        .hasSize(96)
        .contains(1.02, 1.91, 2.49, 3.16, 4.99, 6.81, 9.53, 9.76);
    // sum of the list as published, all of its values typed off
    assertThat(Arrays.stream(ESeries.E96.list()).sum()).isCloseTo(370.7, within(1e-9));
  }

  @Test
  void nearestIsNearestInRatioAcrossDecades() {
    assertThat(ESeries.E24.nearest(9.6e3)).isEqualTo(1e4);
    assertThat(ESeries.E24.nearest(9.5e3)).isEqualTo(9.1e3);
    assertThat(ESeries.E24.nearest(1.0e3)).isEqualTo(1e3);
    assertThat(ESeries.E96.nearest(123.4e3)).isEqualTo(124e3);
    assertThat(ESeries.E24.atLeast(4.7e-9)).isEqualTo(4.7e-9);
    assertThat(ESeries.E24.atLeast(4.71e-9)).isEqualTo(5.1e-9);
    assertThat(ESeries.E24.atLeast(9.2e-9)).isEqualTo(10e-9);
  }

  /** Every value of E96 is within half a step of what was wanted: 1.2 % and rounding. */
  @Test
  void builtStagesAreNearWhatWasWanted() {
    for (FilterFamily family : FilterFamily.values()) {
      for (int poles = 2; poles <= 8; poles += 2) {
        FilterDesign design = FilterDesign.bandPass(family, poles, 200, 3000);
        for (SallenKey stage : Circuit.of(design, PARTS, 1600).stages()) {
          Section built = stage.built();
          assertThat(built.f0Hz()).isCloseTo(stage.wanted().f0Hz(), within(0.014 * built.f0Hz()));
          // Q follows the root of the ratio; a low-pass with nearly equal resistors less
          assertThat(built.q()).isCloseTo(stage.wanted().q(), within(0.014 * built.q()));
        }
      }
    }
  }

  /**
   * Kirchhoff's law at both nodes of the circuit, solved as it stands: no formula of the filter.
   */
  @Test
  void nodesOfTheCircuitGiveTheResponse() {
    for (boolean highPass : new boolean[] {true, false}) {
      SallenKey stage = SallenKey.of(new Section(highPass, 640, 1.3), 10e-9, ESeries.E24);
      for (double hertz : new double[] {60, 500, 640, 900, 7000}) {
        Complex expected = nodes(stage, hertz, Double.POSITIVE_INFINITY);
        Complex found = stage.built().response(hertz);
        assertThat(found.re()).isCloseTo(expected.re(), within(1e-9));
        assertThat(found.im()).isCloseTo(expected.im(), within(1e-9));
      }
    }
  }

  /** With the amplifier that the rule asks for, the gain at f0 is within 0.3 dB of the ideal. */
  @Test
  void theAmplifierAskedForIsFastEnough() {
    for (boolean highPass : new boolean[] {true, false}) {
      for (double q : new double[] {0.51, 0.7071, 1.307, 2.563}) {
        SallenKey stage = SallenKey.of(new Section(highPass, 1000, q), 10e-9, ESeries.E96);
        double unity = Circuit.OP_AMP_MULTIPLE * 1000 * Math.max(1, q);
        for (double hertz : new double[] {500, 1000, 2000}) {
          double real = nodes(stage, hertz, unity).magnitude();
          double ideal = nodes(stage, hertz, Double.POSITIVE_INFINITY).magnitude();
          // the amplifier's own lag at f0 is 1 / (100 Q): times 2 Q it is 2 % of the gain
          assertThat(20 * Math.log10(real / ideal)).isCloseTo(0, within(0.3));
        }
      }
    }
  }

  /**
   * Output over input of the circuit: v at the junction, p at the follower's input, out = p A / (1
   * + A) with A = unity / (j f).
   */
  private static Complex nodes(SallenKey s, double hertz, double unityHertz) {
    double w = 2 * Math.PI * hertz;
    Complex gain =
        Double.isInfinite(unityHertz)
            ? Complex.ONE
            : Complex.ONE.over(new Complex(1, hertz / unityHertz));
    Complex g1 = new Complex(1 / s.r1Ohm(), 0);
    Complex g2 = new Complex(1 / s.r2Ohm(), 0);
    Complex y1 = new Complex(0, w * s.c1Farad());
    Complex y2 = new Complex(0, w * s.c2Farad());
    boolean high = s.wanted().highPass();
    // first series part, part to the output, second series part, part to ground
    Complex in = high ? y1 : g1;
    Complex back = high ? g1 : y1;
    Complex on = high ? y2 : g2;
    Complex down = high ? g2 : y2;
    // p = v on / (on + down); (v - 1) in + (v - p gain) back + (v - p) on = 0
    Complex share = on.over(on.plus(down));
    Complex sum =
        in.plus(back).plus(on).minus(back.times(share).times(gain)).minus(on.times(share));
    return in.over(sum).times(share).times(gain);
  }

  /**
   * Small tolerances: f0 falls by half the sum of four even shares. Its standard deviation is half
   * the root of the sum of squares over 3, and the 95 % band of a sum of four is within 2 % of
   * Gaussian; 4000 draws give its ends within 4 %.
   */
  @Test
  void bandsAreThoseOfEvenTolerances() {
    Circuit circuit = Circuit.of(FilterDesign.highPass(FilterFamily.BESSEL, 4, 300), PARTS, 800);
    double sd = Math.sqrt((2 * 0.01 * 0.01 + 2 * 0.05 * 0.05) / 3) / 2;
    for (int k = 0; k < 2; k++) {
      Circuit.Band f0 = circuit.bands().get(k).f0Hz();
      double middle = circuit.stages().get(k).built().f0Hz();
      assertThat(f0.high() / middle - 1).isCloseTo(1.96 * sd, within(0.08 * 1.96 * sd));
      assertThat(1 - f0.low() / middle).isCloseTo(1.96 * sd, within(0.08 * 1.96 * sd));
    }
    assertThat(Circuit.of(circuit.design(), PARTS, 800)).isEqualTo(circuit);
    for (Circuit.ResponseBand point : circuit.responses()) {
      assertThat(point.builtDb()).isBetween(point.bandDb().low(), point.bandDb().high());
    }
  }

  @Test
  void amplifiersFollowTheSharpestStageAndTheSignal() {
    FilterDesign design = FilterDesign.highPass(FilterFamily.BUTTERWORTH, 8, 1000);
    assertThat(Circuit.of(design, PARTS, 10).opAmpHertz()).isCloseTo(256_292, within(1.0));
    assertThat(Circuit.of(design, PARTS, 10_000).opAmpHertz()).isEqualTo(1e6);
    List<SallenKey> stages = Circuit.of(design, PARTS, 10).stages();
    assertThat(stages).allMatch(s -> s.c1Farad() == 10e-9 && s.c2Farad() == 10e-9);
  }
}
