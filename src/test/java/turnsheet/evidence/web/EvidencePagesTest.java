package turnsheet.evidence.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Clock;
import java.util.UUID;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.evidence.Evidence;
import turnsheet.evidence.LookedAt;
import turnsheet.job.JobState;
import turnsheet.job.Jobs;
import turnsheet.reading.SampleBench;
import turnsheet.shop.MachineModels;
import turnsheet.shop.PartBasis;
import turnsheet.shop.RotatingPart;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

/** From the button to what a closer look showed, through the real job table and engine. */
@ServiceTest
@AsTechnician
@Timeout(value = 2, unit = TimeUnit.MINUTES)
class EvidencePagesTest {

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Intake intake;
  @Autowired Captures captures;
  @Autowired Evidence evidence;
  @Autowired Jobs jobs;

  private SampleBench sample;
  private LookedAt bench;

  @BeforeEach
  void open() {
    sample = new SampleBench(jdbc, transactions, clock);
    bench = new LookedAt(sample, intake, captures, evidence);
  }

  @Test
  void aCloserLookAtAToneIsOrderedAndShown() throws Exception {
    CaptureId id = bench.measured(LookedAt.tone());
    String address = "/captures/" + id + "/evidence";
    assertThat(page(address)).contains("Look closer").doesNotContain("Look closer again");
    mvc.perform(get("/api/v1" + address)).andExpect(jsonPath("$.length()").value(0));

    mvc.perform(post(address).with(csrf())).andExpect(redirectedUrl(address));
    bench.awaitLook(id);

    String page = page(address);
    assertThat(page)
        .contains("Look closer again")
        .contains("The mains ran at (50.02")
        .contains("<svg")
        .doesNotContain("Signal of the sensor</h2>")
        .doesNotContain("style=")
        .doesNotContain("The machine's own part")
        .doesNotContain("??");
    // closed form: the hum says +0.04 % (50.02 Hz), the speed is +0.12 %, and
    // 1.0012 / 1.0004 - 1 = 0.080 %
    assertThat(page(address + "?said=true&synchronous=true").replace("&#39;", "'"))
        .contains("The machine's own part")
        .containsPattern(
            "from the supply and \\(\\+0\\.0(79|80)\\d* ± [\\d.]+\\) %".replace(" ", "[ \u202f]"));
    assertThat(page(address + "?channel=7&lang=de")).doesNotContain("??");
    mvc.perform(get("/api/v1" + address))
        .andExpect(jsonPath("$[0].channel").value(1))
        .andExpect(jsonPath("$[0].settings.kind").value("tone"))
        .andExpect(jsonPath("$[0].sections[0].name").value("mains"))
        .andExpect(jsonPath("$[0].sections[0].found.nominalHz").value(50.0));
    mvc.perform(get("/api/v1" + address + "/job"))
        .andExpect(jsonPath("$.jobState").value("done"))
        .andExpect(jsonPath("$.over").value(true));
  }

  /** The model's parts say what the motor is; the visitor may say otherwise. */
  @Test
  void aSynchronousMotorAmongThePartsSplitsTheErrorUnasked() throws Exception {
    CaptureId id = bench.measured(LookedAt.tone());
    evidence.look(id);
    bench.awaitLook(id);
    String address = "/captures/" + id + "/evidence";
    assertThat(page(address)).doesNotContain("own part");
    MachineModels models = new MachineModels(jdbc, transactions);
    models.change(
        sample.model.id(),
        model ->
            model.withPart(
                new RotatingPart("motor", PartKind.MOTOR, PartBasis.MAINS_POLE_PAIRS, 2, null)));

    assertThat(page(address)).contains("own part");
    assertThat(page(address + "?said=true")).doesNotContain("own part");
  }

  @Test
  void theSignalOfATachometerIsJudged() throws Exception {
    CaptureId id = bench.measured(LookedAt.tachometer());
    evidence.look(id);
    bench.awaitLook(id);

    String page = page("/captures/" + id + "/evidence").replace("&#39;", "'");
    assertThat(page)
        .contains("With this signal the smallest flutter that can be shown is")
        .contains("the signal's: it rides on the pulses, the shaft does not do it")
        .contains("the shaft's: both readings show it")
        .contains("charged capacitors")
        .doesNotContain("style=")
        .doesNotContain("??");
  }

  @Test
  void aLookThatIsRunTwiceLeavesOneDocument() throws Exception {
    CaptureId id = bench.measured(LookedAt.tone());
    evidence.look(id);
    bench.awaitLook(id);
    // as after a process killed between the last document and the end of the job
    transactions.executeWithoutResult(status -> jobs.enqueue(Evidence.JOB, id.value()));
    bench.awaitLook(id);

    assertThat(jobs.ofSubject(id.value()))
        .filteredOn(job -> job.name().equals(Evidence.JOB))
        .hasSize(2)
        .allSatisfy(job -> assertThat(job.state()).isEqualTo(JobState.DONE));
    assertThat(evidence.of(id)).hasSize(1);
  }

  @Test
  void whatCannotBeLookedAtIsSaid() throws Exception {
    CaptureId unmeasured = bench.recognised(LookedAt.tone());
    mvc.perform(post("/api/v1/captures/" + unmeasured + "/evidence").with(csrf()))
        .andExpect(status().isUnprocessableContent())
        .andExpect(jsonPath("$.code").value("notMeasured"));
    mvc.perform(get("/captures/" + unmeasured + "/evidence")).andExpect(status().isNotFound());
    mvc.perform(get("/api/v1/captures/" + UUID.randomUUID() + "/evidence"))
        .andExpect(status().isNotFound());
  }

  private String page(String address) throws Exception {
    return mvc.perform(get(address))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString();
  }
}
