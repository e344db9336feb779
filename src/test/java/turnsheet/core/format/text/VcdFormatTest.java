package turnsheet.core.format.text;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised.Channel;
import turnsheet.core.signal.RejectedException;

/** Value change dumps, IEEE 1364-2005 clause 18; the expectations follow from the text of each. */
@SuppressWarnings("StringConcatToTextBlock") // line ends are part of the cases
class VcdFormatTest {

  private static final String HEAD =
      """
      $date today $end
      $version any $end
      $timescale 1 us $end
      $scope module bench $end
      $var wire 1 ! tacho $end
      $scope module inner $end
      $var reg 1 " \\gate.x $end
      $var wire 8 # bus [7:0] $end
      $var wire 1 $ bit [3] $end
      $var real 64 % volts $end
      $var string 1 & state $end
      $var event 1 ' tick $end
      $upscope $end
      $var wire 1 ! alias $end
      $upscope $end
      $enddefinitions $end
      """;

  private static String clock(int edges) {
    StringBuilder text = new StringBuilder("#0\n$dumpvars\n0!\nx\"\nb0 #\n0$\nr0 %\n$end\n");
    for (int i = 1; i <= edges; i++) {
      text.append('#').append(i * 625).append('\n').append(i % 2).append("!\n");
    }
    return text.toString();
  }

  @Test
  void namesOneBitSignalsByTheirScopesInOrderOfDeclaration() {
    var recognised = ReadBack.accepted(HEAD + clock(10));
    assertThat(recognised.channels())
        .containsExactly(
            new Channel("bench.tacho", null),
            new Channel("bench.inner.gate.x", null),
            new Channel("bench.inner.bit[3]", null));
    assertThat(recognised.contents()).isEqualTo(Contents.EDGE_TIMES);
    assertThat(recognised.format()).isEqualTo("VCD, timescale 1 us");
    assertThat(recognised.sampleRateHertz()).isNull();
  }

  @Test
  void takesTheBusiestSignalAndSaysSo() {
    String body = clock(10).replace("#6250\n", "#6250\n1$\n#6251\n0$\n");
    var recognised = ReadBack.accepted(HEAD + body);
    assertThat(recognised.channel()).isEqualTo(1);
    assertThat(recognised.guesses())
        .singleElement()
        .satisfies(
            g -> {
              assertThat(g.subject()).isEqualTo("channel");
              assertThat(g.taken())
                  .isEqualTo("bench.tacho: most edges (10); 1 other one-bit signals change");
            });
    assertThat(
            ReadBack.accepted(TextSources.of(HEAD + clock(10)), ReadOptions.none().withChannel(1))
                .guesses())
        .isEmpty();
  }

  @Test
  void handsOutEdgesInSeconds() throws RejectedException {
    var edges = ReadBack.edges(TextSources.of(HEAD + clock(10)), ReadOptions.none());
    assertThat(edges.times()).hasSize(10);
    for (int i = 0; i < 10; i++) {
      // the nearest double of the decimal value: nothing is lost by scaling
      assertThat(edges.times()[i]).isEqualTo(Double.parseDouble((i + 1) * 625 + "e-6"));
      assertThat(edges.rising()[i]).isEqualTo(i % 2 == 0);
    }
    assertThat(edges.stepSeconds()).isEqualTo(1e-6);
    assertThat(edges.warnings()).isEmpty();
  }

  @Test
  void takesNoEdgeFromAnUnknownLevel() throws RejectedException {
    String body = "#1\n1!\n#2\nx!\n#3\n1!\n#4\n0!\n#5\nz!\n#6\n0!\n#7\n1!\n#8\nX!\n#9\n0!\n";
    var edges = ReadBack.edges(TextSources.of(HEAD + body), ReadOptions.none().withChannel(1));
    assertThat(edges.times()).containsExactly(4e-6, 7e-6);
    assertThat(edges.rising()).containsExactly(false, true);
  }

  @Test
  void readsSeveralChangesPerLineAndVectorsOfOneBit() throws RejectedException {
    String body =
        "#0 0! 0\" b1010 # r-1.5 % sTOP/0 & 1'\n#5 1! b1 $\n#6 b0 ! $comment 1! $end b0 $";
    var edges = ReadBack.edges(TextSources.of(HEAD + body), ReadOptions.none().withChannel(1));
    assertThat(edges.times()).containsExactly(5e-6, 6e-6);
    assertThat(edges.rising()).containsExactly(true, false);
  }

