package turnsheet.core.format.text;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Numbers in text against the JDK's correctly rounded reading. */
class DecimalsTest {

  @ParameterizedTest
  @ValueSource(
      strings = {
        "0",
        "-0",
        "+1",
        "1.",
        ".5",
        "-.5",
        "00012",
        "1e3",
        "1E+3",
        "1e-3",
        "-249.982E-06",
        "+2.499750018E+00",
        "9007199254740993",
        "0.1",
        "123456789012345678901234567890",
        "1e22",
        "1e23",
        "1e-22",
        "1e-23",
        "8.41e21",
        "2.2250738585072011e-308",
        "4.9e-324",
        "1e-400",
        "0.000000000000000000000000000000000001",
        "1.7976931348623157e308",
        "-2.449293598294706513e-15",
        "0.57489047319390363"
      })
  void readsAsTheJdkDoes(String text) {
    assertThat(Decimals.parse(text, (byte) '.')).isEqualTo(Double.parseDouble(text));
    assertThat(Decimals.parse(" \"" + text + "\"\t", (byte) '.'))
        .isEqualTo(Double.parseDouble(text));
    assertThat(Decimals.parse(text.replace('.', ','), (byte) ','))
        .isEqualTo(Double.parseDouble(text));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        " ",
        "-",
        "+",
        ".",
        "e5",
        "1e",
        "1e+",
        "1e1.5",
        "1.2.3",
        "1,5",
        "0x10",
        "1f",
        "1d",
        "NaN",
        "inf",
        "-Infinity",
        "1e999",
        "1e9999999999",
        "1 2",
        "--1",
        "\"",
        "\"\"",
        "１"
      })
  void refusesWhatIsNoFiniteNumber(String text) {
    assertThat(Decimals.parse(text, (byte) '.')).isNaN();
  }

  @Test
  void agreesWithTheJdkOnRandomNumbers() {
    Random random = new Random(7);
    for (int i = 0; i < 200_000; i++) {
      double value =
          i % 2 == 0
              ? Double.longBitsToDouble(random.nextLong())
              : random.nextGaussian() * Math.pow(10, random.nextInt(12) - 6);
      if (Double.isFinite(value)) {
        String text =
            switch (i % 3) {
              case 0 -> Double.toString(value);
              case 1 -> String.format(java.util.Locale.ROOT, "%.6e", value);
              default -> String.format(java.util.Locale.ROOT, "%.9g", value);
            };
        assertThat(Decimals.parse(text, (byte) '.')).isEqualTo(Double.parseDouble(text));
      }
    }
  }

  @Test
  void countsThePlacesOfTheLastDigit() {
    assertThat(Decimals.places("0.0010", (byte) '.')).isEqualTo(4);
    assertThat(Decimals.places("-998.000E-06", (byte) '.')).isEqualTo(9);
    assertThat(Decimals.places("1e3", (byte) '.')).isEqualTo(-3);
    assertThat(Decimals.places("625", (byte) '.')).isZero();
  }
}
