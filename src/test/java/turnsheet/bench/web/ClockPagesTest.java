package turnsheet.bench.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import com.jayway.jsonpath.JsonPath;
import java.nio.charset.StandardCharsets;
import java.util.UUID;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import turnsheet.access.AuditTrail;
import turnsheet.bench.KnownTone;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

/** Every test has an instrument of its own, because the service is shared. */
@ServiceTest
@AsTechnician
class ClockPagesTest {

  @Autowired private MockMvcTester mvc;
  @Autowired private Instruments instruments;
  @Autowired private AuditTrail audit;
  private String page = "";
  private String api = "";

  @BeforeEach
  void enterInstrument() {
    InstrumentId id = InstrumentId.next();
    instruments.add(new BenchInstrument(id, "Card " + id, 5, 10.0, null, ""));
    page = "/instruments/" + id;
    api = "/api/v1/instruments/" + id + "/clock-checks";
  }

  @Test
  void checksAClockAndTakesItInASecondStep() throws Exception {
    assertThat(text(page)).contains("+5\u202f±\u202f10", "never");
    assertThat(text(page)).contains("No check has been made here yet.");
    assertThat(text(page + "/clock-checks/new"))
        .contains("mains voltage", "qualified people", "local rules");
    MvcTestResult sent = send("1000", "0.2", file("a.wav", KnownTone.wav(37, 12)));
    assertThat(sent).hasStatus(302);
    String check = location(sent);
    assertThat(check).startsWith(page + "/clock-checks/");
    assertThat(text(check))
        .contains("runs fast by", "+37.0", "999.963", "In the record", "Take into the record")
        .contains("differ by more than both uncertainties")
        .doesNotContain("??");
    assertThat(text(page))
        .contains("not taken", "Lab oscillator", "1000 Hz ± 0.2 ppm")
        .contains("Clock error over time");
    assertThat(markup(page))
        .contains("drawn-dot series-2", "drawn-uncertainty")
        .doesNotContain("drawn-dot series-1");
    assertThat(instrument().clockErrorPpm()).isEqualTo(5);

    MvcTestResult taken = mvc.post().uri(check + "/take").with(csrf()).exchange();
    assertThat(taken).hasStatus(302);
    assertThat(location(taken)).isEqualTo(page);
    assertThat(instrument().clockErrorPpm()).isBetween(36.9, 37.1);
    assertThat(text(page)).contains("+37.0", "in the record", "checked against Lab oscillator");
    assertThat(markup(page)).contains("drawn-dot series-1").doesNotContain("drawn-dot series-2");
    assertThat(text(check)).contains("Taken into the record on", "by technician");
    assertThat(audit.latest(1))
        .singleElement()
        .satisfies(entry -> assertThat(entry.action()).isEqualTo("bench.audit.clockTaken"));
    assertThat(mvc.post().uri(check + "/take").with(csrf()))
        .hasStatus(422)
        .bodyText()
        .contains("taken into the record before");
  }

  @Test
  void aRefusedFileIsNotAskedForAgain() throws Exception {
    MvcTestResult refused = send("1500", "0.2", file("a.wav", KnownTone.wav(0, 5)));
    assertThat(refused).hasStatus(422);
    String answer = refused.getResponse().getContentAsString();
    assertThat(answer)
        .contains("correct the frequency, or record again.", "Lab oscillator", "value=\"1500\"")
        .contains("Kept from before: a.wav.");
    MvcTestResult again =
        mvc.post()
            .uri(page + "/clock-checks/new")
            .with(csrf())
            .multipart()
            .file(new MockMultipartFile("file", "", null, new byte[0]))
            .param("source", "Lab oscillator")
            .param("referenceHz", "1000")
            .param("referenceExpandedUncertaintyPpm", "0.2")
            .param("kind", "TONE")
            .param("heldName", "a.wav")
            .param("heldSha256", hidden(answer, "heldSha256"))
            .param("heldLength", hidden(answer, "heldLength"))
            .exchange();
    assertThat(again).hasStatus(302);
    assertThat(location(again)).startsWith(page + "/clock-checks/");
    assertThat(instrument().clockErrorPpm()).isEqualTo(5);
  }

  @Test
  void saysWhatIsMissingInTheForm() throws Exception {
    MvcTestResult answer = send("1,000", "0", null);
    assertThat(answer).hasStatusOk();
    assertThat(answer.getResponse().getContentAsString())
        .contains("Choose the recording.", "value=\"1,000\"", "must be more than zero")
        .doesNotContain("??");
  }

