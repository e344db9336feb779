package turnsheet.core.format.text;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognised.Channel;
import turnsheet.core.format.api.Recognised.Guess;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/** Tables of numbers; the expectations follow from the text of each case. */
@SuppressWarnings("StringConcatToTextBlock") // line ends are part of the cases
class TableFormatTest {

  private static final double[] VALUES = {0.5, -0.25, 1e-3, 2, -3.5, 0.125, 7, -8, 9.75, 10};

  /** Ten rows of time and value, 20 us apart, from -40 us on. */
  private static String waveform(String separator, String decimalMark, String lineEnd) {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < VALUES.length; i++) {
      String row = String.format(Locale.ROOT, "%.9f;%s", (i - 2) * 20e-6, VALUES[i]);
      text.append(row.replace(".", decimalMark).replace(";", separator)).append(lineEnd);
    }
    return text.toString();
  }

  private static String column(String... numbers) {
    return String.join("\n", numbers) + "\n";
  }

  private static List<String> subjects(Recognised recognised) {
    return recognised.guesses().stream().map(Guess::subject).toList();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "comma | time,volt\\n | , | . | \\n",
        "semicolon, decimal comma | Zeit [s];Spannung [V]\\n | ; | , | \\r\\n",
        "tab, decimal comma | t\\tu\\n | \\t | , | \\n",
        "blanks | # t [s] u [V]\\n | `  ` | . | \\n",
        "blanks, decimal comma | t u\\n | ` ` | , | \\r",
        "semicolon, decimal point | time;ch1\\n | ; | . | \\n",
        "byte order mark | \\ufefftime,volt\\n | , | . | \\r\\n",
        "comma and blank | time, volt\\n | `, ` | . | \\n",
        "no header | `` | , | . | \\n",
        "quoted header | \"time\",\"a, b\"\\n | , | . | \\n",
        "line end in the header | \"time\\n(s)\",\"volt\"\\n | , | . | \\n",
        "comments | # made by a bench\\n% second\\n// third\\ntime,volt\\n | , | . | \\n",
        "preamble | Model;X1\\nMemory Length;10\\n\\nSource;CH1\\ntime;volt\\n | ; | . | \\n",
        "units row | x-axis,1\\nsecond,Volt\\n | , | . | \\n",
        "blank lines | time,volt\\n\\n\\n | , | . | \\n\\n"
      })
  void readsWaveformsHoweverTheyAreWritten(
      String name, String head, String separator, String mark, String lineEnd)
      throws RejectedException {
    String text =
        unescaped(head == null ? "" : head)
            + waveform(unescaped(separator), mark, unescaped(lineEnd));
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.contents()).as(name).isEqualTo(Contents.WAVEFORM);
    assertThat(recognised.sampleRateHertz()).isEqualTo(50_000);
    assertThat(recognised.channels()).hasSize(1);
    assertThat(recognised.warnings()).isEmpty();
    var samples = ReadBack.samples(TextSources.of(text), ReadOptions.none());
    assertThat(samples.values()).containsExactly(VALUES);
    assertThat(samples.rateHertz()).isEqualTo(50_000);
    assertThat(samples.warnings()).isEmpty();
  }

  private static String unescaped(String text) {
    return text.replace("\\n", "\n")
        .replace("\\r", "\r")
        .replace("\\t", "\t")
        .replace("\\ufeff", "\ufeff");
  }

  @Test
  void readsQuotedNumbersTrailingSeparatorsAndPlusSigns() throws RejectedException {
    String rows =
        "\"0,000000\",\"+1,5E+00\",\n\"0,000020\",\"-2,5\",\n"
            + "\"0,000040\",\"1,0e-3\",\n".repeat(1);
    StringBuilder text = new StringBuilder(rows);
    for (int i = 3; i < 10; i++) {
      text.append(String.format(Locale.ROOT, "\"0,%06d\" , \"0,5\",\n", i * 20));
    }
    var samples = ReadBack.samples(TextSources.of(text.toString()), ReadOptions.none());
    assertThat(samples.values()).startsWith(1.5, -2.5, 1e-3, 0.5).hasSize(10);
  }

  @Test
  void namesColumnsAndUnitsAndGuessesTheFirst() throws RejectedException {
    String text =
        "x-axis,1,2\nsecond,Volt,Volt\n"
            + waveform(",", ".", "\n").replaceAll("(?m)$", ",4").replace("\n,4", "\n").strip();
    text = text.endsWith(",4") ? text : text + ",4";
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.channels())
        .containsExactly(new Channel("1", "Volt"), new Channel("2", "Volt"));
    assertThat(recognised.guesses())
        .containsExactly(new Guess("channel", "1: the first of 2 columns"));
    assertThat(ReadBack.samples(TextSources.of(text), ReadOptions.none().withChannel(2)).values())
        .containsOnly(4);
    assertThat(ReadBack.refused(TextSources.of(text), ReadOptions.none().withChannel(3)).code())
        .isEqualTo("noSuchChannel");
  }

  @Test
  void readsLatin1Names() {
    byte[] bytes = ("t [\u00b5s];Gr\u00f6\u00dfe\n" + "").getBytes(StandardCharsets.ISO_8859_1);
    byte[] rows =
        "0;1\n20;2\n40;3\n60;4\n80;3\n100;2\n120;1\n140;0\n".getBytes(StandardCharsets.UTF_8);
    byte[] all = new byte[bytes.length + rows.length];
    System.arraycopy(bytes, 0, all, 0, bytes.length);
    System.arraycopy(rows, 0, all, bytes.length, rows.length);
    Recognised recognised = ReadBack.accepted(TextSources.of(all), ReadOptions.none());
    assertThat(recognised.channels()).containsExactly(new Channel("Gr\u00f6\u00dfe", null));
    assertThat(recognised.sampleRateHertz()).isEqualTo(50_000);
    assertThat(recognised.guesses()).isEmpty();
  }

  @ParameterizedTest
  @CsvSource({
    "time_s, 1",
    "t [s], 1",
    "time (seconds), 1",
    "t_ms, 1e-3",
    "time [ms], 1e-3",
    "t/ms, 1e-3",
    "ms, 1e-3",
    "time_us, 1e-6",
    "t [\u00b5s], 1e-6",
    "t [\u03bcs], 1e-6",
    "time in us, 1e-6",
    "timeUs, 1e-6",
    "micros, 1e-6",
    "t (ns), 1e-9",
    "time_ns, 1e-9"
  })
  void readsTheUnitOfTimesFromTheHeader(String header, double unit) throws RejectedException {
    String text = column(header, "0", "1250", "1875", "2500", "3125", "3750", "4375", "5000");
    assertThat(ReadBack.accepted(text).guesses()).isEmpty();
    var edges = ReadBack.edges(TextSources.of(text), ReadOptions.none());
    assertThat(edges.times()[1]).isEqualTo(new TickScale(unit).seconds(1250));
    assertThat(edges.stepSeconds()).isEqualTo(new TickScale(unit).seconds(1));
    assertThat(edges.rising()).containsOnly(true);
  }

  @ParameterizedTest
  @CsvSource({
    "625 626 624 625 627 623 625 625, 1e-6",
    "2500 2501 2499 2500 2500 2502 2498 2500, 1e-6",
    "0.000625 0.000624 0.000626 0.000625 0.000625 0.000625 0.000625 0.000625, 1",
    "0.71 0.70 0.72 0.71 0.71 0.71 0.71 0.71, 1",
    "625000 625010 624990 625000 625000 625000 625000 625000, 1e-9"
  })
  void guessesTheUnitOfPeriodsByTheirSize(String numbers, double unit) throws RejectedException {
    String text = column(numbers.split(" "));
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.contents()).isEqualTo(Contents.PERIODS);
    assertThat(subjects(recognised)).containsExactly("contents", "timeUnitSeconds");
    assertThat(recognised.guesses().get(1).taken()).contains("no unit is stated");
    var edges = ReadBack.edges(TextSources.of(text), ReadOptions.none());
    assertThat(edges.times()).hasSize(9).startsWith(0.0);
    double first = Double.parseDouble(numbers.substring(0, numbers.indexOf(' ')));
    assertThat(edges.times()[1]).isEqualTo(new TickScale(unit).seconds(first));
    ReadOptions chosen = new ReadOptions(null, Contents.PERIODS, 1e-3, null);
    assertThat(ReadBack.accepted(TextSources.of(text), chosen).guesses()).isEmpty();
    assertThat(ReadBack.edges(TextSources.of(text), chosen).times()[1]).isEqualTo(first / 1000);
  }

  @Test
  void takesNamedPeriodsWithoutAGuess() throws RejectedException {
    String text = "n;period_us\n1;625\n2;626\n3;627\n4;628\n5;629\n6;630\n7;631\n8;632\n";
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.contents()).isEqualTo(Contents.PERIODS);
    assertThat(recognised.channels()).containsExactly(new Channel("period", "us"));
    assertThat(recognised.guesses()).isEmpty();
    assertThat(ReadBack.edges(TextSources.of(text), ReadOptions.none()).times())
        .startsWith(0, 625e-6, 1251e-6)
        .hasSize(9);
  }

  @Test
  void readsOneColumnOfDecimalCommasAndSaysSo() throws RejectedException {
    String text =
        column("625,12", "624,98", "625,01", "625,10", "625,00", "624,99", "625,02", "625,05");
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.contents()).isEqualTo(Contents.PERIODS);
    assertThat(recognised.warnings()).extracting(Warning::code).containsExactly("decimalComma");
    assertThat(ReadBack.edges(TextSources.of(text), ReadOptions.none()).times()[1])
        .isEqualTo(625.12e-6);
  }

  @Test
  void guessesRisingEdgesFromNumbersThatGrow() throws RejectedException {
    String text = column("0.1", "0.3", "0.4", "0.8", "0.9", "1.3", "1.4", "1.9");
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.contents()).isEqualTo(Contents.EDGE_TIMES);
    assertThat(subjects(recognised)).containsExactly("contents", "timeUnitSeconds");
    assertThat(ReadBack.edges(TextSources.of(text), ReadOptions.none()).times())
        .containsExactly(0.1, 0.3, 0.4, 0.8, 0.9, 1.3, 1.4, 1.9);
    assertThat(ReadBack.accepted(TextSources.of(text), ReadBack.as(Contents.PERIODS)).contents())
        .isEqualTo(Contents.PERIODS);
  }

  @Test
  void readsTimesWithLevels() throws RejectedException {
    String rows = "0.1,1\n0.15,0\n0.3,1\n0.35,0\n0.36,0\n0.5,1\n0.55,0\n0.7,1\n";
    var without = ReadBack.edges(TextSources.of("time_s,level\n" + rows), ReadOptions.none());
    assertThat(without.times()).containsExactly(0.1, 0.15, 0.3, 0.35, 0.5, 0.55, 0.7);
    assertThat(without.rising()).containsExactly(true, false, true, false, true, false, true);
    String initial = "time_s,level\n0,0\n" + rows;
    var with = ReadBack.edges(TextSources.of(initial), ReadOptions.none());
    assertThat(with.times()).containsExactly(without.times());
    assertThat(ReadBack.accepted(initial).guesses())
        .singleElement()
        .satisfies(g -> assertThat(g.taken()).contains("the level before the first edge"));
  }

  @Test
  void takesEvenlySampledLevelsAsAWaveform() {
    String text =
        "Time,Pulse\n0,0\n0.001,0\n0.002,1\n0.003,1\n0.004,0\n0.005,0\n0.006,0\n0.007,1\n";
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.contents()).isEqualTo(Contents.WAVEFORM);
    assertThat(recognised.sampleRateHertz()).isEqualTo(1000);
    assertThat(ReadBack.accepted(TextSources.of(text), ReadBack.as(Contents.EDGE_TIMES)).contents())
        .isEqualTo(Contents.EDGE_TIMES);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "Sample Interval,4,us | 250000 | true",
        "Sample interval: 4 \u00b5s | 250000 | true",
        "# sample rate: 48 kHz | 48000 | true",
        "Sampling Rate [Hz],48000 | 48000 | true",
        "% dt = 1e-3 s | 1000 | true",
        "Sampling frequency = 2 MHz | 2000000 | true",
        "fs = 44100 | 44100 | false",
        "XINCR,2.0E-05 | 50000 | false"
      })
  void takesTheSamplingStepFromThePreamble(String line, double rate, boolean unit)
      throws RejectedException {
    String text =
        "Source,CH1\n" + line + "\nvolt\n" + column("1", "2", "-1", "0", "1", "2", "1", "-3");
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.contents()).isEqualTo(Contents.WAVEFORM);
    assertThat(recognised.sampleRateHertz()).isCloseTo(rate, within(rate * 3e-16));
    assertThat(subjects(recognised)).isEqualTo(unit ? List.of() : List.of("sampleStepSeconds"));
    assertThat(ReadBack.samples(TextSources.of(text), ReadOptions.none()).values())
        .containsExactly(1, 2, -1, 0, 1, 2, 1, -3);
  }

  @Test
  void asksForTheSamplingStepAndTakesIt() throws RejectedException {
    String text = "a;b\n" + "0,5;1,5\n-0,5;2,5\n".repeat(5);
    var rejection = ReadBack.refused(text);
    assertThat(rejection.code()).isEqualTo("sampleStepNeeded");
    assertThat(rejection.message())
        .isEqualTo(
            "From line 2 the table holds values without times (a, b): state the sampling step and"
                + " the column if this is a waveform, or choose what the numbers stand for.");
    ReadOptions step = new ReadOptions(2, null, null, 1e-3);
    assertThat(ReadBack.accepted(TextSources.of(text), step).sampleRateHertz()).isEqualTo(1000);
    assertThat(ReadBack.samples(TextSources.of(text), step).values()).startsWith(1.5, 2.5);
  }

  @Test
  void refusesARateThatNoRecorderHas() {
    var source = TextSources.of("time,v\n" + waveform(",", ".", "\n"));
    ReadOptions options = new ReadOptions(null, null, 1e-9, null);
    assertThat(ReadBack.refused(source, options).code()).isEqualTo("noSampleRate");
    ReadOptions step = new ReadOptions(null, null, null, Double.MIN_VALUE);
    assertThat(ReadBack.refused(source, step).code()).isEqualTo("noSampleRate");
  }

  @Test
  void takesAColumnThatCountsAsNoTime() {
    String text = "Sample,CH1\n0,5\n1,4\n2,3\n3,-2\n4,1\n5,2\n6,3\n7,4\n";
    assertThat(ReadBack.refused(text).code()).isEqualTo("sampleStepNeeded");
    Recognised recognised =
        ReadBack.accepted(TextSources.of(text), new ReadOptions(null, null, null, 1e-5));
    assertThat(recognised.channels()).containsExactly(new Channel("CH1", null));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "timeRunsBackwards | 0.000060000, | 0.000010000, | Line 6: the time 1.0E-5 follows 4.0E-5",
        "unevenSteps | 0.000060000, | 0.000070000, | Line 6: the time grows by 3.0E-5 where steps of 2.0E-5",
        "notANumber | 0.125 | NaN | Line 6, column 2: \"NaN\" stands where a number is needed",
        "notANumber | 0.125 | inf | Line 6, column 2: \"inf\"",
        "notANumber | 0.125 | over | Line 6, column 2: \"over\"",
        "notANumber | 0.125 | `` | Line 6, column 2: an empty cell",
        "notANumber | 0.000060000 | x | Line 6, column 1: \"x\"",
        "raggedRow | ,0.125 | `` | Line 6 has 1 cells, the rows before have 2",
        "raggedRow | 0.125 | 0.125,3 | Line 6 has 3 cells, the rows before have 2"
      })
  void refusesBadRowsWithTheirLine(String code, String good, String bad, String sentence) {
    String text = waveform(",", ".", "\n").replace(good, bad == null ? "" : bad);
    var rejection = ReadBack.refused(text);
    assertThat(rejection.code()).isEqualTo(code);
    assertThat(rejection.message()).startsWith(sentence).endsWith(".");
  }

  @Test
  void refusesBadRowsFarDownWhileReading() {
    StringBuilder text = new StringBuilder("time,v\n");
    for (int i = 0; i < 60_000; i++) {
      text.append(String.format(Locale.ROOT, "%.6f,%d\n", i * 1e-6, i % 7));
    }
    text.append("0.000001,5\n0.060001,1\n");
    assertThat(ReadBack.accepted(text.toString()).sampleRateHertz()).isEqualTo(1e6);
    assertThatThrownBy(() -> ReadBack.samples(TextSources.of(text.toString()), ReadOptions.none()))
        .isInstanceOfSatisfying(
            RejectedException.class,
            e -> assertThat(e.rejection().message()).startsWith("Line 60002: the time 1.0E-6"));
  }

  @Test
  void refusesEdgesAndPeriodsThatAreNone() {
    assertThat(
            ReadBack.refused(
                    "time_s\n"
                        + column(
                            "0", "1", "2", "3", "4", "5", "6", "7", "8", "9", "10", "9.5", "12"))
                .message())
        .startsWith("Line 13: the time 9.5 follows 10.0: time must not run backwards");
    assertThat(
            ReadBack.refused("period_us\n" + column("5", "6", "5", "0", "5", "6", "5", "4"))
                .message())
        .startsWith("Line 5: 0.0 is no period");
    String levels = "time_s,level\n0.1,1\n0.15,0\n0.3,1\n0.35,0\n0.5,1\n0.55,0\n0.7,1\n0.8,0\n";
    StringBuilder far = new StringBuilder(levels);
    for (int i = 0; i < 40_000; i++) {
      far.append(1 + i * 0.001 + i % 2 * 1e-4).append(',').append(1 - i % 2).append('\n');
    }
    far.append("50,2\n51,0\n");
    assertThatThrownBy(() -> ReadBack.edges(TextSources.of(far.toString()), ReadOptions.none()))
        .hasMessageContaining("notALevel");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "Dear bench,\nthe machine runs slow, by 3 percent or so.\nYours\n",
        "{\"samples\": [1, 2, 3]}",
        "[\n1,\n2,\n3,\n4,\n5,\n6,\n7,\n8,\n9\n]",
        "<!DOCTYPE html>\n<html><body><p>1</p></body></html>",
        "<svg>\n1\n2\n</svg>",
        "int main(void) {\n  return 0;\n}\n",
        "name,city\nA,B\nC,D\n",
        "\n\n \n",
        "# only\n# comments\n"
      })
  void refusesTextWithoutNumbers(String text) {
    var rejection = ReadBack.refused(text);
    assertThat(rejection.code()).isEqualTo("noNumbers");
    assertThat(rejection.message()).endsWith(".");
  }

  @Test
  void saysWhichLineMixesNumbersAndWords() {
    assertThat(ReadBack.refused("Date,Open\n14-Mar-14,223.80\n13-Mar-14,230.00\n").message())
        .startsWith("No line holds numbers only; line 2 mixes numbers and words");
  }

  @Test
  void refusesTooFewRowsAndUtf16() {
    var rejection = ReadBack.refused("a,b\n1,2\n3,4\n");
    assertThat(rejection.code()).isEqualTo("tooShort");
    assertThat(rejection.message())
        .isEqualTo(
            "From line 2 there are 2 rows of numbers, at least 8 are needed: record longer.");
    byte[] utf16 = ("\ufeff" + waveform(",", ".", "\n")).getBytes(StandardCharsets.UTF_16LE);
    assertThat(ReadBack.refused(TextSources.of(utf16), ReadOptions.none()).code())
        .isEqualTo("encoding");
    assertThat(ReadBack.refused(TextSources.of(new byte[] {1, 0, 2}), ReadOptions.none()).code())
        .isEqualTo("unknownFormat");
  }

  @Test
  void refusesACellThatEndsTheTableEarly() {
    assertThat(ReadBack.refused("t,v\n0,1\n1e-3,2\n2e-3,over\n3e-3,4\n4e-3,4\n").message())
        .startsWith("Line 4, column 2: \"over\"");
  }

  @ParameterizedTest
  @ValueSource(strings = {"0.000160000", "0.00", "0.000160000,", "0.000160000,-", "0.000160000,1e"})
  void warnsOfALastLineCutShort(String cut) throws RejectedException {
    String text = waveform(",", ".", "\n") + cut;
    var samples = ReadBack.samples(TextSources.of(text), ReadOptions.none());
    assertThat(samples.values()).hasSize(10);
    assertThat(samples.warnings()).extracting(Warning::code).containsExactly("truncated");
    assertThat(samples.warnings().get(0).message()).contains("line 11");
  }

  @Test
  void leavesOutALastRowWithAnEmptyCell() throws RejectedException {
    String text = waveform(",", ".", "\n") + "0.000160000,\n,\n";
    var samples = ReadBack.samples(TextSources.of(text), ReadOptions.none());
    assertThat(samples.values()).hasSize(10);
    assertThat(samples.warnings()).extracting(Warning::code).containsExactly("emptyLastRow");
  }

  @Test
  void warnsOfUnevenAndOfCoarseTimes() throws RejectedException {
    StringBuilder jitter = new StringBuilder("time_s,v\n");
    StringBuilder coarse = new StringBuilder("time_s,v\n");
    for (int i = 0; i < 200; i++) {
      jitter.append(String.format(Locale.ROOT, "%.7f,%d\n", i * 1e-4 + i % 3 * 5e-6, i % 5));
      coarse.append(String.format(Locale.ROOT, "%.4f,%d\n", i * 1.234e-4, i % 5));
    }
    assertThat(ReadBack.accepted(jitter.toString()).warnings())
        .extracting(Warning::code)
        .containsExactly("timeJitter");
    assertThat(ReadBack.accepted(coarse.toString()).warnings())
        .extracting(Warning::code)
        .contains("coarseTimes");
  }

  @Test
  void warnsWhereTheStepOfTheWholeFileIsAnother() throws RejectedException {
    StringBuilder text = new StringBuilder("time_s,v\n");
    for (int i = 0; i < 60_000; i++) {
      double time = i * 1e-4 + Math.max(0, i - 30_000) * 2e-8;
      text.append(String.format(Locale.ROOT, "%.9f,%d\n", time, i % 5));
    }
    var samples = ReadBack.samples(TextSources.of(text.toString()), ReadOptions.none());
    // half of the steps are 200 ppm longer
    assertThat(samples.warnings())
        .singleElement()
        .satisfies(
            w -> {
              assertThat(w.code()).isEqualTo("sampleStepDrifts");
              assertThat(w.message()).contains("by 100 ppm");
            });
  }

  @Test
  void guessesTheUnitOfAWaveformInWholeNumbers() {
    String text = "time,adc\n0,512\n20,520\n40,530\n60,520\n80,512\n100,500\n120,490\n140,500\n";
    Recognised recognised = ReadBack.accepted(text);
    assertThat(recognised.sampleRateHertz()).isEqualTo(50_000);
    assertThat(subjects(recognised)).containsExactly("timeUnitSeconds");
  }

  @Test
  void openingAsTheOtherKindIsAnErrorOfTheCaller() {
    var waveform = TextSources.of("time,v\n" + waveform(",", ".", "\n"));
    assertThatThrownBy(() -> ReadBack.FORMATS.openEdges(waveform, ReadOptions.none()))
        .isInstanceOf(IllegalStateException.class);
    var periods = TextSources.of("period_us\n" + column("5", "6", "5", "7", "5", "6", "5", "4"));
    assertThatThrownBy(() -> ReadBack.FORMATS.openSamples(periods, ReadOptions.none()))
        .isInstanceOf(IllegalStateException.class);
  }

  @Test
  void doesNotDependOnHowBytesArriveNorOnLineEnds() {
    List<String> texts = new ArrayList<>();
    texts.add("time,v\r\n" + waveform(",", ".", "\r\n"));
    texts.add("period_us\r" + "625\r626\r624\r".repeat(3000));
    texts.add("time_s,level\n0,0\n0.1,1\n0.2,0\n0.35,1\n0.4,0\n0.5,1\n0.6,0\n0.7,1");
    texts.add(waveform(";", ",", "\n").replace("-3,5", "x"));
    for (String text : texts) {
      byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
      assertThat(ReadBack.everything(TextSources.trickling(bytes), ReadOptions.none()))
          .isEqualTo(ReadBack.everything(TextSources.of(bytes), ReadOptions.none()));
      String unix = text.replace("\r\n", "\n").replace('\r', '\n');
      assertThat(ReadBack.everything(TextSources.of(unix), ReadOptions.none()))
          .isEqualTo(ReadBack.everything(TextSources.of(bytes), ReadOptions.none()));
    }
  }

  @ParameterizedTest
  @ValueSource(chars = {'1', ' ', ',', '"', 'x', '\n', '#', '\r', ';'})
  void refusesGigabytesOfOneCharacter(char repeated) {
    long length = 8L << 30;
    assertThat(
            ReadBack.refused(TextSources.endless("", repeated, length), ReadOptions.none()).code())
        .isIn("lineTooLong", "noNumbers");
  }

  @Test
  void refusesALongLineAfterGoodRows() {
    String good = "time,v\n" + waveform(",", ".", "\n");
    assertThat(
            ReadBack.refused(TextSources.endless(good, '7', 8L << 30), ReadOptions.none())
                .message())
        .startsWith("Line 12 is longer than 16 KiB");
    StringBuilder long2 = new StringBuilder("period_us\n");
    long2.append("625\n626\n624\n".repeat(40_000));
    assertThatThrownBy(
            () ->
                ReadBack.edges(
                    TextSources.endless(long2.toString(), '7', 8L << 30), ReadOptions.none()))
        .hasMessageContaining("lineTooLong");
  }
}
