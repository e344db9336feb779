package turnsheet.reading.web;

import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.springframework.context.MessageSource;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureState;
import turnsheet.reading.CaptureResult;
import turnsheet.reading.CaptureResults;
import turnsheet.shop.PageOf;
import turnsheet.shop.PageQuery;
import turnsheet.shop.ShopRules;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.shop.Visits;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Gathers what the bench page shows: seven statements, however full the bench is. */
@Component
class BenchView {

  private final Visits visits;
  private final CaptureResults results;
  private final JdbcClient jdbc;
  private final ShopRules rules;
  private final MessageSource messages;
  private final Times times;
  private final Clock clock;

  BenchView(
      Visits visits,
      CaptureResults results,
      JdbcClient jdbc,
      ShopRules rules,
      MessageSource messages,
      Times times,
      Clock clock) {
    this.visits = visits;
    this.results = results;
    this.jdbc = jdbc;
    this.rules = rules;
    this.messages = messages;
    this.times = times;
    this.clock = clock;
  }

  BenchPage page(Locale locale) {
    Wording words = new Wording(messages, locale);
    Instant today = times.startOfDay(clock.instant());
    List<VisitSummary> stays = visits.openSince(today, PageQuery.first(PageOf.LARGEST)).items();
    Map<VisitId, List<CaptureResult>> byVisit =
        results.onTheBench(today).stream().collect(Collectors.groupingBy(CaptureResult::visitId));
    Standing standing = new Standing(results.limitsOnTheBench(today), rules.get().rule());
    Bench bench = new Bench(stays, byVisit, standing, words, times);
    List<BenchPage.Recording> waiting = bench.recordings(CaptureState.RECOGNISED);
    List<BenchPage.Recording> measuring = bench.recordings(CaptureState.QUEUED);
    List<BenchPage.Recording> refused = bench.recordings(CaptureState.REFUSED, CaptureState.FAILED);
    List<BenchPage.Stay> outside = bench.outside();
    List<BenchPage.Stay> ready = bench.stays(NextStep.REPORT, NextStep.REVISE, NextStep.READY);
    Set<String> elsewhere =
        Stream.concat(outside.stream(), ready.stream())
            .map(BenchPage.Stay::visitId)
            .collect(Collectors.toSet());
    List<BenchPage.Stay> arrived = bench.stays(NextStep.RECORD);
    List<BenchPage.Stay> working =
        bench
            .stays(NextStep.CONFIRM, NextStep.WAIT, NextStep.WORK, NextStep.AGAIN, NextStep.OUTSIDE)
            .stream()
            .filter(stay -> !elsewhere.contains(stay.visitId()))
            .toList();
    return new BenchPage(
        words.text(
            "reading.bench.summary",
            Integer.toString(bench.open()),
            Integer.toString(waiting.size()),
            Integer.toString(measuring.size()),
            Integer.toString(refused.size()),
            Integer.toString(outside.size()),
            Integer.toString(ready.size())),
        start(),
        waiting,
        measuring,
        refused,
        outside,
        ready,
        arrived,
        working,
        bench.measuredSince(today),
        bench.open() == 0);
  }

  private BenchPage.Start start() {
    return jdbc.sql(
            """
            select (select count(*) from machine_model), (select count(*) from customer),
              (select count(*) from unit)
            """)
        .query(
            (row, number) ->
                new BenchPage.Start(row.getLong(1) > 0, row.getLong(2) > 0, row.getLong(3) > 0))
        .single();
  }
}