  @Test
  void offersALessCertainCheckWithASentence() throws Exception {
    String check = location(send("1000", "50", file("a.wav", KnownTone.wav(0, 5))));
    assertThat(text(check)).contains("±\u202f50\u202fppm, is larger than the ±\u202f10\u202fppm");
    assertThat(text(check)).contains("Only 5.0 s were recorded", "Take into the record");
    assertThat(text(check)).contains("shows no error beyond the uncertainty");
  }

  @Test
  void doesTheSameForPrograms() throws Exception {
    String query = "?source=Lab oscillator&referenceHz=1000&referenceExpandedUncertaintyPpm=0.2";
    MvcTestResult made = post(query + "&fileName=a.wav", KnownTone.wav(-12, 12));
    assertThat(made).hasStatus(201);
    String document = made.getResponse().getContentAsString();
    assertThat(JsonPath.<Number>read(document, "$.clockErrorPpm").doubleValue())
        .isBetween(-12.1, -11.9);
    assertThat(JsonPath.<String>read(document, "$.kind")).isEqualTo("tone");
    assertThat(JsonPath.<@Nullable Object>read(document, "$.taken")).isNull();
    String address = api + "/" + JsonPath.read(document, "$.id");
    assertThat(location(made)).isEqualTo(address);
    assertThat(mvc.get().uri(api)).bodyJson().extractingPath("$.length()").isEqualTo(1);
    assertThat(mvc.get().uri(address)).hasStatusOk();
    MvcTestResult taken = mvc.post().uri(address + "/take").exchange();
    assertThat(taken).bodyJson().extractingPath("$.taken.by").isEqualTo("technician");
    assertThat(taken).bodyJson().extractingPath("$.taken.beforeErrorPpm").isEqualTo(5.0);
    assertThat(mvc.post().uri(address + "/take"))
        .hasStatus(422)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("alreadyTaken");
    assertThat(post(query + "&fileName=a.wav", "words".getBytes(StandardCharsets.UTF_8)))
        .hasStatus(422)
        .hasContentTypeCompatibleWith(MediaType.APPLICATION_PROBLEM_JSON);
    assertThat(post("?source=x&referenceHz=1000&fileName=a.wav", KnownTone.wav(0, 5)))
        .hasStatus(422)
        .bodyJson()
        .extractingPath("$.fields[0].field")
        .isEqualTo("referenceExpandedUncertaintyPpm");
  }

  @Test
  void knowsNothingOfOtherInstruments() throws Exception {
    String check = location(send("1000", "1", file("a.wav", KnownTone.wav(0, 5))));
    String nobody = "/instruments/" + UUID.randomUUID();
    assertThat(mvc.get().uri(nobody)).hasStatus(404);
    assertThat(mvc.get().uri(nobody + "/clock-checks/new")).hasStatus(404);
    assertThat(mvc.get().uri(check.replace(page, nobody))).hasStatus(404);
    assertThat(mvc.get().uri("/api/v1" + nobody + "/clock-checks")).hasStatus(404);
  }

  private MvcTestResult send(String hertz, String ppm, @Nullable MockMultipartFile file) {
    var request = mvc.post().uri(page + "/clock-checks/new").with(csrf()).multipart();
    return (file == null ? request : request.file(file))
        .param("source", "Lab oscillator")
        .param("referenceHz", hertz)
        .param("referenceExpandedUncertaintyPpm", ppm)
        .param("keepingPpm", "")
        .param("kind", "TONE")
        .param("channel", "")
        .exchange();
  }

  private MvcTestResult post(String query, byte[] bytes) {
    return mvc.post()
        .uri(java.net.URI.create((api + query).replace(" ", "%20")))
        .contentType(MediaType.APPLICATION_OCTET_STREAM)
        .content(bytes)
        .exchange();
  }

  private static MockMultipartFile file(String name, byte[] bytes) {
    return new MockMultipartFile("file", name, "audio/wav", bytes);
  }

  private BenchInstrument instrument() {
    UUID id = UUID.fromString(page.substring(page.lastIndexOf('/') + 1));
    return instruments.find(new InstrumentId(id)).orElseThrow();
  }

  /** Without tags, so that a number cut at its point is whole again. */
  private String text(String address) throws Exception {
    return markup(address).replaceAll("<[^>]*>", "");
  }

  private String markup(String address) throws Exception {
    MvcTestResult answer = mvc.get().uri(address).exchange();
    assertThat(answer).hasStatusOk();
    return answer.getResponse().getContentAsString();
  }

  private static String location(MvcTestResult answer) {
    String to = answer.getResponse().getHeader("Location");
    assertThat(to).isNotNull();
    return to == null ? "" : to;
  }

  private static String hidden(String html, String name) {
    Matcher found = Pattern.compile("name=\"" + name + "\" value=\"([^\"]*)\"").matcher(html);
    assertThat(found.find()).isTrue();
    return found.group(1);
  }
}
