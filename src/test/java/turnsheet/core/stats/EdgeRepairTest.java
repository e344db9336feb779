package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Trains of one edge a second, with faults put in by hand. */
class EdgeRepairTest {

  private final List<String> edges = new ArrayList<>();
  private final List<String> gaps = new ArrayList<>();

  @Test
  void leavesAWholeTrainAlone() {
    EdgeRepair repair = feed(0, 1, 2, 3.05, 4);
    assertThat(edges).containsExactly("0.0", "1.0", "2.0", "3.05", "4.0");
    assertThat(repair.missing() + repair.extra()).isZero();
  }

  @Test
  void dropsAnExtraEdgeWhereverItLies() {
    for (double extra : new double[] {0.05, 0.3, 0.5, 0.7, 0.95}) {
      edges.clear();
      EdgeRepair repair = feed(0, 1, 2, 2 + extra, 3, 4);
      assertThat(edges).as("%s", extra).containsExactly("0.0", "1.0", "2.0", "3.0", "4.0");
      assertThat(repair.extra()).isEqualTo(1);
      assertThat(repair.missing()).isZero();
    }
  }

  @Test
  void dropsSeveralExtraEdgesInOnePeriod() {
    EdgeRepair repair = feed(0, 1, 1.3, 1.6, 2, 2.1, 2.2, 2.9, 3, 4);
    assertThat(edges).containsExactly("0.0", "1.0", "2.0", "3.0", "4.0");
    assertThat(repair.extra()).isEqualTo(5);
  }

  @Test
  void putsMissingEdgesEvenlyAndMarksThem() {
    EdgeRepair repair = feed(0, 1, 4, 5);
    assertThat(edges).containsExactly("0.0", "1.0", "2.0?", "3.0?", "4.0", "5.0");
    assertThat(repair.missing()).isEqualTo(2);
    assertThat(gaps).containsExactly("1.0 to 4.0: 2");
  }

  @Test
  void followsARunUpWithoutRepairs() {
    // 3 % faster with every period: five times as fast after 54
    List<Double> times = new ArrayList<>();
    double t = 0;
    double period = 1;
    for (int i = 0; i < 54; i++) {
      times.add(t);
      t += period;
      period *= 0.97;
    }
    EdgeRepair repair = feed(times.stream().mapToDouble(x -> x).toArray());
    assertThat(repair.missing() + repair.extra()).isZero();
    assertThat(edges).hasSize(54);
  }

  private EdgeRepair feed(double... times) {
    EdgeRepair repair =
        new EdgeRepair(
            1,
            (seconds, real) -> edges.add(seconds + (real ? "" : "?")),
            (from, to, missing) -> gaps.add(from + " to " + to + ": " + missing));
    for (double time : times) {
      repair.edge(time);
    }
    repair.finish();
    return repair;
  }
}
