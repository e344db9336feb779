package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class RegularGapsTest {

  @Test
  void theMarkOfAWheelIsFoundAmongLostEdges() {
    RegularGaps gaps = new RegularGaps();
    for (int turn = 0; turn < 50; turn++) {
      gaps.gap(17 + 60L * turn, 2);
      if (turn % 7 == 3) {
        gaps.gap(31 + 60L * turn, 1);
      }
    }
    assertThat(gaps.mark(3000)).isEqualTo(new RegularGaps.Mark(60, 2, 50));
  }

  @Test
  void lostEdgesAreNoMark() {
    RegularGaps gaps = new RegularGaps();
    gaps.gap(10, 1);
    gaps.gap(23, 1);
    gaps.gap(71, 1);
    gaps.gap(111, 1);
    gaps.gap(112, 3);
    assertThat(gaps.mark(3000).count()).isZero();
    // at one distance, but only in the first tenth
    RegularGaps few = new RegularGaps();
    for (int turn = 0; turn < 5; turn++) {
      few.gap(60L * turn, 1);
    }
    assertThat(few.mark(3000).count()).isZero();
  }
}
