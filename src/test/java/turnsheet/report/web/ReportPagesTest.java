package turnsheet.report.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.multipart;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import javax.imageio.ImageIO;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.access.ShopProfiles;
import turnsheet.capture.CaptureId;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.testing.AsOwner;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

@ServiceTest
@AsOwner
class ReportPagesTest {

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Readings readings;
  @Autowired Reports reports;
  @Autowired ShopProfiles profiles;

  private SampleBench bench;
  private String visit = "";

  @BeforeEach
  void measureBothConditions() {
    bench = new SampleBench(jdbc, transactions, clock);
    readings.add(
        bench.capture("as received", "measured"),
        SampleReadings.tone(0.37),
        SampleReadings.series());
    readings.add(
        bench.capture("after repair", "measured"),
        SampleReadings.tone(0.02),
        SampleReadings.series());
    visit = "/visits/" + bench.visit.id();
  }

  @Test
  void aVisitThatIsNotThereHasNoReportToIssue() throws Exception {
    mvc.perform(get("/visits/00000000-0000-4000-8000-000000000000/report"))
        .andExpect(status().isNotFound());
  }

  @Test
  void anIssuedReportSaysWhatTheSheetSaidWithNumberAndCode() throws Exception {
    long number = issue("en");
    String page = text(page("/reports/" + number));
    Report report = reports.find(number).orElseThrow();

    assertThat(page)
        .contains("Report %05d".formatted(number))
        .contains("(+0.3700 ± 0.0060) %")
        .contains("(+0.0200 ± 0.0060) %")
        .contains("service manual")
        .contains("serial number 0042")
        .contains("voices waver")
        .contains("230 V, warmed up")
        .contains("mains voltage")
        .contains("conforms with more than 99\u00a0%")
        .contains("guard band")
        .contains("Inside the machine")
        .contains("End of report %05d".formatted(number))
        .contains(report.checkCode())
        .doesNotContain("??");
    mvc.perform(get("/api/v1/reports/" + number))
        .andExpect(status().isOk())
        .andExpect(header().string("ETag", "\"" + report.contentSha256() + "\""));
  }

  @Test
  void nothingThatChangesLaterChangesAnIssuedReport() throws Exception {
    long number = issue("en");
    String page = article(page("/reports/" + number));
    String json = reports.find(number).orElseThrow().contentJson();
    byte[] pdf = pdf(number);

    ShopProfiles.ShopProfile letterhead =
        profiles.get().orElse(new ShopProfiles.ShopProfile("", ""));
    profiles.put(new ShopProfiles.ShopProfile("Another name", "Another street"));
    jdbc.sql("update service_limit set upper_bound = 0.001, origin = 'other'").update();
    jdbc.sql("update unit set serial_number = ? where id = ?")
        .params("changed " + number, bench.unit.id().value())
        .update();
    jdbc.sql("update visit set complaint = 'other' where id = ?")
        .param(bench.visit.id().value())
        .update();
    jdbc.sql("update reading set method_version = 'later'").update();

    assertThat(article(page("/reports/" + number))).isEqualTo(page);
    assertThat(reports.find(number).orElseThrow().contentJson()).isEqualTo(json);
    assertThat(pdf(number)).isEqualTo(pdf);
    profiles.put(letterhead);
  }

