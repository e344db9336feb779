package turnsheet.reading;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.ModelId;
import turnsheet.shop.SpeedSettingId;

/**
 * What is typical for the units of a model, in one statement: the newest reading of each unit at
 * each speed setting. A unit counts for the figures that this reading has. The newest captures are
 * found first, because the figures are many.
 */
@Component
public final class Populations {

  private final JdbcClient jdbc;

  public Populations(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** All that a model has, speed settings in the order of the selector, figures in their own. */
  public List<Population> ofModel(ModelId model) {
    return where("t.model_id = ?", model.value());
  }

  /** Those of one speed setting. */
  public List<Population> ofSetting(SpeedSettingId setting) {
    return where("t.id = ?", setting.value());
  }

  /** The one of a figure; empty where no unit has it. */
  public static Optional<Population> of(List<Population> all, FigureName figure) {
    return all.stream().filter(p -> p.figure() == figure).findFirst();
  }

  private List<Population> where(String condition, UUID id) {
    Map<UUID, Map<FigureName, List<Double>>> found = new LinkedHashMap<>();
    jdbc.sql(
            """
            select newest.speed_setting_id, f.figure, f.amount from (
              select c.id, c.speed_setting_id, row_number() over (
                  partition by v.unit_id, c.speed_setting_id
                  order by c.received_at desc, c.id desc) as age
              from capture c join visit v on v.id = c.visit_id
              where c.state = 'measured' and c.speed_setting_id in
                (select t.id from speed_setting t where %s)) newest
              join speed_setting s on s.id = newest.speed_setting_id
              join reading r on r.capture_id = newest.id and %s
              join reading_figure f on f.reading_id = r.id
            where newest.age = 1 and f.amount is not null order by s.position
            """
                .formatted(condition, Readings.NEWEST_OF_ITS_CAPTURE))
        .param(id)
        .query(
            row -> {
              UUID setting = row.getObject("speed_setting_id", UUID.class);
              double amount = row.getDouble("amount");
              FigureName.ofPath(row.getString("figure"))
                  .ifPresent(
                      name ->
                          found
                              .computeIfAbsent(setting, s -> new EnumMap<>(FigureName.class))
                              .computeIfAbsent(name, n -> new ArrayList<>())
                              .add(amount));
            });
    List<Population> all = new ArrayList<>();
    found.forEach(
        (setting, figures) ->
            figures.forEach(
                (name, values) ->
                    all.add(new Population(new SpeedSettingId(setting), name, values))));
    return all;
  }
}
