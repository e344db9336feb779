package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.hipparchus.distribution.continuous.TDistribution;
import org.hipparchus.linear.RealMatrix;
import org.hipparchus.stat.regression.GLSMultipleLinearRegression;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TrendLineTest {

  private static final int TRIALS = 4000;

  /** NIST StRD Norris: line and standard errors are certified to ten significant digits. */
  @Test
  void withoutUncertaintiesGivesTheCertifiedLine() {
    StrdSet set = StrdSet.resource("nist-norris.txt");
    double[] x = set.column(0);
    assertCertified(TrendLine.of(x, set.column(1), new double[x.length]), set);
  }

  /**
   * The scatter of Norris is 0.88; uncertainties of 0.1 explain little of it, the common variance
   * takes the rest, and equal weights leave the certified line.
   */
  @Test
  void withEqualUncertaintiesBelowTheScatterGivesTheCertifiedLine() {
    StrdSet set = StrdSet.resource("nist-norris.txt");
    double[] u = new double[36];
    Arrays.fill(u, 0.1);
    TrendLine line = TrendLine.of(set.column(0), set.column(1), u);
    assertCertified(line, set);
    double residual = set.certified("residualStdDev");
    assertThat(line.commonVariance()).isCloseTo(residual * residual - 0.01, within(1e-9));
  }

  /** The line of a general library for the same variances, and what defines the common one. */
  @Test
  void weightsAreThoseOfAGeneralLibrary() {
    double[] x = {0, 1.1, 1.9, 3.2, 5, 5.4, 8};
    double[] y = {0.031, 0.044, 0.036, 0.05, 0.047, 0.063, 0.07};
    double[] u = {0.001, 0.004, 0.002, 0.001, 0.006, 0.002, 0.003};
    TrendLine line = TrendLine.of(x, y, u);
    assertThat(line.commonVariance()).isPositive();

    double[][] rows = Arrays.stream(x).mapToObj(one -> new double[] {one}).toArray(double[][]::new);
    double[][] variances = new double[x.length][x.length];
    for (int i = 0; i < x.length; i++) {
      variances[i][i] = u[i] * u[i] + line.commonVariance();
    }
    Gls gls = new Gls();
    gls.newSampleData(y, rows, variances);
    double[] beta = gls.estimateRegressionParameters();
    assertThat(line.at(0)).isCloseTo(beta[0], within(1e-12));
    assertThat(line.slope()).isCloseTo(beta[1], within(1e-12));
    RealMatrix covariance = gls.covariance();
    assertThat(line.slopeStdError()).isCloseTo(Math.sqrt(covariance.getEntry(1, 1)), within(1e-12));
    assertThat(Math.hypot(line.levelStdError(), line.slopeStdError() * line.centre()))
        .isCloseTo(Math.sqrt(covariance.getEntry(0, 0)), within(1e-12));

    double squares = 0;
    for (int i = 0; i < x.length; i++) {
      squares += Math.pow(y[i] - line.at(x[i]), 2) / variances[i][i];
    }
    assertThat(squares).isCloseTo(x.length - 2.0, within(1e-9));
  }

  /**
   * Berkey et al., Stat. Med. 14 (1995) 395-411, page 408: thirteen trials of a vaccine against
   * their latitude, by the empirical Bayes method, which has the same equation for the common
   * variance. Printed to four digits; the level is -0.6304 there and -0.6303 in later software.
   */
  @Test
  void givesThePublishedLineOfThirteenTrials() {
    // ill and well of the vaccinated, ill and well of the others, latitude in degrees
    double[][] trials = {
      {4, 119, 11, 128, 44},
      {6, 300, 29, 274, 55},
      {3, 228, 11, 209, 42},
      {62, 13536, 248, 12619, 52},
      {33, 5036, 47, 5761, 13},
      {180, 1361, 372, 1079, 44},
      {8, 2537, 10, 619, 19},
      {505, 87886, 499, 87892, 13},
      {29, 7470, 45, 7232, 27},
      {17, 1699, 65, 1600, 42},
      {186, 50448, 141, 27197, 18},
      {5, 2493, 3, 2338, 33},
      {27, 16886, 29, 17825, 33}
    };
    double vaccinated = Arrays.stream(trials).mapToDouble(t -> t[1] / t[0]).average().orElseThrow();
    double others = Arrays.stream(trials).mapToDouble(t -> t[3] / t[2]).average().orElseThrow();
    TrendLine line =
        TrendLine.of(
            Arrays.stream(trials).mapToDouble(t -> t[4]).toArray(),
            Arrays.stream(trials)
                .mapToDouble(t -> Math.log(t[0] / (t[0] + t[1]) / (t[2] / (t[2] + t[3]))))
                .toArray(),
            Arrays.stream(trials)
                .mapToDouble(t -> Math.sqrt(vaccinated / (t[0] + t[1]) + others / (t[2] + t[3])))
                .toArray());
    assertThat(line.at(33.46)).isCloseTo(-0.6303, within(0.0001));
    assertThat(line.slope()).isCloseTo(-0.0268, within(0.00005));
    assertThat(Math.hypot(line.levelStdError(), line.slopeStdError() * (33.46 - line.centre())))
        .isCloseTo(0.1591, within(0.00005));
    assertThat(line.slopeStdError()).isCloseTo(0.0110, within(0.00005));
    assertThat(line.commonVariance()).isCloseTo(0.157, within(0.0005));
  }

  /** By hand: four values at -3, -1, 1, 3 with u = 1 on y = 10 + 2 x, so that Sxx = 20. */
  @Test
  void luckyValuesAreNoMoreCertainThanTheirUncertainties() {
    TrendLine line =
        TrendLine.of(
            new double[] {-3, -1, 1, 3}, new double[] {4, 8, 12, 16}, new double[] {1, 1, 1, 1});
    assertThat(line.commonVariance()).isZero();
    assertThat(line.factor()).isCloseTo(1.95996, within(1e-5));
    assertThat(line.slopeHalfWidth()).isCloseTo(1.95996 / Math.sqrt(20), within(1e-5));
    assertThat(line.halfWidthAt(0)).isCloseTo(1.95996 / 2, within(1e-5));
    assertThat(line.isSignificant()).isTrue();
  }

  @Test
  void crossesWhereItsBandDoes() {
    TrendLine line =
        TrendLine.of(
            new double[] {0, 1, 2, 3, 4}, new double[] {1, 2.2, 2.9, 4.1, 5}, new double[5]);
    TrendLine.Crossing found = line.crossing(8).orElseThrow();
    assertThat(line.at(found.at())).isCloseTo(8, within(1e-12));
    assertThat(line.at(found.from()) + line.halfWidthAt(found.from())).isCloseTo(8, within(1e-9));
    assertThat(line.at(found.to()) - line.halfWidthAt(found.to())).isCloseTo(8, within(1e-9));
    assertThat(found.from()).isLessThan(found.at());
    assertThat(found.to()).isGreaterThan(found.at());
    TrendLine falling =
        TrendLine.of(
            new double[] {0, 1, 2, 3, 4}, new double[] {-1, -2.2, -2.9, -4.1, -5}, new double[5]);
    TrendLine.Crossing mirrored = falling.crossing(-8).orElseThrow();
    assertThat(mirrored.from()).isCloseTo(found.from(), within(1e-12));
    assertThat(mirrored.to()).isCloseTo(found.to(), within(1e-12));
  }

  @Test
  void valuesThatAreAllAlikeShowNoTrend() {
    TrendLine line = TrendLine.of(new double[] {0, 1, 2, 3}, new double[4], new double[4]);
    assertThat(line.isSignificant()).isFalse();
    assertThat(line.crossing(1)).isEmpty();
  }

  /**
   * A known line at random times, values with uneven uncertainties and a wandering of their own of
   * a given size. The counts of 4000 trials scatter by 0.35 points (one standard deviation).
   */
  @ParameterizedTest
  @CsvSource({"4, 1", "4, 3", "5, 1", "6, 2", "8, 1", "12, 1", "12, 3"})
  void theBandHoldsAKnownLine(int points, double wander) {
    Counts counts = simulate(points, wander, 0.4);
    assertThat(counts.held()).isBetween(0.92, 0.98);
    assertThat(counts.slopeHeld()).isBetween(0.92, 0.98);
    assertThat(simulate(points, wander, 0).significant()).isLessThan(0.07);
  }

  /** Without wandering the larger of two intervals is taken, and it holds more than it must. */
  @ParameterizedTest
  @CsvSource({"4", "6", "12"})
  void uncertaintiesAloneMakeNoFalseTrends(int points) {
    Counts counts = simulate(points, 0, 0);
    assertThat(counts.held()).isGreaterThan(0.94);
    assertThat(counts.significant()).isLessThan(0.06);
  }

  private record Counts(double held, double slopeHeld, double significant) {}

  private static Counts simulate(int points, double wander, double slope) {
    Random random = new Random(20261201);
    int held = 0;
    int slopeHeld = 0;
    int significant = 0;
    for (int trial = 0; trial < TRIALS; trial++) {
      double[] x = new double[points];
      double[] y = new double[points];
      double[] u = new double[points];
      for (int i = 0; i < points; i++) {
        x[i] = 10 * random.nextDouble();
        u[i] = 0.5 + random.nextDouble();
        y[i] = 3 + slope * x[i] + Math.hypot(u[i], wander) * random.nextGaussian();
      }
      TrendLine line = TrendLine.of(x, y, u);
      double at = 12 * random.nextDouble(); // also ahead of the last value
      held += Math.abs(line.at(at) - 3 - slope * at) <= line.halfWidthAt(at) ? 1 : 0;
      slopeHeld += Math.abs(line.slope() - slope) <= line.slopeHalfWidth() ? 1 : 0;
      significant += line.isSignificant() ? 1 : 0;
    }
    return new Counts(
        held / (double) TRIALS, slopeHeld / (double) TRIALS, significant / (double) TRIALS);
  }

  private static void assertCertified(TrendLine line, StrdSet set) {
    double students = new TDistribution(34).inverseCumulativeProbability(0.975);
    close(line.at(0), set.certified("intercept"));
    close(line.slope(), set.certified("slope"));
    close(line.slopeHalfWidth() / students, set.certified("slopeStdError"));
    close(line.halfWidthAt(0) / students, set.certified("interceptStdError"));
  }

  /** The data have three to four digits, the certified values follow from them to ten. */
  private static void close(double actual, double certified) {
    assertThat(actual).isCloseTo(certified, within(Math.abs(certified) * 1e-9));
  }

  /** Opens the covariance that the library works out for given variances. */
  private static final class Gls extends GLSMultipleLinearRegression {
    RealMatrix covariance() {
      return calculateBetaVariance();
    }
  }
}
