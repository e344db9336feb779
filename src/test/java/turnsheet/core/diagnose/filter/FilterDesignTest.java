package turnsheet.core.diagnose.filter;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class FilterDesignTest {

  private static final double RATE = 96_000;

  private static List<FilterDesign> designs(double hertz) {
    List<FilterDesign> all = new ArrayList<>();
    for (FilterFamily family : FilterFamily.values()) {
      for (int poles = 2; poles <= 8; poles += 2) {
        all.add(FilterDesign.highPass(family, poles, hertz));
        all.add(FilterDesign.lowPass(family, poles, hertz));
      }
    }
    return all;
  }

  /** Half the power is 10 log10 2 = 3.0103 dB; asked for within 0.02 dB, exact by the warping. */
  @Test
  void losesHalfThePowerAtTheCutoff() {
    for (double hertz : new double[] {5, 50, 800, 9600, 43_200}) {
      for (FilterDesign design : designs(hertz)) {
        assertThat(design.gainDb(hertz)).isCloseTo(-3.0103, within(1e-4));
        // 8 poles at 5 Hz leave 1e-12 of each coefficient to tell the response from
        assertThat(design.at(RATE).gainDb(hertz)).isCloseTo(-3.0103, within(0.001));
      }
    }
  }

  /** What the samples themselves lose, not what the coefficients promise. */
  @Test
  void aFilteredSineLosesHalfItsPower() {
    for (double hertz : new double[] {50, 800, 9600}) {
      for (FilterDesign design : designs(hertz)) {
        double[] samples = new double[96_000];
        for (int i = 0; i < samples.length; i++) {
          samples[i] = Math.sin(2 * Math.PI * hertz * i / RATE);
        }
        DiscreteFilter filter = design.at(RATE);
        filter.process(samples, samples.length);
        double power = 0;
        int from = samples.length / 2; // whole periods of all three, and settled
        for (int i = from; i < samples.length; i++) {
          power += samples[i] * samples[i];
        }
        double gainDb = 10 * Math.log10(2 * power / (samples.length - from));
        assertThat(gainDb).isCloseTo(-3.0103, within(0.002));
      }
    }
  }

  /** Butterworth: 1 / sqrt(1 + x^2n), by its definition. */
  @Test
  void butterworthFollowsItsClosedForm() {
    for (int n = 2; n <= 8; n += 2) {
      for (double x : new double[] {0.1, 0.5, 0.9, 1.5, 4}) {
        double expected = -10 * Math.log10(1 + Math.pow(x, 2 * n));
        assertThat(FilterDesign.lowPass(FilterFamily.BUTTERWORTH, n, 100).gainDb(100 * x))
            .isCloseTo(expected, within(1e-9));
        assertThat(FilterDesign.highPass(FilterFamily.BUTTERWORTH, n, 100).gainDb(100 / x))
            .isCloseTo(expected, within(1e-9));
      }
    }
  }

  /**
   * Cutoff and signal below a tenth of the sample rate, to 10 dB of loss: frequencies are at most
   * 3.4 % off (tan x over x at 0.1 pi), and 8 poles turn that into 8 times as much of the gain, 2.4
   * dB; below a fiftieth of the rate 0.13 % and 0.1 dB.
   */
  @Test
  void followsTheAnalogueFilterWellBelowTheSampleRate() {
    double[][] ranges = {{0.1, 2.4}, {0.02, 0.1}};
    for (double[] range : ranges) {
      for (FilterDesign design : designs(range[0] / 3 * RATE)) {
        DiscreteFilter discrete = design.at(RATE);
        for (double hertz = 0.002 * RATE; hertz <= range[0] * RATE; hertz *= 1.2) {
          if (design.gainDb(hertz) > -10) {
            assertThat(discrete.gainDb(hertz)).isCloseTo(design.gainDb(hertz), within(range[1]));
          }
        }
      }
    }
  }

  /** An analogue Bessel low-pass of unit delay, scaled: the delay is even in the pass band. */
  @Test
  void besselDelayIsEven() {
    DiscreteFilter filter = FilterDesign.lowPass(FilterFamily.BESSEL, 8, 1000).at(RATE);
    double expected = 3.179617 / (2 * Math.PI * 1000);
    for (double hertz : new double[] {1, 100, 500, 1000}) {
      // the warping of 1 kHz at 96 kHz is 0.04 %, its slope three times that
      assertThat(filter.groupDelaySeconds(hertz)).isCloseTo(expected, within(0.002 * expected));
    }
  }

  @Test
  void beginsWithoutATransientAtALevel() {
    for (FilterDesign design : designs(200)) {
      double[] samples = new double[1000];
      java.util.Arrays.fill(samples, 0.7);
      DiscreteFilter filter = design.at(RATE);
      filter.settleAt(0.7);
      filter.process(samples, samples.length);
      double expected = design.kind() == FilterKind.LOW_PASS ? 0.7 : 0;
      for (double y : samples) {
        // rounding, lifted by the slow poles: cutoff 1/480 of the rate, squared, over 1e-16
        assertThat(y).isCloseTo(expected, within(1e-7));
      }
    }
  }

  @Test
  void bandPassIsHighPassThenLowPass() {
    FilterDesign band = FilterDesign.bandPass(FilterFamily.BUTTERWORTH, 4, 200, 3000);
    assertThat(band.sections()).hasSize(4);
    for (double hertz : new double[] {50, 200, 800, 3000, 9000}) {
      double both =
          FilterDesign.highPass(FilterFamily.BUTTERWORTH, 4, 200).gainDb(hertz)
              + FilterDesign.lowPass(FilterFamily.BUTTERWORTH, 4, 3000).gainDb(hertz);
      assertThat(band.gainDb(hertz)).isCloseTo(both, within(1e-9));
    }
  }

  @Test
  void refusesWhatCannotBe() {
    assertThatThrownBy(() -> FilterDesign.lowPass(FilterFamily.BESSEL, 3, 100))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> FilterDesign.bandPass(FilterFamily.BESSEL, 2, 300, 100))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> FilterDesign.lowPass(FilterFamily.BESSEL, 2, 50_000).at(RATE))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
