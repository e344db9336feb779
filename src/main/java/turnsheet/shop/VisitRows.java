package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Instant;
import java.util.List;
import org.springframework.jdbc.core.simple.JdbcClient;

/** Rows of visits as records and back, without the parts that were fitted. */
final class VisitRows {

  /** Visits with the unit, model and customer they belong to, newest first. */
  static final PageQuery.Listing LISTING =
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

  private VisitRows() {}

  /** A visit that has just been opened. */
  static void insert(JdbcClient jdbc, Visit opened) {
    jdbc.sql(
            """
            insert into visit (id, unit_id, opened_at, complaint, work_done)
            values (?, ?, ?, ?, ?)
            """)
        .params(
            opened.id().value(),
            opened.unitId().value(),
            Columns.time(opened.openedAt()),
            opened.notes().complaint(),
            opened.notes().workDone())
        .update();
  }

  static void update(JdbcClient jdbc, Visit visit) {
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
  }

  static VisitSummary summary(ResultSet row, int number) throws SQLException {
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

  static Visit visit(ResultSet row, int number) throws SQLException {
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
