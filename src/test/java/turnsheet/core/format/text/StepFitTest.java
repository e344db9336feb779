package turnsheet.core.format.text;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The step behind printed times: exact where the clock's rate is a round number. */
class StepFitTest {

  @ParameterizedTest
  @CsvSource({
    "44100, 7",
    "48000, 6",
    "96000, 8",
    "1000, 3",
    "12e6, 9",
    "1e6, 6",
    "44100, 6",
    "200000, 5"
  })
  void findsRoundRatesBehindRoundedTimes(double rateHertz, int places) {
    StepFit fit = fit(rateHertz, 0.0137, 8000, "%." + places + "f");
    // one rounding of the reciprocal
    assertThat(fit.rate() / rateHertz).isCloseTo(1, within(3e-16));
  }

  @Test
  void findsRoundRatesBehindSignificantDigits() {
    StepFit fit = fit(44100, 0, 8000, "%.6g");
    assertThat(fit.rate() / 44100).isCloseTo(1, within(3e-16));
  }

  @Test
  void staysWithinItsUncertaintyForAnOddRate() {
    StepFit fit = fit(44123.4567891, 0, 8000, "%.7f");
    assertThat(Math.abs(fit.step() * 44123.4567891 - 1)).isLessThan(2 * fit.relativeUncertainty());
    // a digit of 1e-7 s over 8000 steps of 2.27e-5 s leaves 5e-7
    assertThat(fit.relativeUncertainty()).isLessThan(1e-6);
  }

  private static StepFit fit(double rateHertz, double start, int count, String format) {
    List<Row> rows = new ArrayList<>();
    double[] times = new double[count];
    for (int i = 0; i < count; i++) {
      String text = String.format(Locale.ROOT, format, start + i / rateHertz);
      rows.add(new Row(i + 1, List.of(text)));
      times[i] = Double.parseDouble(text);
    }
    return StepFit.of(times, Digits.of(rows, 0, (byte) '.'));
  }
}
