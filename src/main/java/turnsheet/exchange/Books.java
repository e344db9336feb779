package turnsheet.exchange;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.UUID;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;

/** Entries in and out of the tables, the same way for every kind. */
@Component
final class Books {

  private final JdbcClient jdbc;

  Books(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** A value for a column that no member stands for. */
  record Extra(String column, @Nullable Object value, int sqlType) {}

  /** Keys of the entries in the order in which they are exported. */
  List<?> keys(Kind kind, Scope scope) {
    String key = kind.key().column();
    String sql =
        "select "
            + key
            + " from "
            + kind.table()
            + where(kind, scope)
            + " order by "
            + kind.order()
            + " cast("
            + key
            + " as varchar(36))";
    JdbcClient.StatementSpec statement = jdbc.sql(sql);
    if (scope.id() != null) {
      statement = statement.param("id", scope.id());
    }
    return kind.key().type() == MemberType.ID
        ? statement.query(UUID.class).list()
        : statement.query(Long.class).list();
  }

  /** Entries in the order of their keys, those that are not there left out. */
  List<Entry> read(Kind kind, List<?> keys) {
    String key = kind.key().column();
    Map<Object, Entry> found = new HashMap<>();
    jdbc.sql(
            select(kind.members(), key) + " from " + kind.table() + " where " + key + " in (:keys)")
        .param("keys", keys)
        .query(
            row -> {
              Entry entry = new Entry(kind, values(kind.members(), row), new LinkedHashMap<>());
              kind.parts().forEach(part -> entry.parts().put(part.name(), new ArrayList<>()));
              found.put(entry.key(), entry);
            });
    for (Part part : kind.parts()) {
      jdbc.sql(
              select(part.members(), part.owner())
                  + (" from " + part.table() + " where " + part.owner() + " in (:keys)")
                  + (" order by " + part.order()))
          .param("keys", keys)
          .query(
              row -> {
                Entry owner = found.get(row.getObject(part.owner(), UUID.class));
                if (owner != null) {
                  owner.part(part.name()).add(values(part.members(), row));
                }
              });
    }
    return keys.stream().map(found::get).filter(Objects::nonNull).toList();
  }

  void insert(Entry entry, List<Extra> extras) {
    Kind kind = entry.kind();
    insert(kind.table(), columns(kind.members(), entry.values()), extras);
    for (Part part : kind.parts()) {
      int position = 0;
      for (Map<String, @Nullable Object> row : entry.part(part.name())) {
        List<Extra> around = new ArrayList<>();
        around.add(new Extra(part.owner(), entry.key(), MemberType.ID.sqlType()));
        if (part.position() != null) {
          around.add(new Extra(part.position(), position++, java.sql.Types.INTEGER));
        }
        insert(part.table(), columns(part.members(), row), around);
      }
    }
  }

  /** Writes an entry over the one of its key; for kinds without parts. */
  void update(Entry entry) {
    Member key = entry.kind().key();
    List<Extra> all = columns(entry.kind().members(), entry.values());
    String set =
        all.stream().skip(1).map(e -> e.column() + " = ?").collect(Collectors.joining(", "));
    JdbcClient.StatementSpec statement =
        jdbc.sql(
            "update " + entry.kind().table() + " set " + set + " where " + key.column() + " = ?");
    for (int i = 1; i < all.size(); i++) {
      statement = statement.param(i, all.get(i).value(), all.get(i).sqlType());
    }
    statement.param(all.size(), entry.key()).update();
  }

  boolean has(String table, UUID id) {
    return !jdbc.sql("select 1 from " + table + " where id = ?")
        .param(id)
        .query((row, n) -> true)
        .list()
        .isEmpty();
  }

  private void insert(String table, List<Extra> members, List<Extra> extras) {
    List<Extra> all = Stream.concat(members.stream(), extras.stream()).toList();
    String columns = all.stream().map(Extra::column).collect(Collectors.joining(", "));
    String places = all.stream().map(e -> "?").collect(Collectors.joining(", "));
    JdbcClient.StatementSpec statement =
        jdbc.sql("insert into " + table + " (" + columns + ") values (" + places + ")");
    for (int i = 0; i < all.size(); i++) {
      statement = statement.param(i + 1, all.get(i).value(), all.get(i).sqlType());
    }
    statement.update();
  }

  private static List<Extra> columns(List<Member> members, Map<String, @Nullable Object> values) {
    List<Extra> columns = new ArrayList<>();
    for (Member member : inColumns(members)) {
      Object value = values.get(member.name());
      columns.add(
          new Extra(
              member.column(),
              value == null ? null : member.type().toColumn(value),
              member.type().sqlType()));
    }
    return columns;
  }

  private static List<Member> inColumns(List<Member> members) {
    return members.stream().filter(m -> m.type() != MemberType.STORED).toList();
  }

  private static String select(List<Member> members, String key) {
    return inColumns(members).stream()
        .filter(m -> !m.column().equals(key))
        .map(m -> m.source().equals(m.column()) ? m.column() : m.source() + " as " + m.column())
        .collect(Collectors.joining(", ", "select " + key + ", ", ""));
  }

  private static Map<String, @Nullable Object> values(List<Member> members, ResultSet row)
      throws SQLException {
    Map<String, @Nullable Object> values = new LinkedHashMap<>();
    for (Member member : inColumns(members)) {
      values.put(member.name(), member.type().fromRow(row, member.column()));
    }
    return values;
  }

  private static String where(Kind kind, Scope scope) {
    return switch (scope.extent()) {
      case EVERYTHING -> "";
      case UNIT -> " where " + within(kind, "id = :id", "select id from visit where unit_id = :id");
      case VISIT ->
          " where "
              + within(
                  kind,
                  "id = (select unit_id from visit where id = :id)",
                  "select id from visit where id = :id");
    };
  }

  private static String within(Kind kind, String unit, String visits) {
    return kind.within().replace("{unit}", unit).replace("{visits}", visits);
  }
}
