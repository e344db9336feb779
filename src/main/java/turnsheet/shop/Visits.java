package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;

/** The visits of all units. */
@Component
public final class Visits {

  private static final PageQuery.Listing LISTING =
      new PageQuery.Listing(
          """
          select v.*, u.serial_number, u.model_id, m.name as model_name, u.customer_id,
            c.name as customer_name
          """,
          """
          from visit v join unit u on u.id = v.unit_id join machine_model m on m.id = u.model_id
            join customer c on c.id = u.customer_id
          """,
          "",
          List.of(),
          "u.serial_number || ' ' || m.name || ' ' || c.name",
          "order by v.opened_at desc, v.id");

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;
  private final Clock clock;

  public Visits(JdbcClient jdbc, TransactionOperations transactions, Clock clock) {
    this.jdbc = jdbc;
    this.transactions = transactions;
    this.clock = clock;
  }

  public Optional<Visit> find(VisitId id) {
    return jdbc.sql("select * from visit where id = ?")
        .param(id.value())
        .query(Visits::visit)
        .optional();
  }

  /** The visit with the unit, model and customer it belongs to. */
  public Optional<VisitSummary> summary(VisitId id) {
    return jdbc.sql(LISTING.select() + LISTING.from() + " where v.id = ?")
        .param(id.value())
        .query(Visits::summary)
        .optional();
  }

  /** All visits of a unit, newest first. */
  public List<Visit> ofUnit(UnitId unit) {
    return jdbc.sql("select * from visit where unit_id = ? order by opened_at desc, id")
        .param(unit.value())
        .query(Visits::visit)
        .list();
  }

  /** A page of all visits, newest first; words are looked for in serial number, model, customer. */
  public PageOf<VisitSummary> page(PageQuery query) {
    return query.run(jdbc, LISTING, Visits::summary);
  }

  /** A page of the visits of one unit, newest first. */
  public PageOf<VisitSummary> page(UnitId unit, PageQuery query) {
    return query.run(jdbc, LISTING.where("v.unit_id = ?", unit.value()), Visits::summary);
  }

  /** A page of the visits that are still open, newest first. */
  public PageOf<VisitSummary> open(PageQuery query) {
    return query.run(jdbc, LISTING.where("v.closed_at is null"), Visits::summary);
  }

  /**
   * Opens a visit now.
   *
   * @throws RefusedChangeException {@code visitStillOpen} where the unit is on the bench already
   */
  public Visit open(UnitId unit, String complaint) {
    return transactions.execute(
        status -> {
          lockUnit(unit);
          refuseSecondOpen(unit);
          Instant now = Columns.kept(clock.instant());
          Visit opened = new Visit(VisitId.next(), unit, now, null, complaint, "");
          jdbc.sql(
                  """
                  insert into visit (id, unit_id, opened_at, complaint, work_done)
                  values (?, ?, ?, ?, ?)
                  """)
              .params(opened.id().value(), unit.value(), Columns.time(now), complaint, "")
              .update();
          return opened;
        });
  }

  /** Brings complaint and work of an open visit up to date. */
  public Optional<Visit> recordWork(VisitId id, String complaint, String workDone) {
    return change(id, visit -> visit.recordWork(complaint, workDone));
  }

  /** Hands the unit back now. */
  public Optional<Visit> close(VisitId id) {
    return change(id, visit -> visit.close(Columns.kept(clock.instant())));
  }

  /**
   * Takes a closed visit up again.
   *
   * @throws RefusedChangeException {@code visitStillOpen} where another visit of the unit is open
   */
  public Optional<Visit> reopen(VisitId id) {
    return change(
        id,
        visit -> {
          Visit reopened = visit.reopen();
          refuseSecondOpen(visit.unitId());
          return reopened;
        });
  }

  private Optional<Visit> change(VisitId id, UnaryOperator<Visit> verb) {
    return transactions.execute(
        status -> {
          find(id).ifPresent(visit -> lockUnit(visit.unitId()));
          return find(id).map(verb).map(this::write);
        });
  }

  /** Changes to the visits of one unit queue here, so that each sees what the one before left. */
  private void lockUnit(UnitId unit) {
    jdbc.sql("select id from unit where id = ? for update")
        .param(unit.value())
        .query((row, n) -> n)
        .list();
  }

  private void refuseSecondOpen(UnitId unit) {
    if (ofUnit(unit).stream().anyMatch(Visit::isOpen)) {
      throw new RefusedChangeException("visitStillOpen");
    }
  }

  private Visit write(Visit visit) {
    Instant closedAt = visit.closedAt();
    jdbc.sql("update visit set closed_at = ?, complaint = ?, work_done = ? where id = ?")
        .param(1, closedAt == null ? null : Columns.time(closedAt), Types.TIMESTAMP_WITH_TIMEZONE)
        .param(2, visit.complaint())
        .param(3, visit.workDone())
        .param(4, visit.id().value())
        .update();
    return visit;
  }

  private static VisitSummary summary(ResultSet row, int number) throws SQLException {
    return new VisitSummary(
        visit(row, number),
        row.getString("serial_number"),
        new ModelId(Columns.uuid(row, "model_id")),
        row.getString("model_name"),
        new CustomerId(Columns.uuid(row, "customer_id")),
        row.getString("customer_name"));
  }

  private static Visit visit(ResultSet row, int number) throws SQLException {
    return new Visit(
        new VisitId(Columns.uuid(row, "id")),
        new UnitId(Columns.uuid(row, "unit_id")),
        Columns.instant(row, "opened_at"),
        Columns.instantOrNull(row, "closed_at"),
        row.getString("complaint"),
        row.getString("work_done"));
  }
}
