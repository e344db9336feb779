package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.RowMapper;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.measure.FigureName;
import turnsheet.document.CoreJson;

/** The four tables of a machine model. */
final class ModelRows {

  private final JdbcClient jdbc;

  ModelRows(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** Four statements however many are asked for; in the order asked, those missing left out. */
  List<MachineModel> read(List<ModelId> wanted) {
    if (wanted.isEmpty()) {
      return List.of();
    }
    List<UUID> ids = wanted.stream().map(ModelId::value).toList();
    Map<UUID, List<SpeedSetting>> settings =
        children("select * from speed_setting", "position", ids, ModelRows::setting);
    Map<UUID, List<RotatingPart>> parts =
        children("select * from rotating_part", "position", ids, ModelRows::part);
    Map<UUID, List<ServiceLimit>> limits =
        children("select * from service_limit", "position", ids, ModelRows::limit);
    Map<UUID, MachineModel> models = new HashMap<>();
    jdbc.sql("select * from machine_model where id in (:ids)")
        .param("ids", ids)
        .query(
            row -> {
              UUID id = Columns.uuid(row, "id");
              models.put(
                  id,
                  new MachineModel(
                      new ModelId(id),
                      row.getString("name"),
                      Columns.intOrNull(row, "pulses_per_turn"),
                      row.getString("note"),
                      settings.getOrDefault(id, List.of()),
                      parts.getOrDefault(id, List.of()),
                      limits.getOrDefault(id, List.of())));
            });
    return ids.stream().map(models::get).filter(Objects::nonNull).toList();
  }

  void lock(ModelId id) {
    jdbc.sql("select id from machine_model where id = ? for update")
        .param(id.value())
        .query((row, n) -> n)
        .list();
  }

  void insert(MachineModel model) {
    jdbc.sql("insert into machine_model (name, pulses_per_turn, note, id) values (?, ?, ?, ?)")
        .param(1, model.name())
        .param(2, model.pulsesPerTurn(), Types.INTEGER)
        .param(3, model.note())
        .param(4, model.id().value())
        .update();
    for (int i = 0; i < model.settings().size(); i++) {
      insertSetting(model, i);
    }
    insertPartsAndLimits(model);
  }

  void update(MachineModel old, MachineModel now) {
    UUID id = now.id().value();
    jdbc.sql("update machine_model set name = ?, pulses_per_turn = ?, note = ? where id = ?")
        .param(1, now.name())
        .param(2, now.pulsesPerTurn(), Types.INTEGER)
        .param(3, now.note())
        .param(4, id)
        .update();
    jdbc.sql("delete from service_limit where model_id = ?").param(id).update();
    jdbc.sql("delete from rotating_part where model_id = ?").param(id).update();
    for (SpeedSetting setting : old.settings()) {
      if (now.setting(setting.id()).isEmpty()) {
        jdbc.sql("delete from speed_setting where id = ?").param(setting.id().value()).update();
      }
    }
    // two settings may have swapped their labels, which are unique at every single statement
    jdbc.sql("update speed_setting set label = cast(id as varchar(80)) where model_id = ?")
        .param(id)
        .update();
    for (int i = 0; i < now.settings().size(); i++) {
      if (old.setting(now.settings().get(i).id()).isPresent()) {
        updateSetting(now, i);
      } else {
        insertSetting(now, i);
      }
    }
    insertPartsAndLimits(now);
  }

  private void insertSetting(MachineModel model, int position) {
    writeSetting(
        """
        insert into speed_setting
          (model_id, position, label, speed_unit, nominal_speed, tone_hz, pulses_per_second, id)
        values (?, ?, ?, ?, ?, ?, ?, ?)
        """,
        model,
        position);
  }

  private void updateSetting(MachineModel model, int position) {
    writeSetting(
        """
        update speed_setting set model_id = ?, position = ?, label = ?, speed_unit = ?,
          nominal_speed = ?, tone_hz = ?, pulses_per_second = ?
        where id = ?
        """,
        model,
        position);
  }

  private void writeSetting(String sql, MachineModel model, int position) {
    SpeedSetting setting = model.settings().get(position);
    jdbc.sql(sql)
        .param(1, model.id().value())
        .param(2, position)
        .param(3, setting.label())
        .param(4, setting.unit().name())
        .param(5, setting.nominalSpeed())
        .param(6, setting.toneHz(), Types.DOUBLE)
        .param(7, setting.pulsesPerSecond(), Types.DOUBLE)
        .param(8, setting.id().value())
        .update();
  }

  private void insertPartsAndLimits(MachineModel model) {
    int position = 0;
    for (RotatingPart part : model.parts()) {
      jdbc.sql(
              """
              insert into rotating_part
                (model_id, position, name, basis, amount, reference_part, kind, details)
              values (?, ?, ?, ?, ?, ?, ?, ?)
              """)
          .param(1, model.id().value())
          .param(2, position++)
          .param(3, part.name())
          .param(4, part.basis().name())
          .param(5, part.amount())
          .param(6, part.referencePart(), Types.VARCHAR)
          .param(7, part.kind() == PartKind.OTHER ? null : part.kind().name(), Types.VARCHAR)
          .param(8, json(part.details()), Types.VARCHAR)
          .update();
    }
    position = 0;
    for (ServiceLimit limit : model.limits()) {
      jdbc.sql(
              """
              insert into service_limit
                (model_id, position, speed_setting_id, figure, upper_bound, origin)
              values (?, ?, ?, ?, ?, ?)
              """)
          .param(model.id().value())
          .param(position++)
          .param(limit.settingId().value())
          .param(limit.figure().path())
          .param(limit.upperBound())
          .param(limit.origin())
          .update();
    }
  }

  private <T> Map<UUID, List<T>> children(
      String select, String order, List<UUID> ids, RowMapper<T> mapper) {
    Map<UUID, List<T>> byModel = new HashMap<>();
    jdbc.sql(select + " where model_id in (:ids) order by " + order)
        .param("ids", ids)
        .query(
            row -> {
              byModel
                  .computeIfAbsent(Columns.uuid(row, "model_id"), k -> new ArrayList<>())
                  .add(Objects.requireNonNull(mapper.mapRow(row, 0)));
            });
    return byModel;
  }

  private static SpeedSetting setting(ResultSet row, int number) throws SQLException {
    return new SpeedSetting(
        new SpeedSettingId(Columns.uuid(row, "id")),
        row.getString("label"),
        SpeedUnit.valueOf(row.getString("speed_unit")),
        row.getDouble("nominal_speed"),
        Columns.doubleOrNull(row, "tone_hz"),
        Columns.doubleOrNull(row, "pulses_per_second"));
  }

  private static RotatingPart part(ResultSet row, int number) throws SQLException {
    String kind = row.getString("kind");
    String details = row.getString("details");
    return new RotatingPart(
        row.getString("name"),
        kind == null ? PartKind.OTHER : PartKind.valueOf(kind),
        PartBasis.valueOf(row.getString("basis")),
        row.getDouble("amount"),
        row.getString("reference_part"),
        details == null ? PartDetails.NONE : CoreJson.fromJson(details, PartDetails.class));
  }

  private static @Nullable String json(PartDetails details) {
    return details.equals(PartDetails.NONE) ? null : CoreJson.toJson(details);
  }

  private static ServiceLimit limit(ResultSet row, int number) throws SQLException {
    String path = row.getString("figure");
    return new ServiceLimit(
        new SpeedSettingId(Columns.uuid(row, "speed_setting_id")),
        FigureName.ofPath(path).orElseThrow(() -> new IllegalStateException("figure " + path)),
        row.getDouble("upper_bound"),
        row.getString("origin"));
  }
}
