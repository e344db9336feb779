package turnsheet.reading.chart;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;

class DateTicksTest {

  private static final double START = LocalDate.of(2025, 11, 28).toEpochDay();

  @Test
  void daysAreWrittenAsThePageWritesThem() {
    assertThat(labels(2, Locale.UK)).containsExactly("2025-11-28", "2025-11-29", "2025-11-30");
    assertThat(labels(2, Locale.GERMANY)).containsExactly("28.11.2025", "29.11.2025", "30.11.2025");
  }

  @Test
  void monthsAndYearsToo() {
    assertThat(labels(150, Locale.UK))
        .containsExactly("2025-12", "2026-01", "2026-02", "2026-03", "2026-04");
    assertThat(labels(150, Locale.GERMANY))
        .containsExactly("Dez. 2025", "Jan. 2026", "Feb. 2026", "M\u00e4rz 2026", "Apr. 2026");
    assertThat(labels(1500, Locale.GERMANY))
        .containsExactly("2026", "2027", "2028", "2029", "2030");
  }

  /** Marks stand where their words say, whatever the words. */
  @Test
  void theLanguageMovesNoMark() {
    for (int span : new int[] {2, 20, 100, 700, 3000, 20_000}) {
      assertThat(DateTicks.between(START, START + span, Locale.GERMANY))
          .extracting(Axis.Tick::value)
          .isEqualTo(
              DateTicks.between(START, START + span, Locale.UK).stream()
                  .map(Axis.Tick::value)
                  .toList());
    }
  }

  private static List<String> labels(int span, Locale locale) {
    return DateTicks.between(START, START + span, locale).stream().map(Axis.Tick::text).toList();
  }
}