  @Test
  void thePdfReadsBackWithEmbeddedFontsTagsAndThePrintedFigures() throws Exception {
    long number = issue("en");
    try (PDDocument document = Loader.loadPDF(pdf(number))) {
      String text = new PDFTextStripper().getText(document).replace('\u202f', ' ');
      assertThat(text)
          .contains("Report %05d".formatted(number))
          .contains("(+0.3700 ± 0.0060) %")
          .contains("(−0.3500 ± 0.0085) %")
          .contains("(0.0670 ± 0.0020) %")
          .contains("capstan shaft")
          .contains("End of report %05d".formatted(number))
          .containsPattern("Page 1 / " + document.getNumberOfPages());
      assertThat(fonts(document)).isNotEmpty().allMatch(PDFont::isEmbedded);
      assertThat(document.getDocumentCatalog().getStructureTreeRoot()).isNotNull();
      assertThat(Objects.requireNonNull(document.getDocumentCatalog().getMarkInfo()).isMarked())
          .isTrue();
      assertThat(document.getDocumentCatalog().getLanguage()).isEqualTo("en");
      String metadata =
          new String(
              document.getDocumentCatalog().getMetadata().toByteArray(),
              java.nio.charset.StandardCharsets.UTF_8);
      assertThat(metadata).contains("pdfaid").contains("pdfuaid");
    }
  }

  @Test
  void aGermanReportSpeaksGermanThroughout() throws Exception {
    long number = issue("de");
    String page = text(article(page("/reports/" + number)));
    assertThat(page)
        .contains("Bericht %05d".formatted(number))
        .contains("(+0,3700 ± 0,0060) %")
        .contains("Bewertete Gleichlaufschwankung, Zwei-Sigma-Wert")
        .contains("innerhalb")
        .contains("Entscheidungsregel")
        .containsPattern("Ausgegeben \\d\\d\\.\\d\\d\\.\\d{4}")
        .contains("Ende des Berichts")
        .doesNotContain("??")
        .doesNotContainPattern("\\d\\.\\d+ %")
        .doesNotContain("report")
        .doesNotContain("Limit");
    try (PDDocument document = Loader.loadPDF(pdf(number))) {
      assertThat(document.getDocumentCatalog().getLanguage()).isEqualTo("de");
      assertThat(new PDFTextStripper().getText(document)).contains("Seite 1 / ");
    }
  }

  @Test
  void severalRecordingsArePooledAndALeftOutOneIsNamedWithItsReason() throws Exception {
    readings.add(
        bench.capture("after repair", "measured"),
        SampleReadings.tone(0.06),
        SampleReadings.series());
    CaptureId knocked = bench.capture("after repair", "measured");
    readings.add(knocked, SampleReadings.tone(9), SampleReadings.series());
    mvc.perform(
            post("/captures/" + knocked + "/leave-out")
                .with(csrf())
                .param("reason", "table knocked"))
        .andExpect(status().is3xxRedirection());
    assertThat(page("/captures/" + knocked)).contains("table knocked").contains("Take it in again");

    String sheet = text(page(visit + "/sheet"));
    // the mean of 0.02 and 0.06; their standard deviation is 0.0283, of the mean 0.02, and
    // Student's
    // factor for one degree of freedom and 95.45 of 100 is 13.97, a little less beside the own part
    assertThat(sheet)
        .contains("(+0.04 ± 0.25) %")
        .contains("mean of the recordings; spread 0.0283 %, worst +0.06 %")
        .contains("Left out: 19 cm/s, After repair, tone.wav: table knocked");

    mvc.perform(post("/captures/" + knocked + "/take-in").with(csrf()))
        .andExpect(status().is3xxRedirection());
    assertThat(text(page(visit + "/sheet"))).contains("worst +9").doesNotContain("Left out");
    mvc.perform(post("/captures/" + knocked + "/leave-out").with(csrf()).param("reason", " "))
        .andExpect(status().is(422));
  }

  @Test
  void aMarkStandsAtTheHeadOfReportsToCome() throws Exception {
    BufferedImage picture = new BufferedImage(900, 300, BufferedImage.TYPE_INT_ARGB);
    ByteArrayOutputStream png = new ByteArrayOutputStream();
    ImageIO.write(picture, "png", png);
    mvc.perform(
            multipart("/shop/logo")
                .file(new MockMultipartFile("picture", "m.png", "image/png", png.toByteArray()))
                .with(csrf()))
        .andExpect(status().is3xxRedirection());
    long number = issue("en");
    mvc.perform(post("/shop/logo/remove").with(csrf())).andExpect(status().is3xxRedirection());

    assertThat(page("/reports/" + number)).contains("src=\"data:image/png;base64,");
    try (PDDocument document = Loader.loadPDF(pdf(number))) {
      assertThat(document.getPage(0).getResources().getXObjectNames()).isNotEmpty();
    }
    mvc.perform(
            multipart("/shop/logo")
                .file(new MockMultipartFile("picture", "m.png", "image/png", new byte[100]))
                .with(csrf()))
        .andExpect(status().is(422));
    assertThat(profiles.logo()).isEmpty();
  }

