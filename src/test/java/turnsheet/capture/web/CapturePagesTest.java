package turnsheet.capture.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import com.jayway.jsonpath.JsonPath;
import java.nio.charset.StandardCharsets;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.TestConfiguration;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Primary;
import org.springframework.http.MediaType;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.test.json.AbstractJsonContentAssert;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.TestFormats;
import turnsheet.job.Jobs;
import turnsheet.shop.Customers;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsTechnician
class CapturePagesTest {

  @Autowired private MockMvcTester mvc;
  @Autowired private MachineModels models;
  @Autowired private Customers customers;
  @Autowired private Units units;
  @Autowired private Visits visits;
  @Autowired private Jobs jobs;
  @Autowired private JdbcClient jdbc;
  private SpeedSettingId setting = SpeedSettingId.next();
  private VisitId visit = VisitId.next();

  @TestConfiguration
  static class OneWordFiles {
    @Bean
    @Primary
    CaptureFormats wordFormats() {
      return TestFormats.formats();
    }
  }

  @BeforeEach
  void openVisit() {
    String name = UUID.randomUUID().toString();
    setting = SpeedSettingId.next();
    MachineModel model =
        models.add(
            MachineModel.named("Deck " + name, 120, "")
                .withSetting(
                    new SpeedSetting(setting, "9.5", SpeedUnit.CM_PER_S, 9.525, 3150.0, 400.0)));
    UnitId unit = units.add(model.id(), customers.add("Customer " + name, "").id(), name, "").id();
    visit = visits.open(unit, "").id();
  }

  @Test
  void aFormUploadLeadsToThePageOfTheCapture() {
    MvcTestResult answer = form(file("take <1>.wav", "tone"));
    assertThat(answer).hasStatus(302);
    String page = location(answer);
    assertThat(page).startsWith("/captures/");
    assertThat(mvc.get().uri(page))
        .hasStatusOk()
        .bodyText()
        .contains("take &lt;1&gt;.wav", "spoken word, 2 channels", "a waveform", "<polyline")
        .contains("Guess: the first, as nothing says which.")
        .contains("Left empty: 3150 Hz for a tone, as the speed setting says.")
        .doesNotContain("??");
  }

  @Test
  void severalFilesLeadBackToTheVisit() {
    assertThat(location(form(file("a.wav", "tone"), file("b.txt", "edges"))))
        .isEqualTo("/visits/" + visit);
  }

  @Test
  void aFormWithoutFileIsRefusedWithASentence() {
    assertThat(form(file("", ""))).failure().hasMessageContaining("choose one");
  }

  @Test
  void thePagesScriptUploadsTheBareBytes() {
    MvcTestResult answer = raw("/visits/", "tone", "a.wav");
    assertThat(answer).hasStatus(201);
    assertThat(answer).bodyJson().extractingPath("$.page").asString().startsWith("/captures/");
  }

  @Test
  void theWayOfATonesRecordingIsSaidAndCorrected() throws Exception {
    MvcTestResult answer = raw("/api/v1/visits/", "tone", "a.wav", "&toneMethod=recordAndReplay");
    assertThat(answer).bodyJson().extractingPath("$.toneMethod").isEqualTo("recordAndReplay");
    String page = "/captures/" + id(answer);
    assertThat(mvc.get().uri(page))
        .bodyText()
        .containsPattern("value=\"recordAndReplay\"\\s+selected");

    assertThat(mvc.post().uri(page + "/tone-method").with(csrf()).param("toneMethod", "replay"))
        .hasStatus(302);
    api(page).extractingPath("$.toneMethod").isEqualTo("replay");
    assertThat(
            mvc.put()
                .uri("/api/v1" + page + "/tone-method")
                .contentType(MediaType.APPLICATION_JSON)
                .content("{}"))
        .hasStatusOk();
    api(page).extractingPath("$.toneMethod").isNull();
    assertThat(mvc.post().uri(page + "/tone-method").with(csrf()).param("toneMethod", "hearsay"))
        .hasStatus(422);
    visits.close(visit);
    assertThat(mvc.post().uri(page + "/tone-method").with(csrf()).param("toneMethod", "replay"))
        .hasStatus(422);
    assertThat(mvc.get().uri(page)).bodyText().doesNotContain("/tone-method");
  }

