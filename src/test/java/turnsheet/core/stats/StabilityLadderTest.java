package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class StabilityLadderTest {

  /** Against the estimator that is checked with the tables of NIST SP 1065. */
  @Test
  void agreesWithTheEstimatorThatKeepsEverything() {
    Random random = new Random(11);
    double[] times = new double[20_001];
    StabilityLadder ladder = new StabilityLadder();
    for (int i = 0; i < times.length; i++) {
      times[i] = (i == 0 ? 0 : times[i - 1]) + 1 + 0.01 * random.nextGaussian();
      ladder.edge(times[i], true);
    }
    double step = (times[20_000] - times[0]) / 20_000;
    List<StabilityLadder.Rung> rungs = ladder.rungs();
    assertThat(rungs).hasSizeGreaterThan(9);
    for (int level = 0; level < 10; level++) {
      int m = 1 << level;
      StabilityLadder.Rung rung = rungs.get(level);
      double all = AllanDeviation.overlapping(times, step, m);
      assertThat(rung.tauSeconds()).isCloseTo(m * step, within(1e-9));
      // beyond 16 steps a sixteenth of the starts: neighbours differ little, 2 % at 512 steps
      assertThat(rung.deviation()).isCloseTo(all, within(m <= 16 ? 1e-12 : 0.02 * all));
    }
  }

  @Test
  void saysNothingOfTimesThatHardlyFit() {
    StabilityLadder ladder = new StabilityLadder();
    for (int i = 0; i < 20; i++) {
      ladder.edge(i, true);
    }
    assertThat(ladder.rungs())
        .extracting(StabilityLadder.Rung::tauSeconds)
        .containsExactly(1.0, 2.0, 4.0);
    assertThat(new StabilityLadder().rungs()).isEmpty();
  }
}