  /** Every figure of both sides and every difference, as stored, stands in the PDF's own text. */
  @Test
  void everyStoredFigureIsReadBackFromThePdf() throws Exception {
    long number = issue("en");
    Numbers numbers = Numbers.in(Locale.ENGLISH);
    try (PDDocument document = Loader.loadPDF(pdf(number))) {
      String text = squeezed(new PDFTextStripper().getText(document));
      var figures = reports.find(number).orElseThrow().content().sheet().pairs().get(0).figures();
      assertThat(figures).hasSizeGreaterThan(4);
      for (var c : figures) {
        Numbers.Sign sign = Wording.signOf(c.name());
        String unit = c.name().unit();
        assertThat(text)
            .as(c.name().path())
            .contains(squeezed(numbers.show(c.before().figure(), unit, sign).text()))
            .contains(squeezed(numbers.show(c.after().figure(), unit, sign).text()))
            .contains(
                squeezed(
                    numbers.show(c.difference().difference(), unit, Numbers.Sign.SHOWN).text()));
      }
    }
  }

  /** Lines may break within a figure on paper. */
  private static String squeezed(String text) {
    return text.replaceAll("[\\s\u202f]+", "");
  }

  @Test
  void aRevisionHasItsOwnNumberItsReasonAndPointsBothWays() throws Exception {
    long first = issue("en");
    mvc.perform(
            post("/reports/" + first + "/revise")
                .with(csrf())
                .param("language", "en")
                .param("measuredBy", "A. Person")
                .param("releasedBy", "B. Person")
                .param("conditions", "")
                .param("remarks", "")
                .param("reason", "wrong serial number"))
        .andExpect(status().is3xxRedirection());
    long second = reports.ofVisit(bench.visit.id()).get(0).number();

    assertThat(second).isGreaterThan(first);
    assertThat(text(page("/reports/" + second)))
        .contains("Takes the place of")
        .contains("%05d: wrong serial number".formatted(first));
    assertThat(text(page("/reports/" + first)))
        .contains("Superseded: report %05d".formatted(second));
    // what was replaced is not revised again, and a visit with a report gets no second first one
    mvc.perform(
            post("/reports/" + first + "/revise")
                .with(csrf())
                .param("language", "en")
                .param("measuredBy", "A")
                .param("releasedBy", "B")
                .param("conditions", "")
                .param("remarks", "")
                .param("reason", "again"))
        .andExpect(status().isConflict());
    mvc.perform(wish(post(visit + "/report"), "en")).andExpect(status().isConflict());
  }

  @Test
  void aCodeTellsWhetherTheReportIsCurrentAndNoFigure() throws Exception {
    long number = issue("en");
    String code = reports.find(number).orElseThrow().checkCode();

    assertThat(
            text(page("/check?code=" + code.replace("-", "").toUpperCase(java.util.Locale.ROOT))))
        .contains("Report %05d".formatted(number))
        .contains("is current")
        .doesNotContain("0.3700")
        .doesNotContain("A. Customer");
    assertThat(text(page("/check?code=00000-00000-00000-00000")))
        .contains("No report with this code");

    jdbc.sql("update report set content = ? where number = ?")
        .params(
            reports
                .find(number)
                .orElseThrow()
                .contentJson()
                .replace("0042", "0043")
                .getBytes(java.nio.charset.StandardCharsets.UTF_8),
            number)
        .update();
    assertThat(text(page("/check?code=" + code))).contains("no longer matches");
  }

