package turnsheet.reading;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.capture.SettingFit;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.UnitId;
import turnsheet.shop.VisitId;

/** How captures stand, many at a time: two statements a question, however many there are. */
@Component
public final class CaptureResults {

  private static final String OF_VISIT = "c.visit_id = ?";
  private static final String OF_UNIT = "v.unit_id = ?";
  private static final String ON_THE_BENCH = "(v.closed_at is null or v.closed_at >= ?)";

  private static final String READING_OF_CAPTURE =
      "left join reading r on r.capture_id = c.id and c.state = 'measured' and "
          + Readings.NEWEST_OF_ITS_CAPTURE;

  private final JdbcClient jdbc;

  public CaptureResults(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** The captures of a visit in the order of their arrival. */
  public List<CaptureResult> ofVisit(VisitId visit) {
    return where(OF_VISIT, List.of(visit.value()));
  }

  /** The captures of all visits of a unit in the order of their arrival. */
  public List<CaptureResult> ofUnit(UnitId unit) {
    return where(OF_UNIT, List.of(unit.value()));
  }

  /**
   * The captures of all visits that are open, or were until this instant or later, in the order of
   * their arrival.
   */
  public List<CaptureResult> onTheBench(Instant since) {
    return where(ON_THE_BENCH, List.of(since.atOffset(ZoneOffset.UTC)));
  }

  /** The limits of the speed settings that those visits have captures at, in one statement. */
  public Map<SpeedSettingId, List<ServiceLimit>> limitsOnTheBench(Instant since) {
    return jdbc
        .sql(
            """
            select l.speed_setting_id, l.figure, l.upper_bound, l.origin from service_limit l
            where l.speed_setting_id in (select c.speed_setting_id
              from capture c join visit v on v.id = c.visit_id where %s)
            order by l.figure
            """
                .formatted(ON_THE_BENCH))
        .param(since.atOffset(ZoneOffset.UTC))
        .query(CaptureResults::limit)
        .list()
        .stream()
        .flatMap(Optional::stream)
        .collect(Collectors.groupingBy(ServiceLimit::settingId));
  }

  private List<CaptureResult> where(String condition, List<?> params) {
    List<CaptureResult> plain =
        jdbc.sql(
                """
                select c.*, s.label as setting_label, j.progress, r.id as reading_id,
                  r.made_at as measured_at
                from capture c join visit v on v.id = c.visit_id
                  join speed_setting s on s.id = c.speed_setting_id
                  left join job j on j.id = c.job_id %s
                where %s order by c.received_at, c.id
                """
                    .formatted(READING_OF_CAPTURE, condition))
            .params(params)
            .query(CaptureResults::result)
            .list();
    Map<UUID, Map<FigureName, Figure>> figures = figures(condition, params);
    return plain.stream()
        .map(c -> c.withFigures(figures.getOrDefault(c.captureId().value(), Map.of())))
        .toList();
  }

  private Map<UUID, Map<FigureName, Figure>> figures(String condition, List<?> params) {
    Map<UUID, Map<FigureName, Figure>> found = new HashMap<>();
    jdbc.sql(
            """
            select c.id as capture_id, f.figure, f.amount, f.expanded_uncertainty
            from capture c join visit v on v.id = c.visit_id %s
              join reading_figure f on f.reading_id = r.id
            where f.amount is not null and %s
            """
                .formatted(READING_OF_CAPTURE.replace("left join", "join"), condition))
        .params(params)
        .query(
            row -> {
              UUID capture = row.getObject("capture_id", UUID.class);
              Figure figure = figure(row);
              FigureName.ofPath(row.getString("figure"))
                  .ifPresent(
                      name ->
                          found
                              .computeIfAbsent(capture, c -> new EnumMap<>(FigureName.class))
                              .put(name, figure));
            });
    return found;
  }

  private static Optional<ServiceLimit> limit(ResultSet row, int number) throws SQLException {
    SpeedSettingId setting = new SpeedSettingId(row.getObject("speed_setting_id", UUID.class));
    double bound = row.getDouble("upper_bound");
    String origin = row.getString("origin");
    return FigureName.ofPath(row.getString("figure"))
        .map(figure -> new ServiceLimit(setting, figure, bound, origin));
  }

  private static Figure figure(ResultSet row) throws SQLException {
    double value = row.getDouble("amount");
    double uncertainty = row.getDouble("expanded_uncertainty");
    return row.wasNull()
        ? Figure.withoutUncertainty(value, "the reading says why")
        : Figure.of(value, uncertainty);
  }

  private static CaptureResult result(ResultSet row, int number) throws SQLException {
    UUID reading = row.getObject("reading_id", UUID.class);
    OffsetDateTime measured = row.getObject("measured_at", OffsetDateTime.class);
    return new CaptureResult(
        new CaptureId(row.getObject("id", UUID.class)),
        new VisitId(row.getObject("visit_id", UUID.class)),
        new SpeedSettingId(row.getObject("speed_setting_id", UUID.class)),
        row.getString("setting_label"),
        row.getString("bench_condition"),
        row.getString("file_name"),
        row.getObject("received_at", OffsetDateTime.class).toInstant(),
        CaptureState.valueOf(row.getString("state").toUpperCase(Locale.ROOT)),
        fit(row),
        CapturePlaces.method(row),
        text(row, "refusal_message"),
        row.getDouble("progress"),
        reading == null ? null : new ReadingId(reading),
        measured == null ? null : measured.toInstant(),
        Map.of());
  }

  private static @Nullable SettingFit fit(ResultSet row) throws SQLException {
    String word = row.getString("setting_proposal");
    return word == null ? null : SettingFit.valueOf(word.toUpperCase(Locale.ROOT));
  }

  private static @Nullable String text(ResultSet row, String column) throws SQLException {
    return row.getString(column);
  }
}
