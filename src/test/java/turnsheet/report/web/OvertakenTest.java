package turnsheet.report.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.securityContext;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;

import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.CyclicBarrier;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.MockHttpServletResponse;
import org.springframework.security.core.context.SecurityContext;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.transaction.support.TransactionTemplate;
import turnsheet.reading.Readings;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.report.Reports;
import turnsheet.testing.AsOwner;
import turnsheet.testing.ServiceTest;

/**
 * Two owners send their forms at the same moment, each in a thread with a connection of its own.
 */
@ServiceTest
@AsOwner
class OvertakenTest {

  private static final int ROUNDS = 3;

  @Autowired MockMvc mvc;
  @Autowired JdbcClient jdbc;
  @Autowired TransactionTemplate transactions;
  @Autowired Clock clock;
  @Autowired Readings readings;
  @Autowired Reports reports;

  private SampleBench bench;

  @BeforeEach
  void measure() {
    bench = new SampleBench(jdbc, transactions, clock);
    readings.add(
        bench.capture("as received", "measured"),
        SampleReadings.tone(0.37),
        SampleReadings.series());
  }

  @Test
  void oneOfTwoIsIssuedAndTheOtherKeepsWhatWasTyped() throws Exception {
    String address = "/visits/" + bench.visit.id() + "/report";
    for (int round = 0; round < ROUNDS; round++) {
      List<MockHttpServletResponse> answers = bothAtOnce(address);
      assertThat(answers)
          .extracting(MockHttpServletResponse::getStatus)
          .containsExactlyInAnyOrder(302, 409);
      MockHttpServletResponse late =
          answers.stream().filter(a -> a.getStatus() == 409).findFirst().orElseThrow();
      List<Reports.Entry> issued = reports.ofVisit(bench.visit.id());
      assertThat(issued).hasSize(round + 1);
      assertThat(issued.stream().filter(e -> e.replacedBy() == null)).hasSize(1);
      long current = issued.get(0).number();
      // what was typed stands in the form again, which now revises the report that came first
      int other = answers.indexOf(late);
      assertThat(late.getContentAsString())
          .contains("remarks of number " + other)
          .contains("action=\"/reports/" + current + "/revise\"")
          .contains("Meanwhile report %05d was issued".formatted(current));
      assertThat(reports.find(current).orElseThrow().contentJson())
          .contains("remarks of number " + (1 - other));
      address = "/reports/" + current + "/revise";
    }
  }

  private List<MockHttpServletResponse> bothAtOnce(String address) throws Exception {
    SecurityContext owner = SecurityContextHolder.getContext();
    CyclicBarrier start = new CyclicBarrier(2);
    ExecutorService two = Executors.newFixedThreadPool(2);
    try {
      List<Future<MockHttpServletResponse>> sent = new ArrayList<>();
      for (int i = 0; i < 2; i++) {
        String remarks = "remarks of number " + i;
        sent.add(
            two.submit(
                () -> {
                  start.await(10, TimeUnit.SECONDS);
                  return mvc.perform(
                          post(address)
                              .with(securityContext(owner))
                              .with(csrf())
                              .param("language", "en")
                              .param("measuredBy", "A")
                              .param("releasedBy", "B")
                              .param("conditions", "")
                              .param("remarks", remarks)
                              .param("reason", "misprint"))
                      .andReturn()
                      .getResponse();
                }));
      }
      List<MockHttpServletResponse> answers = new ArrayList<>();
      for (Future<MockHttpServletResponse> one : sent) {
        answers.add(one.get(60, TimeUnit.SECONDS));
      }
      return answers;
    } finally {
      two.shutdownNow();
    }
  }
}