  /** What is issued cannot be mended, so a program's incomplete wish is refused before. */
  @Test
  void aProgramIssuesRevisesAndReadsAReportAndIsRefusedAnIncompleteOne() throws Exception {
    String path = "/api/v1" + visit + "/reports";
    for (String wrong :
        List.of(
            "{}",
            "{'language':'xx','measuredBy':'A','releasedBy':'B'}",
            "{'language':'en','measuredBy':' ','releasedBy':'B'}",
            "{'language':'en','measuredBy':'A','releasedBy':'B','remarks':'%s'}"
                .formatted("x".repeat(2001)))) {
      mvc.perform(json(path, wrong))
          .andExpect(status().is(422))
          .andExpect(jsonPath("$.code").value("reportIncomplete"));
    }
    assertThat(reports.ofVisit(bench.visit.id())).isEmpty();

    String good = "{'language':'en','measuredBy':'A','releasedBy':'B'}";
    mvc.perform(json(path, good)).andExpect(status().isCreated());
    long first = reports.ofVisit(bench.visit.id()).get(0).number();
    mvc.perform(json("/api/v1/reports/" + first + "/revisions?reason=", good))
        .andExpect(status().is(422));
    mvc.perform(json("/api/v1/reports/" + first + "/revisions?reason=misprint", good))
        .andExpect(status().isCreated());
    assertThat(reports.find(first).orElseThrow().isCurrent()).isFalse();
    byte[] printed =
        mvc.perform(get("/api/v1/reports/" + first + "/pdf"))
            .andExpect(status().isOk())
            .andReturn()
            .getResponse()
            .getContentAsByteArray();
    assertThat(printed).isEqualTo(pdf(first));
  }

  private static org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder json(
      String path, String body) {
    return post(path).contentType("application/json").content(body.replace('\'', '"'));
  }

  @Test
  @AsTechnician
  void aTechnicianIssuesNothing() throws Exception {
    mvc.perform(wish(post(visit + "/report"), "en")).andExpect(status().isForbidden());
  }

  @Test
  void whatWasLeftOutIsAskedForAgain() throws Exception {
    mvc.perform(
            post(visit + "/report")
                .with(csrf())
                .param("language", "en")
                .param("measuredBy", " ")
                .param("releasedBy", "B")
                .param("conditions", "")
                .param("remarks", ""))
        .andExpect(status().isOk());
    assertThat(reports.ofVisit(bench.visit.id())).isEmpty();
  }

  private long issue(String language) throws Exception {
    mvc.perform(wish(post(visit + "/report"), language)).andExpect(status().is3xxRedirection());
    return reports.ofVisit(bench.visit.id()).get(0).number();
  }

  private static org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder wish(
      org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder request,
      String language) {
    return request
        .with(csrf())
        .param("language", language)
        .param("measuredBy", "A. Person")
        .param("releasedBy", "B. Person")
        .param("conditions", "230 V, warmed up")
        .param("remarks", "");
  }

  private byte[] pdf(long number) throws Exception {
    return mvc.perform(get("/reports/" + number + "/pdf"))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsByteArray();
  }

  private String page(String address) throws Exception {
    return mvc.perform(get(address))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString();
  }

  private static String article(String page) {
    return page.substring(page.indexOf("<article"), page.indexOf("</article>"));
  }

  private static String text(String page) {
    return page.replaceAll("<[^>]+>", "").replace('\u202f', ' ').replaceAll("\\s+", " ");
  }

  private static List<PDFont> fonts(PDDocument document) throws Exception {
    List<PDFont> fonts = new ArrayList<>();
    for (PDPage page : document.getPages()) {
      for (var name : page.getResources().getFontNames()) {
        fonts.add(page.getResources().getFont(name));
      }
    }
    return fonts;
  }
}
