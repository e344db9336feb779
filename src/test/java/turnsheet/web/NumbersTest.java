package turnsheet.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.measure.Figure;
import turnsheet.web.Numbers.Sign;

class NumbersTest {
  private final Numbers english = Numbers.in(Locale.UK);

  /**
   * JCGM 100:2008 (GUM). The first row is the example of 7.2.6 (10.05762 ohm with 27 milliohm is
   * given as 10.058 ohm; value from memory), the second that of 7.2.2 (100.02147 g with 0.35 mg;
   * value from memory); the rest follow from the rule: two digits of U, the value to the same
   * place.
   */
  @ParameterizedTest
  @CsvSource({
    "10.05762,  0.027,    10.058,    0.027",
    "100.02147, 0.00035,  100.02147, 0.00035",
    "0.06713,   0.00214,  0.0671,    0.0021",
    "0.067,     0.002,    0.0670,    0.0020",
    "0.3749,    0.0996,   0.37,      0.10", // U carries into the next place, so does the value's
    // end
    "0.3749,    0.0994,   0.375,     0.099",
    "12345,     996,      12300,     1000", // "1.0" thousand: the value ends at hundreds
    "12350,     996,      12400,     1000", // a half goes away from zero
    "2500.04,   1.25,     2500.0,    1.3",
    "0.003,     0.12,     0.00,      0.12",
    "3150.0123456, 0.0000012, 3150.0123456, 0.0000012"
  })
  void valueEndsWhereItsUncertaintyEnds(double value, double u, String shown, String shownU) {
    Shown result = english.show(value, u, "%", Sign.PLAIN);
    assertThat(result.value()).isEqualTo(shown);
    assertThat(result.uncertainty()).isEqualTo(shownU);
  }

  @ParameterizedTest
  @CsvSource({
    "0.37, +0.370",
    "-0.37, \u22120.370",
    "0, 0.000",
    "0.0004, 0.000",
    "-0.0004, 0.000",
  })
  void signIsShownWhereItMattersAndNeverOnZero(double value, String shown) {
    assertThat(english.show(value, 0.012, "%", Sign.SHOWN).value()).isEqualTo(shown);
  }

  @Test
  void negativeValuesCarryTheMinusSignEvenWherePlusIsNotShown() {
    assertThat(english.show(-1.5, 0.12, "dB", Sign.PLAIN).value()).isEqualTo("\u22121.50");
  }

  @Test
  void withoutUncertaintyThreeDigitsStay() {
    assertThat(english.show(0.066666, null, "%", Sign.PLAIN).value()).isEqualTo("0.0667");
    assertThat(english.show(2499.96, null, "µs", Sign.PLAIN).value()).isEqualTo("2500");
    assertThat(english.show(0, null, "%", Sign.PLAIN).value()).isEqualTo("0");
  }

  @Test
  void zeroUncertaintyIsNoGroundForRoundingEverythingAway() {
    Shown shown = english.show(0.0671, 0.0, "%", Sign.PLAIN);
    assertThat(shown.value()).isEqualTo("0.0671");
    assertThat(shown.uncertainty()).isEqualTo("0");
  }

  @Test
  void theDecimalSignFollowsTheLanguage() {
    Shown german = Numbers.in(Locale.GERMANY).show(0.067, 0.002, "%", Sign.PLAIN);
    assertThat(german.whole()).isEqualTo("0");
    assertThat(german.fraction()).isEqualTo(",0670");
    assertThat(german.uncertainty()).isEqualTo("0,0020");
    assertThat(Numbers.in(Locale.GERMANY).plain(19.05)).isEqualTo("19,05");
  }

  @Test
  void textPutsANarrowNoBreakSpaceBeforeTheUnit() {
    assertThat(english.show(0.067, 0.0021, "%", Sign.PLAIN).text())
        .isEqualTo("(0.0670\u202f±\u202f0.0021)\u202f%");
    assertThat(english.show(0.067, null, "%", Sign.PLAIN).text()).isEqualTo("0.067\u202f%");
    assertThat(english.show(12, null, "", Sign.PLAIN).text()).isEqualTo("12.0");
  }

  @Test
  void absentFigureIsADashWithItsReason() {
    Shown shown = english.show(Figure.absent("a tone has no edges"), "µs", Sign.PLAIN);
    assertThat(shown.text()).isEqualTo("\u2013");
    assertThat(shown.why()).isEqualTo("a tone has no edges");
  }

  @Test
  void enteredNumbersKeepTheirDigits() {
    assertThat(english.plain(0.06)).isEqualTo("0.06");
    assertThat(english.plain(3150)).isEqualTo("3150");
    assertThat(english.plain(-0.5)).isEqualTo("\u22120.5");
    assertThat(english.fixed(3150, 2)).isEqualTo("3150.00");
  }

  @Test
  void refusesWhatIsNoNumber() {
    assertThatThrownBy(() -> english.show(Double.NaN, null, "%", Sign.PLAIN))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> english.show(1, -0.1, "%", Sign.PLAIN))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