  @Test
  void onlyATonesRecordingHasAWay() throws Exception {
    MvcTestResult edges = raw("/api/v1/visits/", "edges", "a.txt", "&toneMethod=replay");
    assertThat(edges).bodyJson().extractingPath("$.toneMethod").isNull();
    assertThat(
            mvc.post()
                .uri("/captures/" + id(edges) + "/tone-method")
                .with(csrf())
                .param("toneMethod", "replay"))
        .hasStatus(422);

    MvcTestResult tone = raw("/api/v1/visits/", "tone", "b.wav", "&toneMethod=replay");
    assertThat(tone).bodyJson().extractingPath("$.toneMethod").isEqualTo("replay");
    mvc.post()
        .uri("/captures/" + id(tone) + "/measure")
        .with(csrf())
        .param("kind", "TACHOMETER")
        .exchange();
    api("/captures/" + id(tone)).extractingPath("$.toneMethod").isNull();
  }

  @Test
  void theApiAnswersWithWhatWasRecognised() {
    MvcTestResult answer = raw("/api/v1/visits/", "tone", "a.wav");
    assertThat(answer).hasStatus(201);
    assertThat(answer).bodyJson().extractingPath("$.state").isEqualTo("recognised");
    assertThat(answer).bodyJson().extractingPath("$.kindGuess.kind").isEqualTo("tone");
    assertThat(answer).bodyJson().extractingPath("$.recognised.contents").isEqualTo("waveform");
    assertThat(answer)
        .bodyJson()
        .extractingPath("$.recognised.guesses[0].subject")
        .isEqualTo("channel");
    assertThat(location(answer)).isEqualTo("/api/v1/captures/" + id(answer));
    assertThat(mvc.get().uri("/api/v1/captures/{id}", id(answer))).hasStatusOk();
  }

  @Test
  void aRefusedFileShowsItsSentenceAndWhatToDo() {
    String page = location(form(file("a.wav", "torn")));
    assertThat(mvc.get().uri(page))
        .bodyText()
        .contains("The file is torn at byte 4: record it again.", "/help/recording", "torn")
        .doesNotContain("??");
  }

  @Test
  void anotherLookHelpsAnUnclearTable() {
    String page = location(form(file("a.csv", "unclear")));
    assertThat(
            mvc.post()
                .uri(page + "/look")
                .with(csrf())
                .param("contents", "EDGE_TIMES")
                .param("timeUnitSeconds", "")
                .param("sampleStepSeconds", ""))
        .hasStatus(302);
    assertThat(mvc.get().uri(page))
        .bodyText()
        .contains("word list", "times of edges", "edges of a tachometer")
        .contains("400 pulses per second")
        .doesNotContain("??");
  }

  @Test
  void measuringIsOrderedAndFollowed() {
    String page = location(form(file("a.wav", "tone")));
    assertThat(mvc.post().uri(page + "/measure").with(csrf()).param("nominalHz", ""))
        .hasStatus(302);
    UUID id = UUID.fromString(page.substring("/captures/".length()));
    assertThat(jobs.ofSubject(id)).hasSize(1);
    assertThat(mvc.get().uri(page + "/progress"))
        .bodyJson()
        .extractingPath("$.jobState")
        .isNotNull();
    assertThat(mvc.get().uri("/api/v1" + page + "/job")).hasStatusOk();
  }

  @Test
  void theApiOrdersWithoutABody() {
    String id = id(raw("/api/v1/visits/", "tone", "a.wav"));
    MvcTestResult ordered =
        mvc.post()
            .uri("/api/v1/captures/{id}/measure", id)
            .with(csrf())
            .contentType(MediaType.APPLICATION_JSON)
            .content("{\"kind\":\"tachometer\",\"nominalHz\":1600,\"teeth\":60}")
            .exchange();
    assertThat(ordered).hasStatus(202);
    assertThat(ordered).bodyJson().extractingPath("$.choices.settings.teeth").isEqualTo(60);
    assertThat(ordered)
        .bodyJson()
        .extractingPath("$.choices.settings.kind")
        .isEqualTo("tachometer");
  }

