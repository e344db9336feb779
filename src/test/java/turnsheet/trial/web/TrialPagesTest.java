package turnsheet.trial.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.delete;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Clock;
import java.time.Duration;
import java.util.Objects;
import java.util.UUID;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.capture.Wish;
import turnsheet.core.measure.CaptureKind;
import turnsheet.evidence.LookedAt;
import turnsheet.reading.SampleBench;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

/** From the form to the circuit, through the real job table and engine. */
@ServiceTest
@AsTechnician
@Timeout(value = 2, unit = TimeUnit.MINUTES)
class TrialPagesTest {

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Intake intake;
  @Autowired Captures captures;

  private SampleBench bench;

  @BeforeEach
  void open() {
    bench = new SampleBench(jdbc, transactions, clock);
  }

  @Test
  void aTrialIsOrderedShownOpenedAndRemoved() throws Exception {
    CaptureId id = measured(LookedAt.tachometer(), CaptureKind.TACHOMETER);
    String list = "/captures/" + id + "/trials";
    assertThat(page(list)).contains("Try filters").contains("value=\"640\"").doesNotContain("??");

    String address = ordered(list, "2", "100", "300");
    await(address);

    String found = page(address);
    assertThat(found)
        .contains("The sensible choice is the Bu")
        .contains("Hz high-pass".isEmpty() ? "" : "<svg")
        .contains("Before you build or connect anything")
        .contains("R11")
        .contains("gain-bandwidth product")
        .doesNotContain("??");
    assertThat(page(address + "?candidate=1")).contains("Circuit: Butterworth high-pass, 2 poles");
    assertThat(page(address + "?candidate=0&lang=de")).doesNotContain("??");
    assertThat(page(list)).contains("Trials so far").contains("4 candidates");
    String api = "/api/v1" + address;
    mvc.perform(get(api))
        .andExpect(jsonPath("$.job.jobState").value("done"))
        .andExpect(jsonPath("$.result.rows.length()").value(5))
        .andExpect(jsonPath("$.result.choice.reason").value("fewestPoles"));
    mvc.perform(get(api + "/circuit?row=1"))
        .andExpect(jsonPath("$.stages.length()").value(1))
        .andExpect(jsonPath("$.responses.length()").value(61));
    mvc.perform(get(api + "/circuit?row=0")).andExpect(status().isNotFound());

    assertThat(page(address + "/remove")).contains("Remove this trial with its result?");
    mvc.perform(post(address + "/remove").with(csrf())).andExpect(redirectedUrl(list));
    mvc.perform(get(address)).andExpect(status().isNotFound());
  }

  @Test
  void aTrialCanBeCalledOff() throws Exception {
    CaptureId id = measured(LookedAt.tachometer(), CaptureKind.TACHOMETER);
    String list = "/captures/" + id + "/trials";
    String address = ordered(list, "12", "50", "600");
    assertThat(page(address)).contains("Cancel the trial").contains("data-progress");
    mvc.perform(post(address + "/cancel").with(csrf())).andExpect(redirectedUrl(address));
    mvc.perform(get(address + "/progress"))
        .andExpect(jsonPath("$.jobState").value("cancelled"))
        .andExpect(jsonPath("$.over").value(true));
    assertThat(page(address)).contains("This trial was called off").doesNotContain("<progress");
    assertThat(page(list)).contains("called off");
    mvc.perform(delete("/api/v1" + address)).andExpect(status().isNoContent());
    mvc.perform(get("/api/v1" + address)).andExpect(status().isNotFound());
  }

  @Test
  void anOrderByRestBeginsWithTheProposal() throws Exception {
    CaptureId id = measured(LookedAt.tachometer(), CaptureKind.TACHOMETER);
    String api = "/api/v1/captures/" + id + "/trials";
    String proposal =
        mvc.perform(get(api + "/proposal")).andReturn().getResponse().getContentAsString();
    assertThat(proposal).contains("\"kinds\":[\"highPass\",\"lowPass\",\"bandPass\"]");
    String small =
        proposal
            .replace("[\"highPass\",\"lowPass\",\"bandPass\"]", "[\"highPass\"]")
            .replace("[2,4,6,8]", "[2]")
            .replace("\"steps\":3", "\"steps\":1");
    mvc.perform(post(api).contentType("application/json").content(small))
        .andExpect(status().isAccepted())
        .andExpect(jsonPath("$.order.steps").value(1));
    mvc.perform(post(api).contentType("application/json").content("{}"))
        .andExpect(status().isUnprocessableContent())
        .andExpect(jsonPath("$.code").value("trialOrder"));
    mvc.perform(get(api)).andExpect(jsonPath("$.length()").value(1));
  }

  @Test
  void whatCannotBeTriedIsSaid() throws Exception {
    CaptureId tone = measured(LookedAt.tone(), CaptureKind.TONE);
    mvc.perform(get("/captures/" + tone + "/trials")).andExpect(status().isUnprocessableContent());
    mvc.perform(get("/captures/" + UUID.randomUUID() + "/trials")).andExpect(status().isNotFound());
    CaptureId id = measured(LookedAt.tachometer(), CaptureKind.TACHOMETER);
    String list = "/captures/" + id + "/trials";
    String refused =
        mvc.perform(form(list, "13", "300", "100").param("poles", "4"))
            .andExpect(status().isUnprocessableContent())
            .andReturn()
            .getResponse()
            .getContentAsString();
    assertThat(refused).contains("At most 12 cutoffs.").contains("Must not be smaller");
  }

  private String ordered(String list, String steps, String from, String to) throws Exception {
    return Objects.requireNonNull(
        mvc.perform(form(list, steps, from, to))
            .andExpect(status().is3xxRedirection())
            .andReturn()
            .getResponse()
            .getRedirectedUrl());
  }

  private static MockHttpServletRequestBuilder form(
      String list, String steps, String from, String to) {
    return post(list)
        .with(csrf())
        .param("kinds", "HIGH_PASS")
        .param("families", "BUTTERWORTH", "BESSEL")
        .param("poles", "2")
        .param("highPassFrom", from)
        .param("highPassTo", to)
        .param("lowPassFrom", "2000")
        .param("lowPassTo", "4000")
        .param("steps", steps)
        .param("hysteresis", "10")
        .param("offset", "-1")
        .param("goodEnough", "0.05")
        .param("lowest", "800")
        .param("highest", "800")
        .param("series", "E96")
        .param("capacitor", "10e-9")
        .param("resistorPercent", "1")
        .param("capacitorPercent", "5");
  }

  private CaptureId measured(byte[] wav, CaptureKind kind) throws Exception {
    Capture capture =
        intake.receive(
            new CaptureKey(bench.visit.id(), bench.setting, "as received", null, null),
            "tacho.wav",
            "technician",
            new java.io.ByteArrayInputStream(wav));
    CaptureId id = intake.confirm(capture.id(), Wish.none()).id();
    while (captures.find(id).orElseThrow().state() == CaptureState.QUEUED) {
      LockSupport.parkNanos(Duration.ofMillis(30).toNanos());
    }
    Capture measured = captures.find(id).orElseThrow();
    assertThat(Objects.requireNonNull(measured.choices()).settings().kind()).isEqualTo(kind);
    return id;
  }

  private void await(String address) throws Exception {
    while (!mvc.perform(get(address + "/progress"))
        .andReturn()
        .getResponse()
        .getContentAsString()
        .contains("\"over\":true")) {
      LockSupport.parkNanos(Duration.ofMillis(50).toNanos());
    }
  }

  private String page(String address) throws Exception {
    return mvc.perform(get(address))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString();
  }
}
