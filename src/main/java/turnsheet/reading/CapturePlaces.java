package turnsheet.reading;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.OffsetDateTime;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureId;
import turnsheet.capture.ToneMethod;
import turnsheet.shop.ModelId;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.UnitId;
import turnsheet.shop.VisitId;

/** Finds where captures belong, in one statement. */
@Component
public final class CapturePlaces {

  private final JdbcClient jdbc;

  public CapturePlaces(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  public Optional<CapturePlace> find(CaptureId id) {
    return jdbc.sql(
            """
            select c.id, c.file_name, c.byte_length, c.received_at, c.bench_condition, c.tone_method,
              c.speed_setting_id, s.label as setting_label, v.id as visit_id, v.opened_at,
              u.id as unit_id, u.serial_number, m.id as model_id, m.name as model_name,
              o.name as customer_name, i.name as instrument_name, d.name as medium_name
            from capture c join speed_setting s on s.id = c.speed_setting_id
              join visit v on v.id = c.visit_id join unit u on u.id = v.unit_id
              join machine_model m on m.id = u.model_id join customer o on o.id = u.customer_id
              left join bench_instrument i on i.id = c.instrument_id
              left join reference_medium d on d.id = c.medium_id
            where c.id = ?
            """)
        .param(id.value())
        .query(CapturePlaces::place)
        .optional();
  }

  /** Also for lists of captures: the column of a row of captures. */
  static @Nullable ToneMethod method(ResultSet row) throws SQLException {
    String word = row.getString("tone_method");
    return word == null ? null : ToneMethod.ofWord(word).orElse(null);
  }

  private static CapturePlace place(ResultSet row, int number) throws SQLException {
    return new CapturePlace(
        new CaptureId(row.getObject("id", UUID.class)),
        row.getString("file_name"),
        row.getLong("byte_length"),
        row.getObject("received_at", OffsetDateTime.class).toInstant(),
        row.getString("bench_condition"),
        new SpeedSettingId(row.getObject("speed_setting_id", UUID.class)),
        row.getString("setting_label"),
        new VisitId(row.getObject("visit_id", UUID.class)),
        row.getObject("opened_at", OffsetDateTime.class).toInstant(),
        new UnitId(row.getObject("unit_id", UUID.class)),
        row.getString("serial_number"),
        new ModelId(row.getObject("model_id", UUID.class)),
        row.getString("model_name"),
        row.getString("customer_name"),
        row.getString("instrument_name"),
        row.getString("medium_name"),
        method(row));
  }
}
