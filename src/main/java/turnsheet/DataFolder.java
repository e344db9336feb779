package turnsheet;

import java.nio.file.Path;
import java.util.Map;
import org.springframework.boot.EnvironmentPostProcessor;
import org.springframework.boot.SpringApplication;
import org.springframework.core.env.ConfigurableEnvironment;
import org.springframework.core.env.MapPropertySource;

/** Makes the name of the data folder absolute: the database refuses {@code data} for ./data. */
final class DataFolder implements EnvironmentPostProcessor {

  private static final String NAME = "turnsheet.data-dir";

  @Override
  public void postProcessEnvironment(
      ConfigurableEnvironment environment, SpringApplication application) {
    String named = environment.getProperty(NAME);
    if (named != null) {
      Map<String, Object> absolute = Map.of(NAME, Path.of(named).toAbsolutePath().toString());
      environment.getPropertySources().addFirst(new MapPropertySource("data folder", absolute));
    }
  }
}
