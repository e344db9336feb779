package turnsheet.exchange;

import java.util.ArrayList;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;

/** Asks whether the place of a new entry is free: what only one of a kind may have or be. */
@Component
final class Places {

  private final JdbcClient jdbc;

  Places(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** Members whose values another entry has; none where the place is free. */
  List<String> taken(Entry entry) {
    List<String> taken = new ArrayList<>();
    switch (entry.kind().name()) {
      case "instruments", "media", "models" -> {
        if (any("select 1 from " + entry.kind().table() + " where name = ?", entry.value("name"))) {
          taken.add("name");
        }
        for (UUID setting : entry.settings()) {
          if (any("select 1 from speed_setting where id = ?", setting)) {
            taken.add(Kinds.SETTINGS);
          }
        }
      }
      case "units" -> {
        if (any("select 1 from unit where code = ?", entry.value("code"))) {
          taken.add("code");
        }
        if (any(
            "select 1 from unit where model_id = ? and lower(serial_number) = lower(?)",
            entry.value("modelId"),
            entry.value("serialNumber"))) {
          taken.add("serialNumber");
        }
      }
      case "reports" -> {
        if (any("select 1 from report where check_code = ?", entry.value("checkCode"))) {
          taken.add("checkCode");
        }
      }
      default -> {
        // nothing but its key
      }
    }
    return taken;
  }

  /** Whether a visit is open and its unit has an open one. */
  boolean secondOpenVisit(Entry entry) {
    return entry.is(Kinds.VISITS)
        && entry.value("closedAt") == null
        && any(
            "select 1 from visit where unit_id = ? and closed_at is null", entry.value("unitId"));
  }

  boolean reportRevised(long number) {
    return any("select 1 from report where revises = ?", number);
  }

  boolean hasReport(long number) {
    return any("select 1 from report where number = ?", number);
  }

  /** Numbers are given one after the other; whoever issues a report waits for the import. */
  void lockReportNumbers() {
    jdbc.sql("select id from shop_rules where id = 1 for update").query().listOfRows();
  }

  private boolean any(String sql, @Nullable Object... params) {
    return !jdbc.sql(sql).params(params).query((row, n) -> true).list().isEmpty();
  }
}
