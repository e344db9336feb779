package turnsheet.core.format.text;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Predicate;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;
import tools.jackson.databind.ObjectMapper;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.signal.RejectedException;

/**
 * Public files with known contents, outside the project: each folder's SOURCE.md says where they
 * come from, its tables say what must come out. Skipped where the folder is absent.
 */
class TextCorpusTest {

  private static final Path CORPUS = Path.of(System.getProperty("turnsheet.corpus", "absent"));
  private static final Map<String, Integer> COUNTS = new LinkedHashMap<>();

  @AfterAll
  static void printSummary() {
    if (!COUNTS.isEmpty()) {
      System.out.println("text corpus: " + COUNTS);
    }
  }

  private static synchronized void count(String what) {
    COUNTS.merge(what, 1, Integer::sum);
  }

  private static void requireCorpus() {
    if (!Files.isDirectory(CORPUS)) {
      System.out.println("text corpus: folder absent, skipped");
    }
    Assumptions.assumeTrue(Files.isDirectory(CORPUS));
  }

  private static List<Path> files(String folder, Predicate<String> name) {
    try (Stream<Path> list = Files.list(CORPUS.resolve(folder))) {
      return list.filter(p -> name.test(String.valueOf(p.getFileName()))).sorted().toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static List<String> lines(Path file) {
    try {
      return Files.readAllLines(file, StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static List<List<String>> table(Path file) {
    return RowSplitter.split(String.join("\n", lines(file)), ',').stream()
        .skip(1)
        .map(Row::cells)
        .toList();
  }

  private static ReadOptions step(int channel, double seconds) {
    return new ReadOptions(channel, Contents.WAVEFORM, null, seconds);
  }

  // value change dumps: edge counts of VCDCOUNTS.csv

  @TestFactory
  Stream<DynamicTest> edgeCountsOfValueChangeDumps() {
    requireCorpus();
    List<DynamicTest> tests = new ArrayList<>();
    for (String folder :
        List.of(
            "csv-vcd-synthetic",
            "real-logic-captures",
            "vcd-counter",
            "vcd-dump",
            "vcd-grammar",
            "vcd-jtag",
            "vcd-mixed",
            "vcd-tools")) {
      Map<String, List<List<String>>> byFile = new LinkedHashMap<>();
      for (List<String> row : table(CORPUS.resolve(folder).resolve("VCDCOUNTS.csv"))) {
        byFile.computeIfAbsent(row.get(0), f -> new ArrayList<>()).add(row);
      }
      byFile.forEach(
          (file, rows) ->
              tests.add(
                  DynamicTest.dynamicTest(
                      folder + "/" + file,
                      () -> checkDump(CORPUS.resolve(folder).resolve(file), rows))));
    }
    return tests.stream();
  }

  private static void checkDump(Path file, List<List<String>> expected) throws Exception {
    ByteSource source = TextSources.of(file);
    boolean timescale = !expected.get(0).get(1).isBlank();
    // files without $timescale are refused asking for it; with a choice they can be read
    ReadOptions options = timescale ? ReadOptions.none() : new ReadOptions(null, null, 1.0, null);
    if (!timescale) {
      assertThat(ReadBack.refused(source, ReadOptions.none()).code()).isEqualTo("timeUnitNeeded");
    }
    VcdDefinitions definitions;
    try (VcdTokens tokens = new VcdTokens(source.open())) {
      definitions = new VcdDefinitionsReader(tokens).read();
    } catch (RejectedException e) {
      assertThat(expected.get(0).get(4)).startsWith("(no");
      count("dumps refused");
      return;
    }
    assertThat(definitions.signals()).hasSize(Integer.parseInt(expected.get(0).get(3)));
    if (expected.get(0).get(4).startsWith("(no")) {
      assertThat(ReadBack.refused(source, options).code())
          .isIn("noOneBitSignal", "noSignalChanges", "vcdSyntax");
      count("dumps refused");
      return;
    }
    if (String.valueOf(file.getFileName()).contains("fractional")) {
      // the counts beside it read on past a time stamp of 3.2, which IEEE 1364 does not allow
      assertThat(ReadBack.refused(source, options).code()).isEqualTo("vcdTimeStamp");
      count("dumps refused");
      return;
    }
    checkSignals(source, options, definitions, expected);
    Recognition recognition = ReadBack.recognise(source, options);
    if (recognition instanceof Recognition.Refused refused) {
      assertThat(refused.rejection().code()).isEqualTo("tooShort");
      count("dumps too short");
    } else {
      count("dumps accepted");
    }
  }

  /** Several signals may share a path up to a bit index, so each row finds one that fits. */
  private static void checkSignals(
      ByteSource source,
      ReadOptions options,
      VcdDefinitions definitions,
      List<List<String>> expected)
      throws RejectedException {
    List<String> found = new ArrayList<>();
    Double unit = definitions.unitSeconds();
    TickScale scale = new TickScale(unit == null ? 1 : unit);
    for (int channel = 1; channel <= definitions.signals().size(); channel++) {
      var edges = ReadBack.edges(source, options.withChannel(channel));
      String path = definitions.signals().get(channel - 1).path();
      double[] up = edges.risingTimes();
      int down = edges.times().length - up.length;
      found.add(
          path.replaceAll("\\[[0-9:]+\\]$", "") + " " + up.length + " " + down + " " + ends(up));
      if (path.contains("[")) {
        found.add(path + " " + up.length + " " + down + " " + ends(up));
      }
      assertThat(edges.stepSeconds()).isEqualTo(scale.unitSeconds());
    }
    for (List<String> row : expected) {
      String what = row.get(4) + " " + row.get(5) + " " + row.get(6) + " ";
      if (unit == null) {
        // counted there without the time stamps that are written with a decimal point
        assertThat(found).anyMatch(f -> f.startsWith(what));
      } else {
        double[] ends =
            Stream.of(row.get(7), row.get(8))
                .filter(t -> !t.isBlank())
                .mapToDouble(t -> scale.seconds(Double.parseDouble(t)))
                .toArray();
        assertThat(found).contains(what + ends(ends));
      }
      count("signals counted");
    }
  }

  private static String ends(double[] times) {
    return times.length == 0 ? "-" : times[0] + ".." + times[times.length - 1];
  }

  // waveforms

  @TestFactory
  Stream<DynamicTest> crossingsOfOscilloscopeTables() {
    requireCorpus();
    Path folder = CORPUS.resolve("csv-scope-square");
    return table(folder.resolve("MEASURED.csv")).stream()
        .map(
            row ->
                DynamicTest.dynamicTest(
                    row.get(0) + " column " + row.get(1),
                    () -> checkScope(folder.resolve(row.get(0)), row)));
  }

  private static void checkScope(Path file, List<String> row) throws Exception {
    ByteSource source = TextSources.of(file);
    ReadOptions options = ReadOptions.none().withChannel(Integer.parseInt(row.get(1)));
    Recognised recognised = ReadBack.accepted(source, options);
    assertThat(recognised.contents()).isEqualTo(Contents.WAVEFORM);
    var samples = ReadBack.samples(source, options);
    double[] v = samples.values();
    assertThat(v).hasSize(Integer.parseInt(row.get(2)));
    double step = 1 / samples.rateHertz();
    assertThat(step / Double.parseDouble(row.get(3))).isCloseTo(1, within(3e-16));
    double middle = (Double.parseDouble(row.get(5)) + Double.parseDouble(row.get(6))) / 2;
    List<Double> crossings = new ArrayList<>();
    for (int i = 1; i < v.length; i++) {
      if (v[i - 1] < middle && v[i] >= middle) {
        double at = i - 1 + (middle - v[i - 1]) / (v[i] - v[i - 1]);
        crossings.add(Double.parseDouble(row.get(4)) + at * step);
      }
    }
    String[] expected = row.get(7).split(" ", -1);
    assertThat(crossings).hasSize(expected.length);
    for (int i = 0; i < expected.length; i++) {
      double time = Double.parseDouble(expected[i]);
      // the levels there are rounded to 4 digits: up to 5e-4 V of a step of more than 0.3 V
      assertThat(crossings.get(i)).isCloseTo(time, within(2e-3 * step + Math.abs(time) * 5e-7));
    }
    count("scope columns");
  }

  @TestFactory
  Stream<DynamicTest> syntheticAndReferenceWaveforms() {
    requireCorpus();
    return Stream.of(
            new String[] {"csv-vcd-synthetic/no_header.csv", "10000", "1e6"},
            new String[] {"csv-vcd-synthetic/square_2khz.csv", "10000", "1e6"},
            new String[] {"csv-vcd-synthetic/valid_waveform.csv", "1000", "999"},
            new String[] {"ref-tacho-sweep/test_input.csv", "10001", "1000"},
            new String[] {"ref-tacho-sweep/matlab_ref_output.csv", "10001", "1000"})
        .map(
            c ->
                DynamicTest.dynamicTest(
                    c[0],
                    () -> {
                      ByteSource source = TextSources.of(CORPUS.resolve(c[0]));
                      var samples = ReadBack.samples(source, ReadOptions.none());
                      double rate = Double.parseDouble(c[2]);
                      assertThat(samples.values()).hasSize(Integer.parseInt(c[1]));
                      // 19 printed digits leave the last bit of the step open
                      assertThat(samples.rateHertz() / rate).isCloseTo(1, within(1e-15));
                      assertThat(samples.warnings()).isEmpty();
                      count("waveforms");
                    }));
  }

  @TestFactory
  Stream<DynamicTest> tachometerSweepHasItsEdges() {
    requireCorpus();
    return Stream.of(
        DynamicTest.dynamicTest(
            "ref-tacho-sweep/test_input.csv",
            () -> {
              double[] v =
                  ReadBack.samples(
                          TextSources.of(CORPUS.resolve("ref-tacho-sweep/test_input.csv")),
                          ReadOptions.none())
                      .values();
              int rising = 0;
              for (int i = 1; i < v.length; i++) {
                rising += v[i - 1] == 0 && v[i] == 1 ? 1 : 0;
              }
              assertThat(rising).isEqualTo(300);
            }));
  }

  // edge and period lists: n, mean, standard deviation, min, max

  @TestFactory
  Stream<DynamicTest> statisticsOfEdgeAndPeriodLists() {
    requireCorpus();
    List<DynamicTest> tests = new ArrayList<>();
    for (List<String> row : table(CORPUS.resolve("real-logic-captures/MEASURED.csv"))) {
      boolean raw =
          row.size() > 6 && !row.get(1).contains("longest") && !row.get(1).contains("50 ms");
      if (raw) {
        for (Path file : files("real-logic-captures", n -> n.startsWith(row.get(0)))) {
          String name = String.valueOf(file.getFileName());
          // the signal of the step pulses is the busiest, so it is the one that is guessed
          tests.add(
              DynamicTest.dynamicTest(
                  name, () -> checkPeriods(file, row.subList(2, 7), roundingOf(name))));
        }
      }
    }
    List<String> heart = table(CORPUS.resolve("real-heart-periods/MEASURED.csv")).get(0);
    tests.add(
        DynamicTest.dynamicTest(
            heart.get(0),
            () ->
                checkPeriods(
                    CORPUS.resolve("real-heart-periods").resolve(heart.get(0)),
                    List.of(heart.get(2), heart.get(4), heart.get(5), heart.get(6), heart.get(7)),
                    0)));
    return tests.stream();
  }

  /** The lists print fewer digits than the capture had: half a unit of the last one, in seconds. */
  private static double roundingOf(String name) {
    if (name.endsWith("-periods.txt")) {
      return name.startsWith("stepper-d") ? 5e-10 : 0;
    }
    return 0;
  }

  private static void checkPeriods(Path file, List<String> expected, double rounding)
      throws Exception {
    ByteSource source = TextSources.of(file);
    Recognised recognised = ReadBack.accepted(source, ReadOptions.none());
    assertThat(recognised.contents()).isNotEqualTo(Contents.WAVEFORM);
    var edges = ReadBack.edges(source, ReadOptions.none());
    double[] p = edges.periods();
    assertThat(p).hasSize(Integer.parseInt(expected.get(0)));
    double total = edges.times()[edges.times().length - 1];
    // a difference of two times, each rounded to a double
    double slack = rounding + 2 * Math.ulp(total);
    assertClose(mean(p), expected.get(1), slack);
    assertClose(sampleDeviation(p), expected.get(2), slack);
    assertClose(Arrays.stream(p).min().orElseThrow(), expected.get(3), slack);
    assertClose(Arrays.stream(p).max().orElseThrow(), expected.get(4), slack);
    count("edge and period lists");
  }

  /** Equal within the digits of the printed value and the given slack. */
  private static void assertClose(double value, String printed, double slack) {
    double half = 0.5001 * Math.pow(10, -Decimals.places(printed, (byte) '.'));
    assertThat(value).isCloseTo(Double.parseDouble(printed), within(half + slack));
  }

  private static String value(Map<String, String> printed, String quantity) {
    return java.util.Objects.requireNonNull(printed.get(quantity), quantity);
  }

  private static double mean(double[] values) {
    double first = Arrays.stream(values).sum() / values.length;
    return first + Arrays.stream(values).map(v -> v - first).sum() / values.length;
  }

  private static double sampleDeviation(double[] values) {
    double mean = mean(values);
    double squares = Arrays.stream(values).map(v -> (v - mean) * (v - mean)).sum();
    return Math.sqrt(squares / (values.length - 1));
  }

  @TestFactory
  Stream<DynamicTest> certifiedUnivariateData() {
    requireCorpus();
    return table(CORPUS.resolve("ref-univariate/CERTIFIED.csv")).stream()
        .map(
            row ->
                DynamicTest.dynamicTest(
                    row.get(0),
                    () ->
                        checkCertified(CORPUS.resolve("ref-univariate").resolve(row.get(0)), row)));
  }

  private static void checkCertified(Path file, List<String> row) throws Exception {
    ByteSource source = TextSources.of(file);
    int n = Integer.parseInt(row.get(1));
    if (n < LayoutFinder.MIN_ROWS) {
      assertThat(ReadBack.refused(source, ReadOptions.none()).code()).isEqualTo("tooShort");
      count("lists too short");
      return;
    }
    double[] v = ReadBack.samples(source, step(1, 1)).values();
    assertThat(v).hasSize(n);
    // NIST StRD: 1e-12, for NumAcc4 1e-8 as its decimals are not exact in binary
    double relative = row.get(0).startsWith("NumAcc4") ? 1e-8 : 1e-12;
    assertThat(mean(v) / Double.parseDouble(row.get(2))).isCloseTo(1, within(relative));
    assertThat(sampleDeviation(v) / Double.parseDouble(row.get(3))).isCloseTo(1, within(relative));
    boolean periods = Arrays.stream(v).allMatch(x -> x > 0);
    if (periods) {
      Recognised recognised = ReadBack.accepted(source, ReadOptions.none());
      assertThat(recognised.contents()).isEqualTo(Contents.PERIODS);
      ReadOptions seconds = new ReadOptions(null, null, 1.0, null);
      double[] p = ReadBack.edges(source, seconds).periods();
      // periods come back as differences of their sum, which carries its own last bit
      double bit = Math.ulp(mean(v) * n);
      assertThat(mean(p)).isCloseTo(mean(v), within(bit));
      assertThat(sampleDeviation(p)).isCloseTo(sampleDeviation(v), within(bit));
    } else {
      assertThat(ReadBack.refused(source, ReadOptions.none()).code()).isEqualTo("sampleStepNeeded");
    }
    count("certified lists");
  }

  @TestFactory
  Stream<DynamicTest> stabilitySuite() {
    requireCorpus();
    return Stream.of("suite1000", "nine-values")
        .map(
            name ->
                DynamicTest.dynamicTest(
                    name,
                    () -> {
                      Path folder = CORPUS.resolve("ref-stability-suite");
                      ByteSource source = TextSources.of(folder.resolve(name + "-frequency.txt"));
                      assertThat(ReadBack.accepted(source, ReadOptions.none()).contents())
                          .isEqualTo(Contents.PERIODS);
                      double[] v = ReadBack.samples(source, step(1, 1)).values();
                      Map<String, String> printed = new LinkedHashMap<>();
                      table(folder.resolve("published-" + name + ".csv"))
                          .forEach(r -> printed.put(r.get(0), r.get(1)));
                      assertThat(v).hasSize(Integer.parseInt(value(printed, "n")));
                      // NIST SP 1065, printed digits
                      assertClose(mean(v), value(printed, "average"), 0);
                      assertClose(
                          Arrays.stream(v).max().orElseThrow(), value(printed, "maximum"), 0);
                      assertClose(
                          Arrays.stream(v).min().orElseThrow(), value(printed, "minimum"), 0);
                      assertClose(
                          sampleDeviation(v), value(printed, "sample_standard_deviation"), 0);
                      count("stability lists");
                    }));
  }

  @TestFactory
  Stream<DynamicTest> earthAndChronometer() {
    requireCorpus();
    Path folder = CORPUS.resolve("real-earth-and-chronometer");
    List<List<String>> measured = table(folder.resolve("MEASURED.csv"));
    return Stream.of(
        DynamicTest.dynamicTest(
            "earth",
            () -> {
              Path file = folder.resolve("eopc04_08.1962-01-01_2015-12-15.csv");
              var rejection = ReadBack.refused(TextSources.of(file), ReadOptions.none());
              assertThat(rejection.code()).isEqualTo("sampleStepNeeded");
              assertThat(rejection.message()).contains("LOD");
              Recognised recognised = ReadBack.accepted(TextSources.of(file), step(1, 86_400));
              int lod =
                  1 + recognised.channels().stream().map(c -> c.name()).toList().indexOf("LOD");
              checkDaily(file, lod, measured.get(0));
            }),
        DynamicTest.dynamicTest(
            "chronometer",
            () -> {
              Path file = folder.resolve("chronometer-1779.csv");
              assertThat(ReadBack.refused(TextSources.of(file), ReadOptions.none()).code())
                  .isEqualTo("sampleStepNeeded");
              checkDaily(file, 1, measured.get(2));
            }));
  }

  private static void checkDaily(Path file, int channel, List<String> row) throws Exception {
    var samples = ReadBack.samples(TextSources.of(file), step(channel, 86_400));
    double[] v = samples.values();
    assertThat(v).hasSize(Integer.parseInt(row.get(1)));
    assertThat(samples.rateHertz()).isEqualTo(1 / 86_400.0);
    assertClose(mean(v), row.get(2), 0);
    assertClose(sampleDeviation(v), row.get(3), 0);
    assertClose(Arrays.stream(v).min().orElseThrow(), row.get(4), 0);
    assertClose(Arrays.stream(v).max().orElseThrow(), row.get(5), 0);
    count("daily series");
  }

  // what is no capture

  @TestFactory
  Stream<DynamicTest> refusesFilesWithoutCapture() {
    requireCorpus();
    List<Path> files = new ArrayList<>(files("csv-quirks", n -> true));
    files.addAll(files("csv-spectrum", n -> true));
    files.addAll(files("csv-vcd-synthetic", n -> n.startsWith("invalid")));
    files.addAll(files("ref-stability-suite", n -> n.startsWith("published")));
    files.addAll(files("vcd-tools", n -> n.equals("sources.csv")));
    return files.stream()
        .map(
            file ->
                DynamicTest.dynamicTest(
                    String.valueOf(file.getFileName()),
                    () -> {
                      var rejection = ReadBack.refused(TextSources.of(file), ReadOptions.none());
                      assertThat(rejection.code())
                          .isIn("noNumbers", "tooShort", "empty", "notANumber", "raggedRow");
                      assertThat(rejection.message()).endsWith(".");
                      count("refused " + rejection.code());
                    }));
  }

  // how cells are split

  @TestFactory
  Stream<DynamicTest> splitsCellsAsTheirJsonSays() {
    requireCorpus();
    return files("csv-spectrum", n -> n.endsWith(".csv")).stream()
        // its JSON shows another telephone number than its CSV, and in another shape
        .filter(f -> !f.toString().contains("location_coordinates"))
        .map(
            file ->
                DynamicTest.dynamicTest(
                    String.valueOf(file.getFileName()),
                    () -> {
                      Path json =
                          file.resolveSibling(
                              String.valueOf(file.getFileName()).replace(".csv", ".json"));
                      String text = Files.readString(file);
                      List<?> expected =
                          new ObjectMapper().readValue(Files.readString(json), List.class);
                      // the stored CSV has lost its CR, the JSON kept it
                      if (Files.readString(json).contains("\\r\\n")) {
                        text = text.replace("\n", "\r\n");
                      }
                      assertThat(asRecords(RowSplitter.split(text, ',')).equals(expected)).isTrue();
                      count("split as JSON");
                    }));
  }

  private static List<Map<String, String>> asRecords(List<Row> rows) {
    List<Map<String, String>> records = new ArrayList<>();
    for (Row row : rows.subList(1, rows.size())) {
      Map<String, String> fields = new LinkedHashMap<>();
      for (int i = 0; i < row.width(); i++) {
        fields.put(rows.get(0).cell(i), row.cell(i));
      }
      records.add(fields);
    }
    return records;
  }
}
