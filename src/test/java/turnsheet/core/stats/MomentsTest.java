package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** NIST Statistical Reference Datasets: the certified values stand in the files. */
class MomentsTest {

  // certified to 15 digits; ten are what the data's own decimal digits leave in double precision
  private static final double TEN_DIGITS = 1e-10;

  @ParameterizedTest
  @ValueSource(strings = {"nist-mavro.txt", "nist-michelso.txt"})
  void givesTheCertifiedValuesOfMeasuredData(String name) {
    StrdSet set = StrdSet.resource(name);
    double[] values = set.column(0);
    check(
        values,
        set.certified("mean"),
        set.certified("sampleStdDev"),
        set.certified("lagOneAutocorrelation"),
        TEN_DIGITS);
  }

  /** NumAcc1 to 4 are made by a rule that is part of their description. */
  @Test
  void givesTheCertifiedValuesOfTheAccuracySets() {
    check(new double[] {10000001, 10000003, 10000002}, 10000002, 1, -0.5, TEN_DIGITS);
    check(alternating(1.2, 1.1, 1.3), 1.2, 0.1, -0.999, TEN_DIGITS);
    // the data as stored doubles have a deviation of 0.100000000034925 and 0.100000000558794
    // (exact arithmetic): 9 and 8 digits is what the storage leaves
    check(alternating(1000000.2, 1000000.1, 1000000.3), 1000000.2, 0.1, -0.999, 1e-9);
    check(alternating(10000000.2, 10000000.1, 10000000.3), 10000000.2, 0.1, -0.999, 1e-8);
    assertThat(of(alternating(10000000.2, 10000000.1, 10000000.3)).sampleStdDev())
        .isCloseTo(0.100000000558794, within(1e-14));
  }

  /** The sets that are too long to be written here; the numbers end each file, one a line. */
  @ParameterizedTest
  @CsvSource({
    "Lew, 200, -177.435, 277.332168044316, -0.307304800605679",
    "Michelso, 100, 299.8524, 0.0790105478190518, 0.535199668621283",
    "NumAcc1, 3, 10000002, 1, -0.5",
    "NumAcc2, 1001, 1.2, 0.1, -0.999",
    "NumAcc4, 1001, 10000000.2, 0.1, -0.999",
    "PiDigits, 5000, 4.5348, 2.86733906028871, -0.00355099287237972"
  })
  void givesTheCertifiedValuesOfTheReferenceFiles(
      String name, int count, double mean, double deviation, double lagOne) throws IOException {
    Path folder = Path.of(System.getProperty("turnsheet.corpus", "absent"), "ref-univariate");
    Path file = folder.resolve(name + ".txt");
    if (!Files.exists(file)) {
      System.out.println("skipped: no reference file " + name);
    }
    assumeTrue(Files.exists(file));
    double[] all = StrdSet.of(Files.readAllLines(file)).column(0);
    double[] values = Arrays.copyOfRange(all, all.length - count, all.length);
    check(values, mean, deviation, lagOne, name.equals("NumAcc4") ? 1e-8 : TEN_DIGITS);
  }

  /** A first value far out must not cost digits: against two passes with exact differences. */
  @Test
  void keepsItsDigitsWhenTheFirstValueLiesFarOut() {
    Random random = new Random(7);
    double[] values = new double[20_000];
    values[0] = 1e6;
    double sum = values[0];
    for (int i = 1; i < values.length; i++) {
      values[i] = random.nextInt(1024) / 1024.0;
      sum += values[i];
    }
    double mean = sum / values.length;
    double squares = 0;
    for (double v : values) {
      squares += (v - mean) * (v - mean);
    }
    assertThat(of(values).mean()).isCloseTo(mean, within(1e-13 * mean));
    double expected = Math.sqrt(squares / (values.length - 1));
    assertThat(of(values).sampleStdDev()).isCloseTo(expected, within(1e-12 * expected));
  }

  @Test
  void tellsExtremesAndTheRootMeanSquare() {
    Moments m = of(3, -4, 0, 5);
    assertThat(m.min()).isEqualTo(-4);
    assertThat(m.max()).isEqualTo(5);
    assertThat(m.rootMeanSquare()).isCloseTo(Math.sqrt(12.5), within(1e-15));
  }

  @Test
  void refusesToSpeakOfTooFewValues() {
    assertThatThrownBy(() -> new Moments().mean()).isInstanceOf(IllegalStateException.class);
    assertThatThrownBy(() -> of(1).sampleStdDev()).isInstanceOf(IllegalStateException.class);
  }

  private static void check(
      double[] values, double mean, double deviation, double lagOne, double relative) {
    Moments moments = of(values);
    assertThat(moments.mean()).isCloseTo(mean, within(Math.abs(mean) * TEN_DIGITS));
    assertThat(moments.sampleStdDev()).isCloseTo(deviation, within(deviation * relative));
    assertThat(Autocorrelation.lagOne(values))
        .isCloseTo(lagOne, within(Math.abs(lagOne) * relative));
  }

  private static Moments of(double... values) {
    Moments moments = new Moments();
    for (double value : values) {
      moments.add(value);
    }
    return moments;
  }

  private static double[] alternating(double first, double low, double high) {
    double[] values = new double[1001];
    values[0] = first;
    for (int i = 1; i < values.length; i++) {
      values[i] = i % 2 == 1 ? low : high;
    }
    return values;
  }
}
