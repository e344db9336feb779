package turnsheet.share.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.anonymous;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.header;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.time.Clock;
import java.util.Base64;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.report.Report;
import turnsheet.report.web.ReportDesk;
import turnsheet.share.ShareDesk;
import turnsheet.share.ShareLinks;
import turnsheet.testing.AsOwner;
import turnsheet.testing.ServiceTest;
import turnsheet.web.EnglishLeft;

@ServiceTest
@AsOwner
class SharedReportTest {

  private static final ReportDesk.Wish WISH =
      new ReportDesk.Wish("en", "A. Person", "B. Person", "", "");

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Readings readings;
  @Autowired ReportDesk reports;
  @Autowired ShareDesk desk;
  @Autowired ShareLinks links;

  @SuppressWarnings("NullAway.Init") // issued before each test
  private Report report;

  @BeforeEach
  void issueAReport() {
    SampleBench bench = new SampleBench(jdbc, transactions, clock);
    readings.add(
        bench.capture("as received", "measured"),
        SampleReadings.tone(0.37),
        SampleReadings.series());
    report = reports.issue(bench.visit.id(), WISH);
  }

  private String path(boolean history) {
    String address = desk.make(report.number(), history, 90).address();
    return address.substring(address.indexOf(ShareDesk.PATH));
  }

  @Test
  void aLinkHoldsTwoHundredAndFiftySixRandomBitsAndIsKeptAsAHash() {
    String token = path(false).substring(ShareDesk.PATH.length());
    assertThat(Base64.getUrlDecoder().decode(token)).hasSize(32);
    assertThat(jdbc.sql("select token_sha256 from share_link").query(String.class).list())
        .noneMatch(kept -> kept.equals(token));
  }

  @Test
  void aStrangerSeesTheReportAndItsPdfAndNothingElse() throws Exception {
    String path = path(false);
    String page =
        mvc.perform(get(path).with(anonymous()))
            .andExpect(status().isOk())
            .andExpect(header().string("X-Robots-Tag", "noindex, nofollow"))
            .andExpect(header().string("Referrer-Policy", "no-referrer"))
            .andReturn()
            .getResponse()
            .getContentAsString();
    assertThat(page)
        .contains("Report %05d".formatted(report.number()))
        .doesNotContain("/readings/")
        .doesNotContain("/visits/")
        .doesNotContain("/history")
        .doesNotContainPattern("(src|href)=\"(https?:)?//");
    byte[] pdf =
        mvc.perform(get(path + "/pdf").with(anonymous()))
            .andExpect(status().isOk())
            .andReturn()
            .getResponse()
            .getContentAsByteArray();
    assertThat(new String(pdf, 0, 5, java.nio.charset.StandardCharsets.US_ASCII))
        .isEqualTo("%PDF-");
    mvc.perform(get(path + "/history").with(anonymous())).andExpect(status().isNotFound());
  }

  /** The shop reads English here; the customer reads the report and all around it in German. */
  @Test
  void thePageAroundAGermanReportIsGerman() throws Exception {
    report =
        reports.revise(
            report.number(), new ReportDesk.Wish("de", "A. Person", "B. Person", "", ""), "x");
    String path = path(true);
    for (String address : new String[] {path, path + "/history"}) {
      String page =
          mvc.perform(get(address).with(anonymous()).header("Accept-Language", "en"))
              .andExpect(status().isOk())
              .andReturn()
              .getResponse()
              .getContentAsString();
      assertThat(EnglishLeft.in(page)).isEmpty();
      assertThat(page)
          .containsIgnoringCase("wie erhalten")
          .containsPattern("\\d\\d\\.\\d\\d\\.\\d{4}");
    }
  }

  @Test
  void theHistoryIsShownOnlyWhereTheLinkAllowsIt() throws Exception {
    String path = path(true);
    String page =
        mvc.perform(get(path + "/history").with(anonymous()))
            .andExpect(status().isOk())
            .andReturn()
            .getResponse()
            .getContentAsString();
    assertThat(page)
        .contains("Over the years")
        .contains("<svg")
        .contains("+0.3700")
        .doesNotContain("voices waver")
        .doesNotContain("A. Customer")
        .doesNotContain("??");
  }

  @Test
  void viewsAreCountedOnceAPage() throws Exception {
    String path = path(false);
    mvc.perform(get(path).with(anonymous()));
    mvc.perform(get(path + "/pdf").with(anonymous()));
    mvc.perform(get(path).with(anonymous()));
    assertThat(links.ofReport(report.number()))
        .singleElement()
        .satisfies(
            link -> {
              assertThat(link.views()).isEqualTo(2);
              assertThat(link.lastViewAt()).isNotNull();
            });
  }

  @Test
  void aSupersededReportSaysSoAndLeadsToTheCurrentOne() throws Exception {
    String path = path(false);
    Report second = reports.revise(report.number(), WISH, "typing error");
    assertThat(body(path))
        .contains("Superseded: report %05d".formatted(second.number()))
        .contains(path + "/current");
    assertThat(body(path + "/current"))
        .contains("typing error")
        .contains(path + "/current/pdf")
        .doesNotContain("Superseded");
  }

  @Test
  void anExpiredOrWithdrawnLinkOpensNothing() throws Exception {
    String path = path(true);
    desk.withdraw(links.ofReport(report.number()).get(0).id());
    for (String end : new String[] {"", "/pdf", "/history", "/current", "/current/pdf"}) {
      mvc.perform(get(path + end).with(anonymous())).andExpect(status().isNotFound());
    }
    String other = path(true);
    jdbc.sql("update share_link set expires_at = created_at").update();
    mvc.perform(get(other).with(anonymous())).andExpect(status().isNotFound());
  }

  private String body(String path) throws Exception {
    return mvc.perform(get(path).with(anonymous()))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString();
  }
}
