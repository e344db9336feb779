package turnsheet.exchange;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.Clock;
import javax.sql.DataSource;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.jdbc.datasource.DataSourceTransactionManager;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.IncomingFolder;
import turnsheet.testing.TemporaryData;

/** Exports for tests elsewhere. */
public final class ExportOn {

  private ExportOn() {}

  public static Export database(DataSource database) {
    JdbcClient jdbc = JdbcClient.create(database);
    return new Export(
        new Books(jdbc),
        new FigureRows(jdbc),
        new Pictures(store()),
        new DataSourceTransactionManager(database));
  }

  /** An empty store. */
  static CaptureStore store() {
    try {
      var folder = TemporaryData.newFolder();
      return new CaptureStore(folder, new IncomingFolder(folder, Clock.systemUTC()));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** A spool that finds less room than it has to leave. */
  public static Spool fullDisk(IncomingFolder folder) {
    return new Spool(folder, Long.MAX_VALUE);
  }
}
