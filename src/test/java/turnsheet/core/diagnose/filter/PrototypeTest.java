package turnsheet.core.diagnose.filter;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Comparator;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Pole pairs against exact values and against what is printed. */
class PrototypeTest {

  /** Five decimals are given, so half a unit of the last. */
  private static final double ROUNDED = 0.5e-5 * 1.001;

  /** f0 over fc and Q of the exact poles, computed with another program. */
  private static final double[][][] BESSEL = {
    {{1.27202, 0.57735}},
    {{1.43017, 0.52193}, {1.60336, 0.80554}},
    {{1.60392, 0.51032}, {1.68917, 0.61119}, {1.90471, 1.02331}},
    {{1.77847, 0.50599}, {1.83209, 0.55961}, {1.95320, 0.71085}, {2.18873, 1.22567}}
  };

  private static final double[][] BUTTERWORTH_Q = {
    {0.70711}, {0.54120, 1.30656}, {0.51764, 0.70711, 1.93185}, {0.50980, 0.60134, 0.89998, 2.56292}
  };

  @Test
  void besselPairsAreTheExactOnes() {
    for (int n = 2; n <= 8; n += 2) {
      holds(Prototype.pairs(FilterFamily.BESSEL, n), BESSEL[n / 2 - 1]);
    }
  }

  @Test
  void butterworthPairsAreTheExactOnes() {
    for (int n = 2; n <= 8; n += 2) {
      List<Prototype.Pair> pairs = Prototype.pairs(FilterFamily.BUTTERWORTH, n);
      double[] q = BUTTERWORTH_Q[n / 2 - 1];
      assertThat(pairs).hasSize(q.length);
      for (int k = 0; k < q.length; k++) {
        assertThat(pairs.get(k).ratio()).isEqualTo(1);
        assertThat(pairs.get(k).q()).isCloseTo(q[k], within(ROUNDED));
      }
    }
  }

  /** With all poles at hand the Bessel filter of a unit delay is 1 second late at low frequency. */
  @Test
  void besselDelayIsFlattestOfAll() {
    double[] unitDelayCutoff = {1.361654, 2.113918, 2.703395, 3.179617};
    for (int n = 2; n <= 8; n += 2) {
      double wc = unitDelayCutoff[n / 2 - 1];
      double delay = 0;
      for (Prototype.Pair pair : Prototype.pairs(FilterFamily.BESSEL, n)) {
        delay += 1 / (pair.q() * pair.ratio());
      }
      // six decimals are given for the cutoff
      assertThat(delay).isCloseTo(wc, within(1e-6));
    }
  }

  /**
   * R. Mancini and B. Carter, "Op Amps for Everyone", 5th edition, table 16.6, coefficients a and b
   * of 1 + a s + b s^2; four decimals.
   */
  @Test
  void agreesWithTheTableOfCoefficients() {
    double[][][] printed = {
      {{1.3617, 0.6180}},
      {{1.3397, 0.4889}, {0.7743, 0.3890}},
      {{1.2217, 0.3887}, {0.9686, 0.3505}, {0.5131, 0.2756}}
    };
    for (double[][] rows : printed) {
      List<Prototype.Pair> pairs = Prototype.pairs(FilterFamily.BESSEL, 2 * rows.length);
      for (int k = 0; k < rows.length; k++) {
        double f = pairs.get(k).ratio();
        // half a unit of the fourth decimal, and as much again for the print's own computation
        assertThat(1 / (f * pairs.get(k).q())).isCloseTo(rows[k][0], within(1e-4));
        assertThat(1 / (f * f)).isCloseTo(rows[k][1], within(1e-4));
      }
    }
  }

  /**
   * A note on a fourth-order filter prints capacitors 0.7298 and 0.6699, 1.0046 and 0.3872 for
   * equal resistors and a cutoff of 1: f0 = 1 / sqrt(C1 C2), Q = sqrt(C1 / C2) / 2.
   */
  @Test
  void agreesWithPrintedCapacitors() {
    double[][] printed = {{0.7298, 0.6699}, {1.0046, 0.3872}};
    List<Prototype.Pair> pairs = Prototype.pairs(FilterFamily.BESSEL, 4);
    for (int k = 0; k < 2; k++) {
      double c1 = printed[k][0];
      double c2 = printed[k][1];
      // half a unit of the fourth decimal is 1.3e-4 of the smallest capacitor; the Q of the second
      // stage is one unit of its own fourth digit low, 0.8054 for 0.8055
      assertThat(1 / Math.sqrt(c1 * c2))
          .isCloseTo(pairs.get(k).ratio(), within(1.5e-4 * pairs.get(k).ratio()));
      assertThat(Math.sqrt(c1 / c2) / 2)
          .isCloseTo(pairs.get(k).q(), within(2.5e-4 * pairs.get(k).q()));
    }
  }

  /**
   * The other printed family ("Analog and Digital Filter Design", table 3.4; a maker's note on
   * active low-pass filters prints the same): f0 up to 0.8 % off, Q right to a unit of its fourth
   * decimal. It deviates because its scale does not put -3 dB at the cutoff: its own values lose
   * 3.004, 3.062, 3.002 and 2.992 dB there.
   */
  @Test
  void theOtherPrintedFamilyIsScaledDifferently() {
    double[][][] printed = {
      {{1.2736, 0.5773}},
      {{1.4192, 0.5219}, {1.5912, 0.8055}},
      {{1.6060, 0.5103}, {1.6913, 0.6112}, {1.9071, 1.0234}},
      {{1.7838, 0.5060}, {1.8376, 0.5596}, {1.9591, 0.7109}, {2.1953, 1.2258}}
    };
    double[] lossDb = {3.004, 3.062, 3.002, 2.992};
    double[] scale = {1.0013, 0.9924, 1.0013, 1.0030};
    for (int i = 0; i < printed.length; i++) {
      List<Prototype.Pair> pairs = Prototype.pairs(FilterFamily.BESSEL, 2 * (i + 1));
      Complex all = Complex.ONE;
      for (int k = 0; k <= i; k++) {
        double[] row = printed[i][k];
        assertThat(row[1]).isCloseTo(pairs.get(k).q(), within(1.5e-4));
        // one factor for all stages of a filter: the family is consistent in itself
        assertThat(row[0] / pairs.get(k).ratio()).isCloseTo(scale[i], within(2e-4));
        all = all.times(new Section(false, row[0], row[1]).response(1));
      }
      // the figures are rounded to four decimals, the loss to three
      assertThat(-20 * Math.log10(all.magnitude())).isCloseTo(lossDb[i], within(1e-3));
    }
  }

  private static void holds(List<Prototype.Pair> pairs, double[][] expected) {
    assertThat(pairs)
        .hasSize(expected.length)
        .isSortedAccordingTo(Comparator.comparingDouble(Prototype.Pair::q));
    for (int k = 0; k < expected.length; k++) {
      assertThat(pairs.get(k).ratio()).isCloseTo(expected[k][0], within(ROUNDED));
      assertThat(pairs.get(k).q()).isCloseTo(expected[k][1], within(ROUNDED));
    }
  }
}
