package turnsheet.shop;

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
        .query(VisitRows::visit)
        .optional()
        .map(this::whole);
  }

  /** The visit with the unit, model and customer it belongs to. */
  public Optional<VisitSummary> summary(VisitId id) {
    return jdbc.sql(VisitRows.LISTING.select() + VisitRows.LISTING.from() + " where v.id = ?")
        .param(id.value())
        .query(VisitRows::summary)
        .optional()
        .map(s -> s.withVisit(whole(s.visit())));
  }

  /** All visits of a unit, newest first. */
  public List<Visit> ofUnit(UnitId unit) {
    List<Visit> visits =
        jdbc.sql("select * from visit where unit_id = ? order by opened_at desc, id")
            .param(unit.value())
            .query(VisitRows::visit)
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
    return whole(query.run(jdbc, VisitRows.LISTING, VisitRows::summary));
  }

  /** A page of the visits of one unit, newest first. */
  public PageOf<VisitSummary> page(UnitId unit, PageQuery query) {
    return whole(
        query.run(
            jdbc, VisitRows.LISTING.where("v.unit_id = ?", unit.value()), VisitRows::summary));
  }

  /** A page of the visits that are still open, newest first. */
  public PageOf<VisitSummary> open(PageQuery query) {
    return whole(
        query.run(jdbc, VisitRows.LISTING.where("v.closed_at is null"), VisitRows::summary));
  }

  /** A page of the visits that are open, or were until this instant or later; newest first. */
  public PageOf<VisitSummary> openSince(Instant instant, PageQuery query) {
    return whole(
        query.run(
            jdbc,
            VisitRows.LISTING.where(
                "(v.closed_at is null or v.closed_at >= ?)", Columns.time(Columns.kept(instant))),
            VisitRows::summary));
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
          VisitRows.insert(jdbc, opened);
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
              lock(id);
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

  /**
   * Holds a visit and its unit as they are until the transaction at hand commits: nobody closes the
   * visit or gives the unit another model meanwhile. What is to be relied on is read afterwards.
   */
  public void lock(VisitId id) {
    find(id).ifPresent(visit -> lockUnit(visit.unitId()));
  }

  private Optional<Visit> change(VisitId id, UnaryOperator<Visit> verb) {
    return transactions.execute(
        status -> {
          lock(id);
          return find(id).map(verb).map(this::write);
        });
  }

  /** Changes to the visits of one unit queue here, so that each sees what the one before left. */
  private void lockUnit(UnitId unit) {
    Units.lock(jdbc, unit);
  }

  private void refuseSecondOpen(UnitId unit) {
    if (ofUnit(unit).stream().anyMatch(Visit::isOpen)) {
      throw new RefusedChangeException("visitStillOpen");
    }
  }

  private Visit write(Visit visit) {
    VisitRows.update(jdbc, visit);
    parts.put(visit.id(), visit.notes().parts());
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
}
