package turnsheet.report;

import java.nio.charset.StandardCharsets;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import org.springframework.dao.QueryTimeoutException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.access.Secrets;
import turnsheet.document.CoreJson;
import turnsheet.shop.VisitId;

/** All issued reports. They are added, never changed. */
@Component
public final class Reports {

  private static final String SELECT =
      """
      select r.visit_id, r.check_code, r.content_sha256, r.content,
        (select later.number from report later where later.revises = r.number) as replaced_by
      from report r
      """;

  /** A minute on H2; PostgreSQL waits as long as it takes. */
  private static final int MOST_TURNS = 30;

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;

  public Reports(JdbcClient jdbc, TransactionOperations transactions) {
    this.jdbc = jdbc;
    this.transactions = transactions;
  }

  /** A line of a list of reports. */
  public record Entry(
      long number,
      Instant issuedAt,
      VisitId visitId,
      String modelName,
      String serialNumber,
      @Nullable Long revises,
      @Nullable Long replacedBy) {}

  /**
   * Issues the next number.
   *
   * @param content made from the number that it gets
   * @param print makes the PDF of the finished report
   * @throws IllegalArgumentException if the report that it revises is not there or was revised
   *     already
   */
  public Report add(
      VisitId visit, Function<Long, Report.Content> content, Function<Report, byte[]> print) {
    return transactions.execute(
        status -> {
          // one at a time, so that numbers run without a gap
          awaitTurn();
          long number =
              jdbc.sql("select coalesce(max(number), 0) + 1 from report")
                  .query(Long.class)
                  .single();
          Report.Content made = content.apply(number);
          requireRevisable(made.issue().revises());
          String json = CoreJson.toJson(made);
          Report report =
              new Report(visit, made, json, Secrets.sha256(json), CheckCode.of(json), null);
          store(report, print.apply(report));
          return report;
        });
  }

  /**
   * Waits, until the end of the transaction around it, for whoever is issuing a report: what is
   * read afterwards is still so when a report is added.
   */
  public void awaitTurn() {
    for (int turn = 1; true; turn++) {
      try {
        jdbc.sql("select id from shop_rules where id = 1 for update").query().listOfRows();
        return;
      } catch (QueryTimeoutException e) {
        // H2 gives up waiting after two seconds, and printing a report may take longer
        if (turn == MOST_TURNS) {
          throw e;
        }
      }
    }
  }

  public Optional<Report> find(long number) {
    return jdbc.sql(SELECT + " where r.number = ?").param(number).query(Reports::report).optional();
  }

  /** The report that a code was printed on, typed in any case, with or without dashes. */
  public Optional<Report> byCheckCode(String typed) {
    return jdbc.sql(SELECT + " where r.check_code = ?")
        .param(CheckCode.typed(typed))
        .query(Reports::report)
        .optional();
  }

  /**
   * The printed form as it was made when the report was issued; afresh where the report came with
   * an import.
   *
   * @param print makes the PDF of a report
   */
  public Optional<byte[]> pdf(long number, Function<Report, byte[]> print) {
    List<byte[]> kept =
        jdbc.sql("select pdf from report where number = ? and pdf is not null")
            .param(number)
            .query((row, n) -> row.getBytes(1))
            .list();
    return kept.isEmpty() ? find(number).map(print) : Optional.of(kept.get(0));
  }

  /** Reports of a visit, newest first. */
  public List<Entry> ofVisit(VisitId visit) {
    return entries("where r.visit_id = ?", visit.value());
  }

  /** The latest reports of the shop, newest first. */
  public List<Entry> latest(int most) {
    return entries("where r.number > (select coalesce(max(number), 0) from report) - ?", most);
  }

  private List<Entry> entries(String condition, Object param) {
    return jdbc.sql(
            """
            select r.number, r.issued_at, r.visit_id, m.name, u.serial_number, r.revises,
              (select later.number from report later where later.revises = r.number) as replaced_by
            from report r join visit v on v.id = r.visit_id join unit u on u.id = v.unit_id
              join machine_model m on m.id = u.model_id
            %s order by r.number desc
            """
                .formatted(condition))
        .param(param)
        .query(
            (row, n) ->
                new Entry(
                    row.getLong("number"),
                    row.getObject("issued_at", OffsetDateTime.class).toInstant(),
                    new VisitId(row.getObject("visit_id", UUID.class)),
                    row.getString("name"),
                    row.getString("serial_number"),
                    longOrNull(row, "revises"),
                    longOrNull(row, "replaced_by")))
        .list();
  }

  private void requireRevisable(@Nullable Long revises) {
    if (revises != null && !find(revises).map(Report::isCurrent).orElse(false)) {
      throw new IllegalArgumentException("report " + revises + " cannot be revised");
    }
  }

  private void store(Report report, byte[] pdf) {
    Issue issue = report.content().issue();
    jdbc.sql(
            """
            insert into report (number, visit_id, issued_at, revises, check_code, content_sha256,
              content, pdf)
            values (?, ?, ?, ?, ?, ?, ?, ?)
            """)
        .param(1, issue.number())
        .param(2, report.visitId().value())
        .param(3, issue.issuedAt().atOffset(ZoneOffset.UTC))
        .param(4, issue.revises(), Types.BIGINT)
        .param(5, report.checkCode())
        .param(6, report.contentSha256())
        .param(7, report.contentJson().getBytes(StandardCharsets.UTF_8))
        .param(8, pdf)
        .update();
  }

  private static Report report(ResultSet row, int n) throws SQLException {
    String json = new String(row.getBytes("content"), StandardCharsets.UTF_8);
    return new Report(
        new VisitId(row.getObject("visit_id", UUID.class)),
        CoreJson.fromJson(json, Report.Content.class),
        json,
        row.getString("content_sha256"),
        row.getString("check_code"),
        longOrNull(row, "replaced_by"));
  }

  private static @Nullable Long longOrNull(ResultSet row, String column) throws SQLException {
    long value = row.getLong(column);
    return row.wasNull() ? null : value;
  }
}
