package turnsheet.evidence.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Clock;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.access.ShopLanguage;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.evidence.Evidence;
import turnsheet.evidence.LookedAt;
import turnsheet.reading.SampleBench;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;
import turnsheet.web.PageLanguage;

/** The sensor wheel on the page of a closer look. */
@ServiceTest
@AsTechnician
@Timeout(value = 2, unit = TimeUnit.MINUTES)
class WheelSectionTest {

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Intake intake;
  @Autowired Captures captures;
  @Autowired Evidence evidence;
  @Autowired ShopLanguage language;

  private LookedAt bench;

  @BeforeEach
  void open() {
    bench = new LookedAt(new SampleBench(jdbc, transactions, clock), intake, captures, evidence);
  }

  @Test
  void aBentToothIsPointedToByItsNumberFromTheMark() throws Exception {
    CaptureId id = bench.measured(LookedAt.wheel());
    String address = "/captures/" + id + "/evidence";
    evidence.look(id);
    bench.awaitLook(id);

    String page = page(address);
    assertThat(page)
        .contains("The wheel has 60 places a turn")
        .contains("Tooth 17: its edge comes")
        .contains("The reference mark lacks 2 teeth")
        .contains("The pattern round the wheel")
        .contains("switch off, unplug")
        .doesNotContain("??");
    language.put(PageLanguage.GERMAN);
    try {
      assertThat(page(address))
          .contains("Das Rad hat 60 Plätze je Umdrehung")
          .contains("Zahn 17: Seine Flanke kommt um")
          .doesNotContain("??");
    } finally {
      language.put(PageLanguage.ENGLISH);
    }
    mvc.perform(get("/api/v1" + address))
        .andExpect(jsonPath("$[0].sections[?(@.name=='wheel')].found.finding.places").value(60))
        .andExpect(
            jsonPath("$[0].sections[?(@.name=='wheel')].found.finding.damage[0].kind")
                .value("early"))
        .andExpect(
            jsonPath("$[0].sections[?(@.name=='wheel')].found.finding.damage[0].tooth").value(17));
  }

  @Test
  void theNumberOfTeethIsAskedForAndTaken() throws Exception {
    CaptureId id = bench.measured(LookedAt.tachometer());
    String address = "/captures/" + id + "/evidence";
    evidence.look(id);
    bench.awaitLook(id);
    String field = "id=\"wheel-teeth\"";
    assertThat(page(address)).contains(field);
    mvc.perform(post(address + "/teeth").param("teeth", "0").with(csrf()))
        .andExpect(status().isUnprocessableContent());

    mvc.perform(post(address + "/teeth").param("teeth", "40").with(csrf()))
        .andExpect(redirectedUrl("/captures/" + id));

    LookedAt.await(() -> captures.find(id).orElseThrow().state() != CaptureState.QUEUED);
    evidence.look(id);
    bench.awaitLook(id);
    assertThat(page(address))
        .contains("40 pulses per turn were stated")
        .contains("shows no pattern beyond the noise")
        .doesNotContain(field);
  }

  private String page(String address) throws Exception {
    return mvc.perform(get(address))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString();
  }
}