  @Test
  void aNominalThatCannotBeKeepsTheFormAndSaysWhy() {
    String page = location(form(file("a.wav", "tone")));
    MvcTestResult answer =
        mvc.post().uri(page + "/measure").with(csrf()).param("nominalHz", "30000").exchange();
    assertThat(answer).hasStatus(422);
    assertThat(answer).bodyText().contains("below half of the", "value=\"30000\"");
    MvcTestResult word =
        mvc.post().uri(page + "/measure").with(csrf()).param("nominalHz", "fast").exchange();
    assertThat(word).hasStatus(422);
    assertThat(word).bodyText().contains("A number could not be read");
  }

  @Test
  void eachStateHasItsPage() {
    String page = location(form(file("a.wav", "tone")));
    inState(page, "queued", null);
    assertThat(mvc.get().uri(page))
        .bodyText()
        .contains("http-equiv=\"refresh\"", page + "/progress", "<progress")
        .doesNotContain("How to measure it", "??");
    inState(page, "measured", null);
    assertThat(mvc.get().uri(page))
        .bodyText()
        .contains(page + "/reading", "Measure again")
        .doesNotContain("http-equiv=\"refresh\"", "??");
    inState(page, "failed", "It failed, reference 1234.");
    assertThat(mvc.get().uri(page))
        .bodyText()
        .contains("It failed, reference 1234.", "Measure again", "measured again below")
        .doesNotContain("??");
    inState(page, "refused", "No tone was found.");
    assertThat(mvc.get().uri(page))
        .bodyText()
        .contains("No tone was found.", "Measure again")
        .doesNotContain("??");
  }

  @Test
  void handsTheOriginalBackAsADownloadOnly() {
    String page = location(form(file("a \"b\" ü.html", "tone")));
    for (String address : new String[] {page + "/file", "/api/v1" + page + "/file"}) {
      MvcTestResult answer = mvc.get().uri(address).exchange();
      assertThat(answer).hasStatusOk().hasContentType(MediaType.APPLICATION_OCTET_STREAM);
      assertThat(answer.getResponse().getContentAsByteArray())
          .isEqualTo("tone".getBytes(StandardCharsets.US_ASCII));
      String disposition = answer.getResponse().getHeader("Content-Disposition");
      assertThat(disposition).startsWith("attachment").contains("UTF-8''");
      assertThat(answer.getResponse().getHeader("X-Content-Type-Options")).isEqualTo("nosniff");
    }
  }

  private void inState(String page, String state, @Nullable String refusal) {
    jdbc.sql("update capture set state = ?, refusal_code = ?, refusal_message = ? where id = ?")
        .param(1, state)
        .param(2, refusal == null ? null : "planted", java.sql.Types.VARCHAR)
        .param(3, refusal, java.sql.Types.VARCHAR)
        .param(4, UUID.fromString(page.substring("/captures/".length())))
        .update();
  }

  private static MockMultipartFile file(String name, String content) {
    return new MockMultipartFile(
        "file", name, "audio/wav", content.getBytes(StandardCharsets.UTF_8));
  }

  private MvcTestResult form(MockMultipartFile... files) {
    var request = mvc.post().uri("/visits/{id}/captures", visit).multipart();
    for (MockMultipartFile file : files) {
      request.file(file);
    }
    return request
        .param("speedSettingId", setting.toString())
        .param("condition", "as received")
        .param("instrumentId", "")
        .with(csrf())
        .exchange();
  }

  private AbstractJsonContentAssert<?> api(String page) {
    return assertThat(mvc.get().uri("/api/v1" + page)).bodyJson();
  }

  private MvcTestResult raw(String root, String content, String name) {
    return raw(root, content, name, "");
  }

  private MvcTestResult raw(String root, String content, String name, String more) {
    return mvc.post()
        .uri(
            root + "{id}/captures?speedSettingId={s}&condition=after repair&fileName={n}" + more,
            visit,
            setting,
            name)
        .with(csrf())
        .contentType(MediaType.APPLICATION_OCTET_STREAM)
        .content(content)
        .exchange();
  }

  private static String location(MvcTestResult answer) {
    return String.valueOf(answer.getResponse().getHeader("Location"));
  }

  private static String id(MvcTestResult answer) {
    return JsonPath.read(
        new String(answer.getResponse().getContentAsByteArray(), StandardCharsets.UTF_8), "$.id");
  }
}
