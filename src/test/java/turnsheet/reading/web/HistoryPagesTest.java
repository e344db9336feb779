package turnsheet.reading.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hamcrest.Matchers.closeTo;
import static org.hamcrest.Matchers.startsWith;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.UUID;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.reading.Trends;
import turnsheet.shop.Unit;
import turnsheet.shop.VisitId;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsTechnician
class HistoryPagesTest {

  private static final Instant FIRST = Instant.parse("2017-06-15T10:00:00Z");

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Readings readings;

  private SampleBench bench;

  @BeforeEach
  void openABench() {
    bench = new SampleBench(jdbc, transactions, clock);
  }

  /** 0.03 % and 0.003 % more each year: the limit of 0.06 % after ten years, in June 2027. */
  @Test
  void aTrendIsDrawnAndSaidWithItsDate() throws Exception {
    for (int i = 0; i < 5; i++) {
      visit(bench.unit, 2 * i, 0.03 + 0.006 * i);
    }
    String page = page("/units/" + bench.unit.id());

    // by hand: u = 0.001 and Sxx = 40: 1.96 * 0.001 / 6.32 = 0.00031
    assertThat(plain(page))
        .contains(
            "Over 5 visits since 2017-06 it has been rising by (0.00300 ± 0.00031) % a year;"
                + " at that rate it meets the limit of 0.06 % about 2027-06"
                + " (95 %: between 2026-10 and 2028-03).")
        .contains("drawn-band")
        .contains("trend with its band")
        .doesNotContain("??");
    assertThat(page.split("drawn-visit", -1)).hasSize(7); // the open visit too
    assertThat(page.split("class=\"drawn-join\"", -1)).hasSize(6);
    mvc.perform(history("flutter.weightedTwoSigmaPercent"))
        .andExpect(status().isOk())
        .andExpect(jsonPath("$.unit").value("%"))
        .andExpect(jsonPath("$.points.length()").value(10))
        .andExpect(jsonPath("$.points[0].value").value(0.09))
        .andExpect(jsonPath("$.points[0].expandedUncertainty").value(0.002))
        .andExpect(jsonPath("$.points[0].condition").value("as received"))
        .andExpect(jsonPath("$.points[0].inTrend").value(false))
        .andExpect(jsonPath("$.points[1].inTrend").value(true))
        .andExpect(jsonPath("$.limit.upperBound").value(0.06))
        .andExpect(jsonPath("$.trend.shown").value(true))
        .andExpect(jsonPath("$.trend.visits").value(5))
        .andExpect(jsonPath("$.trend.perYear").value(closeTo(0.003, 1e-9), Double.class))
        .andExpect(jsonPath("$.trend.outlook").value("meets"))
        .andExpect(jsonPath("$.trend.meetsAt").value(startsWith("2027-06")))
        .andExpect(jsonPath("$.population.units").value(1))
        .andExpect(jsonPath("$.population.lowerQuartile").isEmpty());
    mvc.perform(history("speed.deviationPercent"))
        .andExpect(jsonPath("$.trend.shown").value(false))
        .andExpect(jsonPath("$.trend.why").value("notSignificant"));
  }

  @Test
  void threeVisitsAreSaidToBeTooFew() throws Exception {
    for (int i = 0; i < 3; i++) {
      visit(bench.unit, 2 * i, 0.03 + 0.006 * i);
    }
    assertThat(page("/units/" + bench.unit.id()))
        .contains("No trend is shown: it takes the last reading of at least 4 visits")
        .doesNotContain("drawn-band");
    mvc.perform(history("flutter.weightedTwoSigmaPercent"))
        .andExpect(jsonPath("$.trend.why").value("tooFewVisits"))
        .andExpect(jsonPath("$.trend.perYear").isEmpty());
  }

  @Test
  void aUnitIsHeldAgainstTheOthersOfItsModel() throws Exception {
    visit(bench.unit, 1, 0.05);
    for (int i = 1; i <= 4; i++) {
      visit(bench.anotherUnit("20" + i), 1, 0.01 * i);
    }
    // 0.01 to 0.05: quartiles 0.02 and 0.04, median 0.03
    assertThat(plain(page("/units/" + bench.unit.id())))
        .contains(
            "Newest reading 0.05 %. The middle half of the 5 units of this model, this one among"
                + " them, reads 0.02 to 0.04 %, median 0.03 %: this one lies above.");
    assertThat(page("/models/" + bench.model.id()))
        .containsSubsequence("Typical", "two-sigma", ">5<", ">.02<", ">.03<", ">.04<")
        .doesNotContain("??");
    mvc.perform(history("flutter.weightedTwoSigmaPercent"))
        .andExpect(jsonPath("$.population.units").value(5))
        .andExpect(jsonPath("$.population.lowerQuartile").value(0.02))
        .andExpect(jsonPath("$.population.median").value(0.03))
        .andExpect(jsonPath("$.population.upperQuartile").value(0.04));
  }

  @Test
  void whatDoesNotExistIsSaid() throws Exception {
    mvc.perform(history("nothing")).andExpect(status().isUnprocessableContent());
    mvc.perform(
            get("/api/v1/units/" + bench.unit.id() + "/history")
                .param("setting", UUID.randomUUID().toString())
                .param("figure", "speed.deviationPercent"))
        .andExpect(status().isNotFound());
    mvc.perform(
            get("/api/v1/units/" + UUID.randomUUID() + "/history")
                .param("setting", bench.setting.toString())
                .param("figure", "speed.deviationPercent"))
        .andExpect(status().isNotFound());
  }

  private MockHttpServletRequestBuilder history(String figure) {
    return get("/api/v1/units/" + bench.unit.id() + "/history")
        .param("setting", bench.setting.toString())
        .param("figure", figure);
  }

  /** Came with 0.09 %, left a day later with what is given. */
  private void visit(Unit unit, int years, double twoSigmaPercent) {
    Instant came = FIRST.plus(Duration.ofSeconds((long) (years * Trends.SECONDS_PER_YEAR)));
    VisitId visit = bench.pastVisit(unit, came);
    readings.add(
        bench.capture(visit, "as received", "measured", came),
        SampleReadings.tone(0.1, 0.09),
        SampleReadings.series());
    readings.add(
        bench.capture(visit, "after repair", "measured", came.plus(Duration.ofDays(1))),
        SampleReadings.tone(0.1, twoSigmaPercent),
        SampleReadings.series());
  }

  private String page(String address) throws Exception {
    return mvc.perform(get(address))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString(StandardCharsets.UTF_8);
  }

  private static String plain(String page) {
    return page.replace('\u202f', ' ').replace("\u2009", " ");
  }
}
