package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.UUID;
import org.flywaydb.core.Flyway;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.springframework.dao.DataIntegrityViolationException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.jdbc.datasource.DriverManagerDataSource;
import turnsheet.testing.Database;

class UnitCodeMigrationTest {

  @ParameterizedTest
  @EnumSource
  void unitsFromBeforeGetACodeEachAndNoneIsWithoutOneAfterwards(Database database) {
    var source = new DriverManagerDataSource(database.newUrl(), database.user(), "");
    Flyway.configure().dataSource(source).target("5").load().migrate();
    JdbcClient jdbc = JdbcClient.create(source);
    UUID model = UUID.randomUUID();
    UUID customer = UUID.randomUUID();
    jdbc.sql("insert into machine_model (id, name, note) values (?, 'Old deck', '')")
        .param(model)
        .update();
    jdbc.sql(
            """
            insert into customer (id, name, contact, created_at)
            values (?, 'Someone', '', timestamp with time zone '2026-01-01 12:00:00Z')
            """)
        .param(customer)
        .update();
    for (int i = 0; i < 100; i++) {
      insert(jdbc, model, customer, "old " + i);
    }

    Flyway.configure().dataSource(source).load().migrate();

    List<String> codes = jdbc.sql("select code from unit").query(String.class).list();
    assertThat(codes).hasSize(100).doesNotHaveDuplicates();
    assertThat(codes).allSatisfy(UnitCode::new);
    org.assertj.core.api.Assertions.assertThatThrownBy(() -> insert(jdbc, model, customer, "new"))
        .isInstanceOf(DataIntegrityViolationException.class);
  }

  private static void insert(JdbcClient jdbc, UUID model, UUID customer, String serial) {
    jdbc.sql(
            """
            insert into unit (id, model_id, customer_id, serial_number, note, created_at)
            values (?, ?, ?, ?, '', timestamp with time zone '2026-01-01 12:00:00Z')
            """)
        .params(UUID.randomUUID(), model, customer, serial)
        .update();
  }
}
