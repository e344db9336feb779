package turnsheet.exchange.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import java.time.Clock;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.capture.CaptureId;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.testing.AsOwner;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsOwner
class ExchangePagesTest {

  @Autowired MockMvcTester mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Readings readings;

  @Test
  void aUnitsPageLeadsToItsFilesWhichProgramsGetAlike() throws Exception {
    SampleBench bench = bench();
    String unit = bench.unit.id().toString();
    assertThat(text("/units/" + unit)).contains("/export?unit=" + unit);
    assertThat(text("/visits/" + bench.visit.id())).contains("/export?visit=" + bench.visit.id());
    assertThat(text("/shop")).contains("href=\"/export\"");
    assertThat(text("/export?unit=" + unit))
        .contains("/export.json?unit=" + unit, "/export.csv?unit=" + unit)
        .doesNotContain("??", "action=\"/import\"");

    MvcTestResult file = mvc.get().uri("/export.json?unit=" + unit).exchange();
    assertThat(file)
        .hasStatusOk()
        .hasContentTypeCompatibleWith(MediaType.APPLICATION_JSON)
        .headers()
        .hasValue("Content-Disposition", "attachment; filename=\"turnsheet-" + unit + ".json\"");
    assertThat(text("/api/v1/export?unit=" + unit))
        .isEqualTo(body(file))
        .contains("\"serialNumber\":\"0042\"");
    assertThat(text("/api/v1/export.csv?visit=" + bench.visit.id()))
        .isEqualTo(text("/export.csv?unit=" + unit))
        .startsWith("unit,model,serialNumber,");
  }

  @Test
  void whatIsNotThereIsNotExported() {
    String nothing = "00000000-0000-0000-0000-000000000000";
    assertThat(mvc.get().uri("/export?unit=" + nothing)).hasStatus(404);
    assertThat(mvc.get().uri("/api/v1/export?visit=" + nothing)).hasStatus(404);
    assertThat(mvc.get().uri("/api/v1/export?visit=" + nothing + "&unit=" + nothing))
        .hasStatus(422);
  }

  @Test
  void theOwnersPageTakesAFileInAndSaysWhatCameOfIt() throws Exception {
    SampleBench bench = bench();
    String exported = text("/export.json?unit=" + bench.unit.id());
    assertThat(text("/export")).contains("action=\"/import\"").doesNotContain("??");
    assertThat(text("/import")).contains("action=\"/import\"").doesNotContain("??");

    assertThat(body(send(exported))).contains("Everything in books.json is here now");
    String changed = exported.replace("\"serialNumber\":\"0042\"", "\"serialNumber\":\"4711\"");
    assertThat(body(send(changed)))
        .contains("Not everything in books.json could be added", "4711", "serialNumber")
        .doesNotContain("??");
    MvcTestResult cut = send(exported.substring(0, exported.length() / 2));
    assertThat(cut).hasStatus(422);
    assertThat(body(cut)).contains("Line ", "Nothing of the file was taken in.");
    assertThat(send("")).hasStatus(422);
  }

  @Test
  void programsTakeFilesInAsWell() throws Exception {
    String exported = text("/api/v1/export?unit=" + bench().unit.id());
    MvcTestResult answer = post(exported);
    assertThat(answer).hasStatusOk().bodyJson().extractingPath("$.complete").isEqualTo(true);
    assertThat(answer).bodyJson().extractingPath("$.added").isEqualTo(0);
    assertThat(post("{}"))
        .hasStatus(422)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("foreignFile");
  }

  @Test
  @AsTechnician
  void aTechnicianExportsButTakesNothingIn() throws Exception {
    assertThat(text("/export")).doesNotContain("action=\"/import\"");
    assertThat(mvc.get().uri("/import")).hasStatus(403);
    assertThat(send("{}")).hasStatus(403);
    assertThat(post("{}")).hasStatus(403);
  }

  @Test
  void aCaptureWithoutItsFileSaysSo() throws Exception {
    SampleBench bench = bench();
    CaptureId capture = bench.capture("after repair", "measured");
    readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());
    jdbc.sql(
            "delete from reading_series where reading_id in (select id from reading where capture_id = ?)")
        .param(capture.value())
        .update();

    assertThat(text("/captures/" + capture))
        .contains("carries no recordings")
        .doesNotContain("/captures/" + capture + "/file");
    for (String verb : new String[] {"measure", "look"}) {
      MvcTestResult answer =
          mvc.post()
              .uri("/captures/" + capture + "/" + verb)
              .params(params(Map.of("channel", "1", "kind", "TONE", "nominalHz", "3150")))
              .with(csrf())
              .exchange();
      assertThat(answer).hasStatus(422);
      assertThat(body(answer)).contains("The file of this capture is not here");
    }
    assertThat(mvc.get().uri("/api/v1/captures/" + capture + "/file"))
        .hasStatus(422)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("fileMissing");
    assertThat(text("/readings/" + readings.newestOf(capture).orElseThrow().id())).contains("0.37");

    readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());
    assertThat(
            readings.curve(
                readings.newestOf(capture).orElseThrow().id(), turnsheet.reading.SeriesName.TRACE))
        .as("measured again, the same reading has its curves back")
        .isPresent();
  }

  private SampleBench bench() {
    SampleBench bench = new SampleBench(jdbc, transactions, clock);
    readings.add(
        bench.capture("as received", "measured"),
        SampleReadings.tone(0.37),
        SampleReadings.series());
    return bench;
  }

  private MvcTestResult send(String content) {
    return mvc.post()
        .uri("/import")
        .multipart()
        .file(
            new MockMultipartFile(
                "file",
                "books.json",
                "application/json",
                content.getBytes(java.nio.charset.StandardCharsets.UTF_8)))
        .with(csrf())
        .exchange();
  }

  private MvcTestResult post(String content) {
    return mvc.post()
        .uri("/api/v1/import")
        .contentType(MediaType.APPLICATION_JSON)
        .content(content)
        .exchange();
  }

  private static org.springframework.util.MultiValueMap<String, String> params(
      Map<String, String> values) {
    return org.springframework.util.MultiValueMap.fromSingleValue(values);
  }

  private String text(String address) throws Exception {
    MvcTestResult answer = mvc.get().uri(address).exchange();
    assertThat(answer).hasStatus(200);
    return body(answer);
  }

  private static String body(MvcTestResult answer) throws Exception {
    return answer.getResponse().getContentAsString();
  }
}
