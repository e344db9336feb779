package turnsheet;

import java.io.IOException;
import java.io.InputStream;
import java.net.URI;
import org.springframework.context.ConfigurableApplicationContext;

/**
 * The whole start and the first page, once, for the archive of classes that is made when the
 * project is packaged: what is not used here is not in it.
 */
final class Rehearsal {

  private Rehearsal() {}

  /** Asks a started service for its first page and ends it. */
  static void run(ConfigurableApplicationContext service) throws IOException {
    try (service) {
      String port = service.getEnvironment().getRequiredProperty("local.server.port");
      try (InputStream page = URI.create("http://localhost:" + port + "/").toURL().openStream()) {
        page.readAllBytes();
      }
    }
  }
}
