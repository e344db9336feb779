package turnsheet;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.springframework.boot.SpringApplication;
import org.springframework.mock.env.MockEnvironment;

class DataFolderTest {

  @Test
  void aBareNameMeansAFolderWhereTheServiceWasStarted() {
    MockEnvironment environment = new MockEnvironment().withProperty("turnsheet.data-dir", "data");
    new DataFolder().postProcessEnvironment(environment, new SpringApplication());
    assertThat(environment.getProperty("turnsheet.data-dir"))
        .isEqualTo(Path.of("data").toAbsolutePath().toString());
  }
}
