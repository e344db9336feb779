package turnsheet.bench.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.time.Instant;
import java.time.YearMonth;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.capture.CaptureId;
import turnsheet.reading.Floors.Floor;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;
import turnsheet.web.Times;

@ServiceTest
@AsTechnician
class InstrumentPageTest {

  @Autowired private MockMvcTester mvc;
  @Autowired private Instruments instruments;
  @Autowired private JdbcClient jdbc;
  @Autowired private TransactionTemplate transactions;
  @Autowired private Clock clock;
  @Autowired private Readings readings;

  @Test
  void followsTheFloorOfWhatWasRecorded() throws Exception {
    InstrumentId id = InstrumentId.next();
    instruments.add(new BenchInstrument(id, "Card " + id, 5, 10.0, null, ""));
    assertThat(page(id))
        .contains("No recording made with this instrument")
        .doesNotContain("<svg x");

    SampleBench bench = new SampleBench(jdbc, transactions, clock);
    Instant then = Instant.parse("2025-07-10T12:00:00Z");
    CaptureId capture = bench.capture(bench.visit.id(), "as received", "measured", then);
    readings.add(capture, SampleReadings.tone(0.1), SampleReadings.series());
    jdbc.sql("update capture set instrument_id = ? where id = ?")
        .params(id.value(), capture.value())
        .update();

    assertThat(page(id))
        .containsSubsequence("drawn-dot series-1", "2025-07", ">1<", ">0.00400<")
        .doesNotContain("??");
  }

  /** By hand: 1, 2, 3, 4 have quartiles 1.75 and 3.25; three values have none. */
  @Test
  void putsFloorsTogetherByMonth() {
    List<FloorMonth> months =
        FloorMonth.of(
            List.of(
                floor("2025-07-01T12:00:00Z", 4),
                floor("2025-07-02T12:00:00Z", 2),
                floor("2025-07-30T12:00:00Z", 1),
                floor("2025-07-30T13:00:00Z", 3),
                floor("2025-09-01T12:00:00Z", 7)),
            new Times());
    assertThat(months)
        .extracting(FloorMonth::month)
        .containsExactly(YearMonth.of(2025, 7), YearMonth.of(2025, 9));
    assertThat(months.get(0).quantiles().at(0.25)).isEqualTo(1.75);
    assertThat(months.get(0).quantiles().at(0.75)).isEqualTo(3.25);
    assertThat(months.get(1).hasQuartiles()).isFalse();
    assertThat(months.get(1).quantiles().median()).isEqualTo(7);
  }

  private static Floor floor(String at, double percent) {
    return new Floor(Instant.parse(at), percent);
  }

  private String page(InstrumentId id) throws Exception {
    MvcTestResult answer = mvc.get().uri("/instruments/" + id).exchange();
    assertThat(answer).hasStatusOk();
    return answer.getResponse().getContentAsString(StandardCharsets.UTF_8);
  }
}
