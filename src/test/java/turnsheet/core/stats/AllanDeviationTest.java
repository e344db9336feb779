package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** Tables 29 to 32 of NIST Special Publication 1065 (2008), to the printed digits. */
class AllanDeviationTest {

  private static final double[] NINE = {892, 809, 823, 798, 671, 644, 883, 903, 677};

  @Test
  void agreesWithTheThousandPointSuite() {
    double[] x = AllanDeviation.phaseOf(suite(), 1);
    int[] m = {1, 10, 100};
    double[] plain = {2.922319e-1, 9.965736e-2, 3.897804e-2};
    double[] overlapping = {2.922319e-1, 9.159953e-2, 3.241343e-2};
    double[] modified = {2.922319e-1, 6.172376e-2, 2.170921e-2};
    double[] time = {1.687202e-1, 3.563623e-1, 1.253382};
    // the last one is printed truncated: 3.9108606e-2 recomputed
    double[] hadamard = {2.943883e-1, 1.052754e-1, 3.910861e-2};
    double[] overlappingHadamard = {2.943883e-1, 9.581083e-2, 3.237638e-2};
    for (int i = 0; i < m.length; i++) {
      printed(AllanDeviation.plain(x, 1, m[i]), plain[i]);
      printed(AllanDeviation.overlapping(x, 1, m[i]), overlapping[i]);
      printed(AllanDeviation.modified(x, 1, m[i]), modified[i]);
      printed(AllanDeviation.time(x, 1, m[i]), time[i]);
      printed(AllanDeviation.hadamard(x, 1, m[i]), hadamard[i]);
      printed(AllanDeviation.overlappingHadamard(x, 1, m[i]), overlappingHadamard[i]);
    }
  }

  /** Table 31: maximum, minimum, mean, median, deviation, slope and intercept of the suite. */
  @Test
  void agreesWithTheBasicStatisticsOfTheSuite() {
    double[] y = suite();
    Moments moments = new Moments();
    double[] index = new double[y.length];
    for (int i = 0; i < y.length; i++) {
      moments.add(y[i]);
      index[i] = i + 1;
    }
    printed(moments.max(), 9.957453e-1);
    printed(moments.min(), 1.371760e-3);
    printed(moments.mean(), 4.897745e-1);
    printed(moments.sampleStdDev(), 2.884664e-1);
    printed(new Quantiles(y).median(), 4.798849e-1);
    LineFit fit = LineFit.of(index, y);
    printed(fit.slope(), 6.490910e-6);
    printed(fit.intercept(), 4.865258e-1);
  }

  @Test
  void agreesWithTheNineValues() {
    double[] x = AllanDeviation.phaseOf(NINE, 1);
    printed(AllanDeviation.plain(x, 1, 1), 91.22945);
    printed(AllanDeviation.plain(x, 1, 2), 115.8082);
    printed(AllanDeviation.overlapping(x, 1, 2), 85.95287);
    printed(AllanDeviation.modified(x, 1, 2), 74.78849);
    printed(AllanDeviation.time(x, 1, 1), 52.67135);
    printed(AllanDeviation.time(x, 1, 2), 86.35831);
    printed(AllanDeviation.hadamard(x, 1, 1), 70.80607);
    printed(AllanDeviation.hadamard(x, 1, 2), 116.7980);
    printed(AllanDeviation.overlappingHadamard(x, 1, 2), 85.61487);
  }

  @Test
  void followsTheClosedFormOfSinusoidalModulation() {
    // ADEV = peak sin^2(pi f tau) / (pi f tau); the sum over a whole number of periods of the
    // modulation is exact, so rounding alone is left
    double peak = 1e-3;
    double rate = 4;
    double tau0 = 1.0 / 400;
    double[] x = new double[400 * 100 + 1];
    for (int i = 0; i < x.length; i++) {
      x[i] = -peak * Math.cos(2 * Math.PI * rate * i * tau0) / (2 * Math.PI * rate);
    }
    for (int m : new int[] {1, 5, 20, 30, 46, 75}) {
      double a = Math.PI * rate * m * tau0;
      double expected = peak * Math.sin(a) * Math.sin(a) / a;
      // the overlapping sum ends 2m short of whole periods: relative 1 / (periods of the record)
      assertThat(AllanDeviation.overlapping(x, tau0, m))
          .isCloseTo(expected, within(expected / 400));
    }
  }

  @Test
  void saysNothingOfTooFewPhases() {
    double[] x = {0, 1, 2};
    assertThat(AllanDeviation.overlapping(x, 1, 2)).isNaN();
    assertThat(AllanDeviation.modified(x, 1, 2)).isNaN();
    assertThat(AllanDeviation.overlappingHadamard(x, 1, 1)).isNaN();
  }

  // half a unit of the seventh digit, the last one printed; one unit covers truncated prints
  private static void printed(double actual, double printed) {
    double unit = Math.pow(10, Math.floor(Math.log10(printed)) - 6);
    assertThat(actual).isCloseTo(printed, within(0.55 * unit));
  }

  /** SP 1065 section 12.4: n' = 16807 n mod 2147483647, first value 1234567890. */
  private static double[] suite() {
    double[] y = new double[1000];
    long n = 1234567890;
    for (int i = 0; i < y.length; i++) {
      y[i] = n / 2147483647.0;
      n = 16807 * n % 2147483647;
    }
    return y;
  }
}
