package turnsheet.exchange;

import javax.sql.DataSource;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.jdbc.datasource.DataSourceTransactionManager;
import turnsheet.capture.IncomingFolder;

/** Exports for tests elsewhere. */
public final class ExportOn {

  private ExportOn() {}

  public static Export database(DataSource database) {
    JdbcClient jdbc = JdbcClient.create(database);
    return new Export(
        new Books(jdbc), new FigureRows(jdbc), new DataSourceTransactionManager(database));
  }

  /** A spool that finds less room than it has to leave. */
  public static Spool fullDisk(IncomingFolder folder) {
    return new Spool(folder, Long.MAX_VALUE);
  }
}
