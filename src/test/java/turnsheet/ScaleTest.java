package turnsheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.context.annotation.Import;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.test.web.servlet.MockMvc;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.BigShop;
import turnsheet.testing.ServiceTest;
import turnsheet.testing.StatementCount;

/**
 * A shop with 1000 units and 10 000 readings: no page asks the database more often because there is
 * more in it. Times are printed, not held: a busy machine would make them fail. Those measured
 * stand in docs/performance.md.
 */
@ServiceTest
@Import(StatementCount.class)
@AsTechnician
class ScaleTest {

  private static final int TURNS = 5;

  @Autowired MockMvc mvc;
  @Autowired JdbcTemplate jdbc;

  @Test
  void noPageAsksMoreBecauseThereIsMore() throws Exception {
    BigShop shop = new BigShop(jdbc);
    // a statement that comes again would be answered from memory
    jdbc.execute("set optimize_reuse_results 0");
    // one of each page's is for the language of the shop
    Map<String, Integer> most = new LinkedHashMap<>();
    most.put("/", 9);
    most.put("/units", 3);
    most.put("/units?q=S00500", 3);
    most.put("/units/" + shop.unit, 15);
    most.put("/visits/" + shop.visit, 14);
    most.put("/models", 3);
    most.put("/models/" + shop.model, 10);
    most.put("/instruments", 4);
    most.put("/instruments/" + shop.instrument, 4);
    most.put("/customers", 3);
    most.put("/customers/" + shop.customer, 4);
    most.put(
        "/api/v1/units/"
            + shop.unit
            + "/history?figure=speed.deviationPercent&setting="
            + shop.setting,
        9);

    Map<String, Integer> counted = new LinkedHashMap<>();
    for (String page : most.keySet()) {
      counted.put(page, StatementCount.of(() -> open(page)));
      System.out.printf(
          "%-60s %2d statements %4d ms%n",
          page.replaceAll("[0-9-]{30,}", "ID"), counted.get(page), millis(page));
    }
    assertThat(counted)
        .allSatisfy((page, count) -> assertThat(count).as(page).isBetween(1, most.get(page)));
  }

  private Object open(String page) throws Exception {
    return mvc.perform(get(page)).andExpect(status().isOk());
  }

  /** Processor time of the request, the database in it: the middle one of several. */
  private long millis(String page) throws Exception {
    ThreadMXBean threads = ManagementFactory.getThreadMXBean();
    long[] nanos = new long[TURNS];
    for (int i = 0; i < TURNS; i++) {
      long begin = threads.getCurrentThreadCpuTime();
      open(page);
      nanos[i] = threads.getCurrentThreadCpuTime() - begin;
    }
    Arrays.sort(nanos);
    return nanos[TURNS / 2] / 1_000_000;
  }
}
