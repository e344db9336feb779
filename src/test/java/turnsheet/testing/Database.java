package turnsheet.testing;

import com.zaxxer.hikari.HikariDataSource;
import io.zonky.test.db.postgres.embedded.EmbeddedPostgres;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.List;
import java.util.UUID;
import javax.sql.DataSource;
import org.flywaydb.core.Flyway;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.jdbc.datasource.DataSourceTransactionManager;
import org.springframework.transaction.support.TransactionTemplate;

/**
 * The databases that the service runs on, with the schema that Flyway makes from the service's own
 * scripts. Each is started when it is first asked for, once in a JVM, and ends with the JVM: the
 * PostgreSQL server then stops and its files go.
 *
 * <p>One database serves all tests of the JVM in turn; {@link #empty()} clears it. See {@link
 * OnEachDatabase}.
 */
public enum Database {
  H2 {
    @Override
    public String newUrl() {
      return "jdbc:h2:mem:"
          + UUID.randomUUID()
          + ";DB_CLOSE_DELAY=-1;MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH";
    }

    @Override
    public String user() {
      return "sa";
    }

    @Override
    void truncate(List<String> tables) {
      jdbc().sql("set referential_integrity false").update();
      tables.forEach(table -> jdbc().sql("truncate table " + table + " restart identity").update());
      jdbc().sql("set referential_integrity true").update();
    }
  },

  POSTGRESQL {
    @Override
    public String newUrl() {
      String name = "t" + UUID.randomUUID().toString().replace("-", "");
      JdbcClient.create(Server.RUNNING.getPostgresDatabase())
          .sql("create database " + name)
          .update();
      return Server.RUNNING.getJdbcUrl(user(), name);
    }

    @Override
    public String user() {
      return "postgres";
    }

    @Override
    void truncate(List<String> tables) {
      jdbc().sql("truncate table " + String.join(", ", tables) + " restart identity").update();
    }
  };

  @SuppressWarnings("ImmutableEnumChecker") // opened once, when first asked for
  private @Nullable HikariDataSource opened;

  /** Address of another database without any table, for a test that starts the whole service. */
  public abstract String newUrl();

  /** Who signs in to the addresses; the password is empty. */
  public abstract String user();

  abstract void truncate(List<String> tables);

  public synchronized DataSource dataSource() {
    if (opened == null) {
      HikariDataSource pool = new HikariDataSource();
      pool.setJdbcUrl(newUrl());
      pool.setUsername(user());
      pool.setPassword("");
      pool.setMaximumPoolSize(6);
      pool.setMinimumIdle(0);
      Flyway.configure().dataSource(pool).load().migrate();
      opened = pool;
    }
    return opened;
  }

  public JdbcClient jdbc() {
    return JdbcClient.create(dataSource());
  }

  public TransactionTemplate transactions() {
    return new TransactionTemplate(new DataSourceTransactionManager(dataSource()));
  }

  /** Removes every row of every table, and starts the counters anew. */
  public void empty() {
    truncate(
        jdbc()
            .sql(
                """
                select table_name from information_schema.tables
                where table_schema = 'public' and table_name <> 'flyway_schema_history'
                  and table_type = 'BASE TABLE'
                """)
            .query(String.class)
            .list());
  }

  /** The one server of this JVM; the library stops it when the JVM ends. */
  private static final class Server {
    static final EmbeddedPostgres RUNNING = start();

    private static EmbeddedPostgres start() {
      try {
        return EmbeddedPostgres.builder()
            // nothing here need outlive a crash
            .setServerConfig("fsync", "off")
            .setServerConfig("synchronous_commit", "off")
            .setServerConfig("full_page_writes", "off")
            .start();
      } catch (IOException e) {
        throw new UncheckedIOException(e);
      }
    }
  }
}
