package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Predicate;
import java.util.function.UnaryOperator;
import org.springframework.dao.DataIntegrityViolationException;
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
            c.name as customer_name,
            (select max(r.number) from report r where r.visit_id = v.id) as report,
            (select max(r.issued_at) from report r where r.visit_id = v.id) as reported_at
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
  private final FittedParts parts;
  private final Clock clock;

  public Visits(JdbcClient jdbc, TransactionOperations transactions, Clock clock) {
    this.jdbc = jdbc;
    this.transactions = transactions;
    this.parts = new FittedParts(jdbc);
    this.clock = clock;
  }

  public Optional<Visit> find(VisitId id) {
    return jdbc.sql("select * from visit where id = ?")
        .param(id.value())
        .query(Visits::visit)
        .optional()
        .map(this::whole);
  }

  /** The visit with the unit, model and customer it belongs to. */
  public Optional<VisitSummary> summary(VisitId id) {
    return jdbc.sql(LISTING.select() + LISTING.from() + " where v.id = ?")
        .param(id.value())
        .query(Visits::summary)
        .optional()
        .map(s -> s.withVisit(whole(s.visit())));
  }

  /** All visits of a unit, newest first. */
  public List<Visit> ofUnit(UnitId unit) {
    List<Visit> visits =
        jdbc.sql("select * from visit where unit_id = ? order by opened_at desc, id")
            .param(unit.value())
            .query(Visits::visit)
            .list();
    Map<VisitId, List<FittedPart>> fitted = parts.of(visits);
    return visits.stream().map(v -> v.withParts(fitted.getOrDefault(v.id(), List.of()))).toList();
  }

  /** The visit that a unit is on the bench for. */
  public Optional<Visit> openOf(UnitId unit) {
    return ofUnit(unit).stream().filter(Visit::isOpen).findFirst();
  }

  /** A page of all visits, newest first; words are looked for in serial number, model, customer. */
  public PageOf<VisitSummary> page(PageQuery query) {
    return whole(query.run(jdbc, LISTING, Visits::summary));
  }

  /** A page of the visits of one unit, newest first. */
  public PageOf<VisitSummary> page(UnitId unit, PageQuery query) {
    return whole(query.run(jdbc, LISTING.where("v.unit_id = ?", unit.value()), Visits::summary));
  }

  /** A page of the visits that are still open, newest first. */
  public PageOf<VisitSummary> open(PageQuery query) {
    return whole(query.run(jdbc, LISTING.where("v.closed_at is null"), Visits::summary));
  }

  /** A page of the visits that are open, or were until this instant or later; newest first. */
  public PageOf<VisitSummary> openSince(Instant instant, PageQuery query) {
    return whole(
        query.run(
            jdbc,
            LISTING.where(
                "(v.closed_at is null or v.closed_at >= ?)", Columns.time(Columns.kept(instant))),
            Visits::summary));
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

  /** Brings complaint and work of an open visit up to date; parts and sensor stay as they are. */
  public Optional<Visit> recordWork(VisitId id, String complaint, String workDone) {
    return change(
        id,
        visit ->
            visit.record(
                new VisitNotes(
                    complaint,
                    workDone,
                    visit.notes().parts(),
                    visit.notes().sensorReplaced(),
                    visit.notes().sensorNote())));
  }

  /** Brings all notes of an open visit up to date. */
  public Optional<Visit> record(VisitId id, VisitNotes notes) {
    return change(id, visit -> visit.record(notes));
  }

  /**
   * The same for notes that were written over those that somebody had before them.
   *
   * @param asSeen whether the notes that stand are still the ones that were seen
   * @throws RefusedChangeException {@code notesChanged} where they are not: somebody else's work
   *     would be lost
   */
  public Optional<Visit> record(VisitId id, VisitNotes notes, Predicate<Visit> asSeen) {
    return change(
        id,
        visit -> {
          if (visit.isOpen() && !asSeen.test(visit)) {
            throw new RefusedChangeException("notesChanged");
          }
          return visit.record(notes);
        });
  }

  /**
   * Takes a visit away that was opened by mistake.
   *
   * @return whether it was there
   * @throws RefusedChangeException {@code visitHasCaptures}, or {@code visitInUse} where a link or
   *     a sheet refers to it
   */
  public boolean remove(VisitId id) {
    return Boolean.TRUE.equals(
        transactions.execute(
            status -> {
              find(id).ifPresent(visit -> lockUnit(visit.unitId()));
              if (captures(id) > 0) {
                throw new RefusedChangeException("visitHasCaptures");
              }
              try {
                parts.remove(id);
                jdbc.sql("delete from plate_photo where visit_id = ?").param(id.value()).update();
                return jdbc.sql("delete from visit where id = ?").param(id.value()).update() > 0;
              } catch (DataIntegrityViolationException e) {
                throw new RefusedChangeException("visitInUse");
              }
            }));
  }

  /** How many captures a visit has. */
  public int captures(VisitId id) {
    return jdbc.sql("select count(*) from capture where visit_id = ?")
        .param(id.value())
        .query(Integer.class)
        .single();
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
    VisitNotes notes = visit.notes();
    jdbc.sql(
            """
            update visit set closed_at = ?, complaint = ?, work_done = ?, sensor_replaced = ?,
              sensor_note = ?
            where id = ?
            """)
        .param(1, closedAt == null ? null : Columns.time(closedAt), Types.TIMESTAMP_WITH_TIMEZONE)
        .param(2, notes.complaint())
        .param(3, notes.workDone())
        .param(4, notes.sensorReplaced())
        .param(5, notes.sensorNote())
        .param(6, visit.id().value())
        .update();
    parts.put(visit.id(), notes.parts());
    return visit;
  }

  private Visit whole(Visit visit) {
    return visit.withParts(parts.of(List.of(visit)).getOrDefault(visit.id(), List.of()));
  }

  private PageOf<VisitSummary> whole(PageOf<VisitSummary> page) {
    var fitted = parts.of(page.items().stream().map(VisitSummary::visit).toList());
    return page.map(
        s -> s.withVisit(s.visit().withParts(fitted.getOrDefault(s.visit().id(), List.of()))));
  }

  private static VisitSummary summary(ResultSet row, int number) throws SQLException {
    return new VisitSummary(
        visit(row, number),
        row.getString("serial_number"),
        new ModelId(Columns.uuid(row, "model_id")),
        row.getString("model_name"),
        new CustomerId(Columns.uuid(row, "customer_id")),
        row.getString("customer_name"),
        Columns.longOrNull(row, "report"),
        Columns.instantOrNull(row, "reported_at"));
  }

  private static Visit visit(ResultSet row, int number) throws SQLException {
    return new Visit(
        new VisitId(Columns.uuid(row, "id")),
        new UnitId(Columns.uuid(row, "unit_id")),
        Columns.instant(row, "opened_at"),
        Columns.instantOrNull(row, "closed_at"),
        new VisitNotes(
            row.getString("complaint"),
            row.getString("work_done"),
            List.of(),
            row.getBoolean("sensor_replaced"),
            row.getString("sensor_note")));
  }
}
