package turnsheet.reading.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.io.ByteArrayInputStream;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.util.UUID;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.capture.CaptureId;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Progress;
import turnsheet.document.ReadingDocument;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.shop.MachineModels;
import turnsheet.shop.PartBasis;
import turnsheet.shop.RotatingPart;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsTechnician
class ReadingPagesTest {

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Readings readings;

  private SampleBench bench;
  private CaptureId capture;
  private ReadingId reading;

  @BeforeEach
  void measureOne() {
    bench = new SampleBench(jdbc, transactions, clock);
    capture = bench.capture("as received", "measured");
    reading = readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());
  }

  @Test
  void linesAreHeldAgainstThePartsAsTheyAreNow() throws Exception {
    // the line of 9.98 Hz, a shaft of 10 Hz on a unit 0.37 % fast
    String page = plain(page("/readings/" + reading));
    assertThat(page)
        .contains("9.98 Hz: capstan shaft, very likely")
        .contains("common practice")
        .contains("mains plug out");
    // the shaft is measured anew: 8 % larger, so that nothing turns at that rate any more
    new MachineModels(jdbc, transactions)
        .change(
            bench.model.id(),
            m ->
                m.changePart(
                    "capstan shaft",
                    new RotatingPart(
                        "capstan shaft",
                        PartKind.CAPSTAN,
                        PartBasis.DIAMETER_MM,
                        1.08 * 190.5 / (10 * Math.PI),
                        null)));
    assertThat(plain(page("/readings/" + reading)))
        .contains("9.98 Hz: nothing known turns at this rate")
        // v (1 + 0.0037) / (pi 9.98 Hz), computed: 6.098 mm
        .contains("a diameter of (6.098")
        .contains("times per turn of capstan shaft");
    mvc.perform(get("/api/v1/readings/" + reading + "/suspects"))
        .andExpect(status().isOk())
        .andExpect(jsonPath("$.lines[0].rateHz").value(9.98))
        .andExpect(jsonPath("$.lines[0].suspects.length()").value(0))
        .andExpect(jsonPath("$.lines[0].lock").value("neither"))
        .andExpect(jsonPath("$.lines[0].explanation.reference").value("capstan shaft"));
    // the document of the day says what was known then
    mvc.perform(get("/api/v1/readings/" + reading))
        .andExpect(jsonPath("$.lines[0].suspects[0].part").value("capstan shaft"));
  }

  @Test
  void readingPageAnswersFirstAndShowsLimitsLinesAndWarnings() throws Exception {
    String page = page("/readings/" + reading);

    assertThat(plain(page))
        .contains(
            "Runs (0.3700 ± 0.0060) % fast, limit ± 0.5 %: within;"
                + " weighted flutter (two-sigma) (0.0670 ± 0.0020) %, limit 0.06 %: outside.");
    assertThat(page)
        .contains("capstan shaft, expected at 10.04 Hz")
        .contains("The recording lasts 4 s: record 60 s or more.")
        .contains("too short")
        .contains("one stretch only")
        .contains("service manual")
        .contains("ab".repeat(32))
        .contains("<svg")
        .doesNotContain("style=")
        .doesNotContain("??");
  }

  @Test
  void theBudgetOfAFigureStandsOnItsPage() throws Exception {
    String page = page("/readings/" + reading);

    // two contributions of 0.0006 and 0.0008 make 0.0010, and twice that 0.0020
    assertThat(page.substring(page.indexOf("class=\"budget stack\"")))
        .containsSubsequence(
            "length of the recording",
            "weighting",
            "0.00060",
            "largest",
            "0.00080",
            "0.0010",
            "0.0020");
    assertThat(page).containsOnlyOnce("number largest");
  }

  @Test
  void captureLeadsToItsNewestReading() throws Exception {
    ReadingId newer = readings.add(capture, SampleReadings.tone(0.2), SampleReadings.series());

    mvc.perform(get("/captures/" + capture + "/reading"))
        .andExpect(redirectedUrl("/readings/" + newer));
    assertThat(page("/readings/" + reading)).contains("/readings/" + newer);
  }

  @Test
  void unknownReadingIsNotFound() throws Exception {
    mvc.perform(get("/readings/" + UUID.randomUUID())).andExpect(status().isNotFound());
    mvc.perform(get("/captures/" + UUID.randomUUID() + "/reading"))
        .andExpect(status().isNotFound());
    mvc.perform(get("/readings/" + reading + "/series/smell")).andExpect(status().isNotFound());
  }

  @Test
  void seriesComeInWindows() throws Exception {
    // samples 500 to 600 lie in this window, and one beyond it where rounding puts an edge between
    mvc.perform(get("/readings/" + reading + "/series/trace?from=1&to=1.2&points=4000"))
        .andExpect(status().isOk())
        .andExpect(jsonPath("$.samplesPerPoint").value(1))
        .andExpect(jsonPath("$.low.length()").value(org.hamcrest.Matchers.oneOf(101, 102)))
        .andExpect(jsonPath("$.high").isEmpty());
    mvc.perform(get("/api/v1/readings/" + reading + "/series/trace?points=10"))
        .andExpect(jsonPath("$.samplesPerPoint").value(200))
        .andExpect(jsonPath("$.high.length()").value(10));
    mvc.perform(get("/readings/" + reading + "/series/histogram"))
        .andExpect(jsonPath("$.counts[1]").value(5));
    mvc.perform(get("/readings/" + reading + "/series/trace?points=4001"))
        .andExpect(status().isUnprocessableContent());
    mvc.perform(get("/readings/" + reading + "/series/trace?from=2&to=1"))
        .andExpect(status().isUnprocessableContent());
  }

  @Test
  void restAndDownloadGiveTheContract() throws Exception {
    String expected = ReadingDocument.toJson(SampleReadings.tone(0.37));
    mvc.perform(get("/api/v1/readings/" + reading)).andExpect(content().string(expected));
    String file =
        mvc.perform(get("/readings/" + reading + ".json"))
            .andExpect(
                header()
                    .string("Content-Disposition", org.hamcrest.Matchers.containsString(".json")))
            .andReturn()
            .getResponse()
            .getContentAsString();
    assertThat(ReadingDocument.fromJson(file)).isEqualTo(SampleReadings.tone(0.37));
    mvc.perform(get("/api/v1/captures/" + capture + "/readings"))
        .andExpect(jsonPath("$[0].readingId").value(reading.toString()))
        .andExpect(jsonPath("$[0].methodVersion").value("1"));
  }

  @Test
  void channelsOfARecordingStandSideBySide() throws Exception {
    assertThat(page("/readings/" + reading)).doesNotContain("Channels of this recording");
    ReadingId second = readings.add(capture, SampleReadings.tone(0.21, 2), SampleReadings.series());
    jdbc.sql("insert into refused_channel values (?, 3, 'silent', 'The channel holds no signal.')")
        .param(capture.value())
        .update();

    String main = page("/readings/" + reading);
    assertThat(main)
        .contains("Channels of this recording")
        .contains("This page shows channel 1, which stands for the recording")
        .contains("href=\"/readings/" + second + "\"")
        .contains("Not measured: The channel holds no signal.")
        .doesNotContain("Other readings")
        .doesNotContain("??");
    assertThat(plain(main)).contains(">+0<").contains(".2100");
    String other = page("/readings/" + second);
    assertThat(other)
        .contains("channel 1 stands for the recording")
        .contains("href=\"/readings/" + reading + "\"")
        .contains("See that one")
        .doesNotContain("??");
    mvc.perform(get("/captures/" + capture + "/reading"))
        .andExpect(redirectedUrl("/readings/" + reading));
    mvc.perform(get("/api/v1/captures/" + capture + "/readings"))
        .andExpect(jsonPath("$[0].readingId").value(reading.toString()))
        .andExpect(jsonPath("$[0].main").value(true))
        .andExpect(jsonPath("$[1].readingId").value(second.toString()))
        .andExpect(jsonPath("$[1].channel").value(2))
        .andExpect(jsonPath("$[1].main").value(false));
    mvc.perform(get("/api/v1/captures/" + capture + "/channels"))
        .andExpect(jsonPath("$.length()").value(3))
        .andExpect(jsonPath("$[0].main").value(true))
        .andExpect(jsonPath("$[0].refusal").isEmpty())
        .andExpect(jsonPath("$[1].readingId").value(second.toString()))
        .andExpect(jsonPath("$[2].readingId").isEmpty())
        .andExpect(jsonPath("$[2].refusal.code").value("silent"));
    mvc.perform(get("/api/v1/readings/" + second)).andExpect(jsonPath("$.source.channel").value(2));
  }

  @Test
  void tablesComeAsCsv() throws Exception {
    assertThat(page("/readings/" + reading + ".csv"))
        .contains("speed.deviationPercent,0.37,0.006,2.0,")
        .contains("speed.driftPercentPerMinute,,,,too short");
    assertThat(page("/readings/" + reading + "/series/trace.csv").lines()).hasSize(2001);
    assertThat(page("/readings/" + reading + "/series/histogram.csv")).contains("300.5,301.0,5");
  }

  @Test
  void visitPageShowsEachCaptureInItsPlace() throws Exception {
    bench.capture("after repair", "refused");
    bench.capture("after cleaning", "recognised");
    String page = page("/visits/" + bench.visit.id());

    assertThat(page)
        .contains("+0.3700")
        .contains("outside")
        .contains("The file is silent: record it again.")
        .contains("after cleaning")
        .contains("voices waver")
        .doesNotContain("??");
  }

  @Test
  void visitLeadsToItsSheetOnceSomethingIsMeasured() throws Exception {
    SampleBench empty = new SampleBench(jdbc, transactions, clock);
    assertThat(page("/visits/" + empty.visit.id()))
        .doesNotContain("/visits/" + empty.visit.id() + "/sheet");
    assertThat(page("/visits/" + bench.visit.id()))
        .contains("/visits/" + bench.visit.id() + "/sheet");
  }

  @Test
  void unitPageFollowsTheChosenFigure() throws Exception {
    String byDefault = page("/units/" + bench.unit.id());
    String chosen = page("/units/" + bench.unit.id() + "?figure=speed.deviationPercent");

    assertThat(byDefault).contains(">.0670<").contains("Limit 0.06").doesNotContain("??");
    assertThat(chosen).contains(">.3700<").contains("0.5").contains("<svg");
  }

  @Test
  void benchSaysWhatEachVisitNeeds() throws Exception {
    bench.capture("after repair", "recognised");
    String page = page("/");

    assertThat(page)
        .contains(bench.model.name())
        .contains("Waiting for you to confirm")
        .contains("Outside a limit")
        .contains("Confirm the recordings that have come in")
        .doesNotContain("??");
    String today = page.substring(page.indexOf("id=\"today\""));
    assertThat(today).contains("/visits/" + bench.visit.id());
  }

  private String page(String address) throws Exception {
    return mvc.perform(get(address))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString(java.nio.charset.StandardCharsets.UTF_8);
  }

  private static String plain(String page) {
    return page.replace('\u202f', ' ').replace("\u2009", " ");
  }

  @Test
  void showsRateOverTimeAndPlaysTheSpeed() throws Exception {
    String page = page("/readings/" + reading);

    assertThat(page)
        .contains("No line below 20 Hz changes its rate during the recording.")
        .contains("Rate of the fluctuation over time")
        .contains("drawn-cells")
        .contains("/readings/" + reading + "/sound.wav?faster=20");
    assertThat(plain(page("/readings/" + reading + "?faster=50&line=9.98")))
        .contains("Played 50 times faster and over and over: 9.98 Hz is heard at 499 Hz");
  }

  /** The samples' minute holds one line of 0.05 %: 20 times faster a tone of 199.6 Hz. */
  @Test
  void theSoundIsAWaveFileOfTheRateThatWasAskedFor() throws Exception {
    byte[] wave =
        mvc.perform(get("/readings/" + reading + "/sound.wav?faster=20"))
            .andExpect(status().isOk())
            .andExpect(content().contentType("audio/wav"))
            .andReturn()
            .getResponse()
            .getContentAsByteArray();

    ByteBuffer bytes = ByteBuffer.wrap(wave).order(ByteOrder.LITTLE_ENDIAN);
    assertThat(bytes.getInt(24)).isEqualTo(20 * 500);
    int crossings = 0;
    for (int at = 46; at + 1 < wave.length; at += 2) {
      crossings += bytes.getShort(at - 2) < 0 && bytes.getShort(at) >= 0 ? 1 : 0;
    }
    // 60 s of 9.98 Hz, less the fade at both ends
    assertThat(crossings).isBetween(595, 600);
    mvc.perform(get("/readings/" + reading + "/sound.wav?faster=7"))
        .andExpect(status().isUnprocessableContent());
    mvc.perform(get("/readings/" + reading + "/sound.wav?faster=20&line=-3"))
        .andExpect(status().isUnprocessableContent());
  }

  @Test
  void movingLinesComeAsADocument() throws Exception {
    mvc.perform(get("/api/v1/readings/" + reading + "/motion"))
        .andExpect(status().isOk())
        .andExpect(content().json("[]"));
    mvc.perform(get("/api/v1/readings/" + UUID.randomUUID() + "/motion"))
        .andExpect(status().isNotFound());
  }

  /** 5000 periods of 100 µs: half a second, from which no speed trace can be made. */
  @Test
  void aReadingOfPeriodsAloneHasAPageWithoutCurves() throws Exception {
    StringBuilder periods = new StringBuilder("period_s\n");
    for (int i = 0; i < 5000; i++) {
      periods.append(i % 3 == 0 ? "0.0001001\n" : "0.0000999\n");
    }
    byte[] bytes = periods.toString().getBytes(StandardCharsets.UTF_8);
    Outcome outcome =
        new Measurement(CaptureFormats.standard())
            .measure(
                new ByteSource() {
                  @Override
                  public InputStream open() {
                    return new ByteArrayInputStream(bytes);
                  }

                  @Override
                  public long length() {
                    return bytes.length;
                  }
                },
                "00",
                ReadOptions.none(),
                MeasureSettings.edges(10_000, null),
                Progress.NONE);
    assertThat(outcome).isInstanceOf(Outcome.Measured.class);
    Outcome.Measured measured = (Outcome.Measured) outcome;
    ReadingId brief =
        readings.add(bench.capture("brief", "measured"), measured.reading(), measured.series());

    String page = page("/readings/" + brief);

    assertThat(page)
        .contains("Less than a second could be used")
        .contains("The edges sit on a grid of")
        .contains("the recording is too short to tell how the speed varies")
        .doesNotContain("data-plot=\"trace\"");
    mvc.perform(get("/readings/" + brief + ".csv")).andExpect(status().isOk());
    mvc.perform(get("/readings/" + brief + "/series/trace")).andExpect(status().isNotFound());
    mvc.perform(get("/readings/" + brief + "/sound.wav")).andExpect(status().isNotFound());
  }
}
