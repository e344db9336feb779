package turnsheet.exchange;

import de.siegmar.fastcsv.writer.CsvWriter;
import java.io.IOException;
import java.io.Writer;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.OffsetDateTime;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;
import turnsheet.document.FigurePaths;
import turnsheet.document.ReadingDocument;

/** Figures as a flat table: RFC 4180, UTF-8, a point as decimal sign, a line of heads. */
@Component
final class FigureRows {

  static final List<String> HEADS =
      List.of(
          "unit",
          "model",
          "serialNumber",
          "customer",
          "visitOpenedAt",
          "visitClosedAt",
          "speedSetting",
          "condition",
          "file",
          "receivedAt",
          "kind",
          "channel",
          "readingId",
          "madeAt",
          "methodVersion",
          "figure",
          "value",
          "expandedUncertainty",
          "k",
          "why");

  private final JdbcClient jdbc;

  FigureRows(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** Rows of all figures of readings, in the order of the readings. */
  void write(List<?> readings, Writer out) throws IOException {
    CsvWriter csv = CsvWriter.builder().build(out);
    csv.writeRecord(HEADS);
    for (int from = 0; from < readings.size(); from += Export.AT_ONCE) {
      List<?> some = readings.subList(from, Math.min(readings.size(), from + Export.AT_ONCE));
      Map<UUID, Line> lines = lines(some);
      for (Object id : some) {
        Line line = lines.get(id);
        if (line != null) {
          FigurePaths.of(line.reading())
              .forEach((path, figure) -> csv.writeRecord(row(line.place(), path, figure)));
        }
      }
    }
    csv.flush();
  }

  /** A reading and what stands before each of its figures. */
  private record Line(List<String> place, Reading reading) {}

  private Map<UUID, Line> lines(List<?> ids) {
    Map<UUID, Line> lines = new HashMap<>();
    jdbc.sql(
            """
            select r.id, r.made_at, r.document, u.code, m.name as model, u.serial_number,
              k.name as customer, v.opened_at, v.closed_at, s.label, c.bench_condition, c.file_name,
              c.received_at
            from reading r join capture c on c.id = r.capture_id join visit v on v.id = c.visit_id
              join unit u on u.id = v.unit_id join machine_model m on m.id = u.model_id
              join customer k on k.id = u.customer_id
              join speed_setting s on s.id = c.speed_setting_id
            where r.id in (:ids)
            """)
        .param("ids", ids)
        .query(
            row -> {
              lines.put(row.getObject("id", UUID.class), line(row));
            });
    return lines;
  }

  private static Line line(ResultSet row) throws SQLException {
    Reading reading = ReadingDocument.fromJson(row.getString("document"));
    return new Line(
        List.of(
            row.getString("code"),
            row.getString("model"),
            row.getString("serial_number"),
            row.getString("customer"),
            time(row, "opened_at"),
            time(row, "closed_at"),
            row.getString("label"),
            row.getString("bench_condition"),
            row.getString("file_name"),
            time(row, "received_at"),
            reading.source().kind().name().toLowerCase(Locale.ROOT),
            Integer.toString(reading.source().channel()),
            row.getString("id"),
            time(row, "made_at"),
            reading.method().version()),
        reading);
  }

  private static List<String> row(List<String> place, String path, Figure figure) {
    List<String> cells = new java.util.ArrayList<>(place);
    cells.add(path);
    cells.add(text(figure.value()));
    cells.add(text(figure.expandedUncertainty()));
    cells.add(text(figure.k()));
    cells.add(figure.why() == null ? "" : figure.why());
    return cells;
  }

  private static String time(ResultSet row, String column) throws SQLException {
    OffsetDateTime time = row.getObject(column, OffsetDateTime.class);
    return time == null ? "" : time.toInstant().toString();
  }

  private static String text(@Nullable Double value) {
    return value == null ? "" : value.toString();
  }
}