  @Test
  void skipsDumpSectionsAndUnknownCommands() throws RejectedException {
    String body =
        "$comment before $end $dumpall 0! $end\n#3\n1!\n$dumpoff\nx!\n$end\n#9\n$dumpon\n0!\n$end\n"
            + "$attrbegin misc 1! $end\n#12\n1!\n";
    var edges = ReadBack.edges(TextSources.of(HEAD + body), ReadOptions.none().withChannel(1));
    assertThat(edges.times()).containsExactly(3e-6, 12e-6);
  }

  @ParameterizedTest
  @CsvSource({
    "1s, 1",
    "10 s, 10",
    "100s, 100",
    "1ms, 1e-3",
    "10 ms, 1e-2",
    "1us, 1e-6",
    "100 us, 1e-4",
    "1ns, 1e-9",
    "10ns, 1e-8",
    "1 ps, 1e-12",
    "100ps, 1e-10",
    "1 fs, 1e-15",
    "10 fs, 1e-14"
  })
  void readsEachTimescale(String written, double seconds) throws RejectedException {
    String text = HEAD.replace("1 us", "\n\t" + written + "\n") + clock(10);
    var edges = ReadBack.edges(TextSources.of(text), ReadOptions.none());
    assertThat(edges.stepSeconds()).isEqualTo(seconds);
    // one rounding of the product, one of the unit
    assertThat(edges.times()[9] / (6250 * seconds)).isCloseTo(1, within(4e-16));
  }

  private static org.assertj.core.data.Offset<Double> within(double value) {
    return org.assertj.core.data.Offset.offset(value);
  }

  @Test
  void timeUnitOfTheBenchReplacesTheTimescale() throws RejectedException {
    ReadOptions options = new ReadOptions(1, null, 1e-3, null);
    assertThat(ReadBack.edges(TextSources.of(HEAD + clock(10)), options).times()[0])
        .isEqualTo(0.625);
  }

