package turnsheet.shop;

import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;

/** The parts fitted on visits. */
final class FittedParts {

  private final JdbcClient jdbc;

  FittedParts(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** The parts of each of these visits that has any, in one statement. */
  Map<VisitId, List<FittedPart>> of(Collection<Visit> visits) {
    if (visits.isEmpty()) {
      return Map.of();
    }
    record Fitted(VisitId visit, FittedPart part) {}
    return jdbc
        .sql(
            """
            select visit_id, name, quantity from fitted_part where visit_id in (:visits)
            order by visit_id, position
            """)
        .param("visits", visits.stream().map(v -> v.id().value()).toList())
        .query(
            (row, n) ->
                new Fitted(
                    new VisitId(Columns.uuid(row, "visit_id")),
                    new FittedPart(row.getString("name"), Columns.intOrNull(row, "quantity"))))
        .list()
        .stream()
        .collect(
            Collectors.groupingBy(
                Fitted::visit, Collectors.mapping(Fitted::part, Collectors.toList())));
  }

  void put(VisitId visit, List<FittedPart> parts) {
    remove(visit);
    for (int i = 0; i < parts.size(); i++) {
      @Nullable Integer quantity = parts.get(i).quantity();
      jdbc.sql("insert into fitted_part (visit_id, position, name, quantity) values (?, ?, ?, ?)")
          .param(1, visit.value())
          .param(2, i)
          .param(3, parts.get(i).name())
          .param(4, quantity, java.sql.Types.INTEGER)
          .update();
    }
  }

  void remove(VisitId visit) {
    jdbc.sql("delete from fitted_part where visit_id = ?").param(visit.value()).update();
  }
}
