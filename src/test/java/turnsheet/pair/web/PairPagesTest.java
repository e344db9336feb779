package turnsheet.pair.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.anonymous;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.io.ByteArrayOutputStream;
import java.time.Clock;
import java.time.Duration;
import java.util.UUID;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.MvcResult;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.access.ShopLanguage;
import turnsheet.access.ShopProfiles;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.capture.Intake;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;
import turnsheet.evidence.Evidence;
import turnsheet.evidence.LookedAt;
import turnsheet.pair.Pairs;
import turnsheet.pair.StoredPair;
import turnsheet.reading.SampleBench;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;
import turnsheet.web.PageLanguage;

/** From the form to the sheet and the link that opens it, through the real job table and engine. */
@ServiceTest
@AsTechnician
@Timeout(value = 2, unit = TimeUnit.MINUTES)
class PairPagesTest {

  private static final int RATE_HERTZ = 16_000;

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Intake intake;
  @Autowired Captures captures;
  @Autowired Evidence evidence;
  @Autowired Pairs pairs;
  @Autowired ShopLanguage language;
  @Autowired ShopProfiles profiles;

  private LookedAt bench;

  @BeforeEach
  void open() {
    bench = new LookedAt(new SampleBench(jdbc, transactions, clock), intake, captures, evidence);
  }

  @Test
  void twoChannelsOfOneRecordingMakeASheetThatCanBeShared() throws Exception {
    CaptureId id = bench.measured(stereo(4000.0 / 3));
    String form = page("/captures/" + id + "/pair");
    assertThat(form).contains("channel 2", "mains voltage", "Compare").doesNotContain("??");

    UUID made = order(id + ":1", 60, id + ":2", 100);

    String sheet = page("/pairs/" + made);
    // the second channel has a fifth of the noise on the same flanks
    assertThat(sheet)
        .contains("The replacement is quieter", "The machine itself flutters by", "<svg")
        .contains("5 V regulated", "&lt;b&gt;")
        .doesNotContain("??", "<b>");
    assertThat(german("/pairs/" + made))
        .contains("Der neue Geber ist ruhiger")
        .doesNotContain("??");
    assertThat(page("/captures/" + id + "/pair")).contains("/pairs/" + made);

    String token = share(made);
    String shared =
        mvc.perform(get("/s/pair/" + token).with(anonymous()))
            .andExpect(status().isOk())
            .andReturn()
            .getResponse()
            .getContentAsString();
    assertThat(shared).contains("The replacement is quieter").doesNotContain("??", "/captures/");
    mvc.perform(post("/pairs/" + made + "/links/withdraw").with(csrf()));
    mvc.perform(get("/s/pair/" + token).with(anonymous())).andExpect(status().isNotFound());
    mvc.perform(get("/s/pair/nothing").with(anonymous())).andExpect(status().isNotFound());
  }

  @Test
  void oneAfterTheOtherIsComparedLikeBeforeAndAfter() throws Exception {
    CaptureId one = bench.measured(mono(1, 0.01));
    CaptureId other = bench.measured(mono(2, 0.002));

    UUID made = order(one + ":1", 60, other + ":1", 60);

    assertThat(page("/pairs/" + made))
        .contains("The replacement is quieter", "is not known from so few")
        .doesNotContain("??", "The machine itself flutters");
  }

  @Test
  void wrongTeethAndSameChannelsAreSaid() throws Exception {
    CaptureId id = bench.measured(stereo(800));
    UUID made = order(id + ":1", 60, id + ":2", 59);
    assertThat(page("/pairs/" + made)).contains("check the pulses per turn of both");
    assertThat(german("/pairs/" + made)).contains("Prüfen Sie die Impulse");

    mvc.perform(asked(id + ":1", 60, id + ":1", 60)).andExpect(status().isUnprocessableContent());
    mvc.perform(asked(id + ":1", 60, "nothing", 60)).andExpect(status().isUnprocessableContent());
    mvc.perform(get("/captures/" + UUID.randomUUID() + "/pair")).andExpect(status().isNotFound());
  }

  private org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder asked(
      String original, int teeth, String replacement, int others) {
    return post("/captures/" + original.split(":", -1)[0] + "/pair")
        .with(csrf())
        .param("original", original)
        .param("originalTeeth", Integer.toString(teeth))
        .param("replacement", replacement)
        .param("replacementTeeth", Integer.toString(others))
        .param("supply", " 5 V regulated ")
        .param("remarks", "<b>");
  }

  private UUID order(String original, int teeth, String replacement, int others) throws Exception {
    MvcResult answer =
        mvc.perform(asked(original, teeth, replacement, others))
            .andExpect(status().is3xxRedirection())
            .andReturn();
    String address = String.valueOf(answer.getResponse().getRedirectedUrl());
    UUID made = UUID.fromString(address.substring(address.lastIndexOf('/') + 1));
    while (!pairs.job(made).orElseThrow().state().isOver()) {
      LockSupport.parkNanos(Duration.ofMillis(30).toNanos());
    }
    StoredPair pair = pairs.find(made).orElseThrow();
    assertThat(pair.sheet()).isNotNull();
    return made;
  }

  private String share(UUID made) throws Exception {
    Object address =
        mvc.perform(post("/pairs/" + made + "/links").with(csrf()))
            .andReturn()
            .getFlashMap()
            .get("address");
    String text = String.valueOf(address);
    return text.substring(text.lastIndexOf('/') + 1);
  }

  private String german(String address) throws Exception {
    if (profiles.get().isEmpty()) {
      profiles.put(new ShopProfiles.ShopProfile("A shop", ""));
    }
    language.put(PageLanguage.GERMAN);
    try {
      return page(address);
    } finally {
      language.put(PageLanguage.ENGLISH);
    }
  }

  private String page(String address) throws Exception {
    return mvc.perform(get(address))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString();
  }

  private static byte[] stereo(double secondRate) throws Exception {
    return wav(pulses(800, 1, 0.01), pulses(secondRate, 2, 0.002));
  }

  private static byte[] mono(long seed, double noise) throws Exception {
    return wav(pulses(800, seed, noise));
  }

  private static double[] pulses(double rate, long seed, double noise) {
    SpeedFunction speed = SpeedFunction.constant(0.0012).plusLine(4, 0.08, 0).plusLine(1, 0.05, 1);
    return SignalSynth.pulses(speed, rate, RATE_HERTZ, 20, 0.5, 1, noise, seed);
  }

  private static byte[] wav(double[]... channels) throws Exception {
    var bytes = new ByteArrayOutputStream();
    WavWriter.write(bytes, RATE_HERTZ, 16, channels);
    return bytes.toByteArray();
  }
}
