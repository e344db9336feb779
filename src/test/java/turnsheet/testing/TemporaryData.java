package turnsheet.testing;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.UUID;
import org.springframework.context.ApplicationContextInitializer;
import org.springframework.context.ConfigurableApplicationContext;
import org.springframework.core.env.MapPropertySource;
import org.springframework.util.FileSystemUtils;

/** A database in memory and a data folder of its own for each started service. */
public final class TemporaryData
    implements ApplicationContextInitializer<ConfigurableApplicationContext> {

  @Override
  public void initialize(ConfigurableApplicationContext context) {
    Path folder = newFolder();
    String database =
        "jdbc:h2:mem:"
            + UUID.randomUUID()
            + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH"
            + ";DB_CLOSE_DELAY=-1";
    context
        .getEnvironment()
        .getPropertySources()
        .addFirst(
            new MapPropertySource(
                "temporary data",
                Map.of(
                    "turnsheet.data-dir", folder.toString(), "spring.datasource.url", database)));
  }

  /** A folder that goes away with the process. */
  public static Path newFolder() {
    try {
      Path folder = Files.createTempDirectory("turnsheet-test");
      Runtime.getRuntime().addShutdownHook(new Thread(() -> delete(folder)));
      return folder;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static void delete(Path folder) {
    try {
      FileSystemUtils.deleteRecursively(folder);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
