package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.hipparchus.stat.descriptive.rank.Percentile;
import org.junit.jupiter.api.Test;

class QuantilesTest {

  /** By hand from the definition: place (n - 1) p + 1 among the sorted values. */
  @Test
  void interpolatesBetweenOrderStatistics() {
    Quantiles four = new Quantiles(new double[] {4, 1, 3, 2});
    assertThat(four.at(0.25)).isEqualTo(1.75);
    assertThat(four.median()).isEqualTo(2.5);
    assertThat(four.at(0.75)).isEqualTo(3.25);
    Quantiles five = new Quantiles(new double[] {10, 20, 30, 40, 50});
    assertThat(five.at(0.25)).isEqualTo(20);
    assertThat(five.at(0.75)).isEqualTo(40);
    assertThat(new Quantiles(new double[] {7}).at(0.75)).isEqualTo(7);
  }

  /** The same definition in a general library, under the name R_7. */
  @Test
  void agreesWithAGeneralLibrary() {
    Random random = new Random(7);
    Percentile library = new Percentile().withEstimationType(Percentile.EstimationType.R_7);
    for (int n = 1; n < 60; n++) {
      double[] values = random.doubles(n).toArray();
      Quantiles ours = new Quantiles(values);
      for (double share : new double[] {0.05, 0.25, 0.5, 0.75, 0.95}) {
        assertThat(ours.at(share)).isCloseTo(library.evaluate(values, 100 * share), within(1e-14));
      }
    }
  }
}
