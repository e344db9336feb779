package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class PeriodHistogramTest {

  @Test
  void putsValuesOnAGridIntoTheMiddlesOfClasses() {
    PeriodHistogram histogram = new PeriodHistogram(0.5, 10);
    for (int i = 0; i < 300; i++) {
      histogram.add(9.5 + 0.5 * (i % 3));
    }
    PeriodHistogram.Classes classes = histogram.classes(100);
    assertThat(classes.counts()).containsExactly(100, 100, 100);
    assertThat(classes.from()).isCloseTo(9.25, within(1e-12));
    assertThat(classes.width()).isCloseTo(0.5, within(1e-12));
  }

  @Test
  void makesRoomForValuesFarOutAndLosesNone() {
    PeriodHistogram histogram = new PeriodHistogram(1e-6, 1);
    double[] values = {1, 1.0000005, 5, 0.2, 1000, 0.9999};
    for (double value : values) {
      histogram.add(value);
    }
    PeriodHistogram.Classes classes = histogram.classes(50);
    assertThat(Arrays.stream(classes.counts()).sum()).isEqualTo(values.length);
    assertThat(classes.counts().length).isBetween(2, 50);
    assertThat(classes.from()).isLessThanOrEqualTo(0.2);
    assertThat(classes.from() + classes.counts().length * classes.width()).isGreaterThan(1000);
  }

  @Test
  void isEmptyBeforeTheFirstValue() {
    assertThat(new PeriodHistogram(1, 1).classes(10).counts()).isEmpty();
  }
}