  @Test
  void asksForTheUnitWhereThereIsNoTimescale() {
    String text = HEAD.replace("$timescale 1 us $end\n", "") + clock(10);
    var rejection = ReadBack.refused(text);
    assertThat(rejection.code()).isEqualTo("timeUnitNeeded");
    assertThat(rejection.message()).contains("$timescale").contains("state how long");
    ReadOptions options = new ReadOptions(null, null, 1e-6, null);
    assertThat(ReadBack.accepted(TextSources.of(text), options).channel()).isEqualTo(1);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "timeRunsBackwards | #10\\n1!\\n#9\\n0!\\n | Line 19: the time stamp 9 follows 10",
        "vcdTimeStamp | #3.2\\n1!\\n | Line 17: the time stamp \"#3.2\" is no whole number",
        "vcdTimeStamp | #-3\\n1!\\n | is no number",
        "vcdTimeStamp | #99999999999999999999\\n | beyond 64 bits",
        "vcdSyntax | #1\\n1 !\\n | Line 18: \"1\" is no value change",
        "vcdSyntax | #1\\nhello world\\n | Line 18: \"hello\"",
        "noSignalChanges | #1\\n0!\\n | None of the 3 one-bit signals changes",
        "tooShort | #1\\n0!\\n#2\\n1!\\n#3\\n0!\\n | The signal bench.tacho has 2 edges"
      })
  void refusesWithASentence(String code, String body, String sentence) {
    var rejection = ReadBack.refused(HEAD + body.replace("\\n", "\n"));
    assertThat(rejection.code()).isEqualTo(code);
    assertThat(rejection.message()).contains(sentence).endsWith(".");
  }

  @Test
  void refusesBrokenDefinitions() {
    assertThat(ReadBack.refused(HEAD.replace("$enddefinitions $end\n", "")).code())
        .isEqualTo("vcdIncomplete");
    assertThat(ReadBack.refused(HEAD.replace("$version any $end", "oops")).message())
        .startsWith("Line 2: \"oops\" stands among the definitions");
    assertThat(ReadBack.refused(HEAD.replace("1 us", "3 us") + clock(10)).code())
        .isEqualTo("vcdTimescale");
    assertThat(ReadBack.refused(HEAD.replace("wire 1 ! tacho", "wire ! tacho") + clock(10)).code())
        .isEqualTo("vcdSyntax");
    assertThat(
            ReadBack.refused("$timescale 1 us $end $var wire 8 ! b $end $enddefinitions $end")
                .code())
        .isEqualTo("noOneBitSignal");
  }

  @Test
  void refusesChoicesThatDoNotFit() {
    var source = TextSources.of(HEAD + clock(10));
    assertThat(ReadBack.refused(source, ReadOptions.none().withChannel(4)).code())
        .isEqualTo("noSuchChannel");
    assertThat(ReadBack.refused(source, ReadBack.as(Contents.WAVEFORM)).code())
        .isEqualTo("contentsNotPossible");
    assertThatThrownBy(() -> ReadBack.FORMATS.openSamples(source, ReadOptions.none()))
        .isInstanceOf(IllegalStateException.class);
  }

  @ParameterizedTest
  @ValueSource(strings = {"#9999\n1", "#9999\nb1", "#9999\nb0101 ", "#9999\n$comment cut"})
  void saysThatTheFileEndsEarly(String tail) throws RejectedException {
    String text = HEAD + clock(10).replace("#6250\n0!\n", "#6250\n0!\n" + tail);
    var edges = ReadBack.edges(TextSources.of(text), ReadOptions.none());
    assertThat(edges.times()).hasSize(10);
    assertThat(edges.warnings())
        .singleElement()
        .satisfies(w -> assertThat(w.code()).isEqualTo("truncated"));
  }

  @Test
  void acceptsNoughtsAfterAPointInTimeStamps() throws RejectedException {
    String text = HEAD + clock(10).replaceAll("#(\\d+)", "#$1.0");
    var edges = ReadBack.edges(TextSources.of(text), ReadOptions.none());
    assertThat(edges.times()[9]).isEqualTo(0.00625);
    assertThat(edges.warnings())
        .singleElement()
        .satisfies(w -> assertThat(w.code()).isEqualTo("fractionalTimeStamp"));
  }

  @Test
  void doesNotDependOnHowBytesArriveNorOnLineEnds() {
    String text = HEAD + clock(500);
    String expected = ReadBack.everything(TextSources.of(text), ReadOptions.none());
    byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
    assertThat(ReadBack.everything(TextSources.trickling(bytes), ReadOptions.none()))
        .isEqualTo(expected);
    assertThat(ReadBack.everything(TextSources.of(text.replace("\n", "\r\n")), ReadOptions.none()))
        .isEqualTo(expected);
    assertThat(ReadBack.everything(TextSources.of("\ufeff" + text), ReadOptions.none()))
        .isEqualTo(expected);
  }

  @Test
  void refusesAGigabyteWithoutABlank() {
    long length = 8L << 30;
    assertThat(ReadBack.refused(TextSources.endless("$", 'a', length), ReadOptions.none()).code())
        .isEqualTo("lineTooLong");
    assertThat(
            ReadBack.refused(TextSources.endless(HEAD + "#0\nb", '1', length), ReadOptions.none())
                .code())
        .isEqualTo("lineTooLong");
    assertThat(
            ReadBack.refused(TextSources.endless("$comment ", ' ', length), ReadOptions.none())
                .code())
        .isEqualTo("tooManySignals");
    // what follows the first changes is not looked at before reading
    assertThat(
            ReadBack.accepted(
                    TextSources.endless(HEAD + clock(10), ' ', length), ReadOptions.none())
                .channel())
        .isEqualTo(1);
  }

  @Test
  void refusesMoreSignalsThanABenchHas() {
    StringBuilder text = new StringBuilder("$timescale 1 us $end\n");
    for (int i = 0; i <= VcdDefinitionsReader.MAX_SIGNALS; i++) {
      text.append("$var wire 1 ").append(i).append(" w").append(i).append(" $end\n");
    }
    assertThat(ReadBack.refused(text.toString()).code()).isEqualTo("tooManySignals");
  }
}
