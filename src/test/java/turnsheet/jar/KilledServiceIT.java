package turnsheet.jar;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.net.http.HttpRequest.BodyPublishers;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Map;
import java.util.regex.Pattern;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import tools.jackson.databind.JsonNode;
import turnsheet.testing.Database;

class KilledServiceIT {

  private static final Duration START = Duration.ofSeconds(90);
  private static final Pattern OWNER = Pattern.compile("Set up the owner's account: (http\\S+)");
  private static final Pattern READY = Pattern.compile("Started Turnsheet");

  /** Long enough that its measurement is under way when the first look at its job comes back. */
  private static final long SAMPLES = 60L * 60 * 48_000;

  @ParameterizedTest
  @EnumSource
  void aCaptureThatWasBeingMeasuredWhenTheServiceWasKilledEndsMeasured(
      Database database, @TempDir Path folder) throws Exception {
    Map<String, String> settings = settings(database);
    Path data = folder.resolve("data");
    Path recording = folder.resolve("hour.wav");
    SteadyTone.write(recording, SAMPLES);

    RestVisitor visitor;
    String capture;
    try (RunningService first = RunningService.start("serve", data, settings)) {
      visitor = RestVisitor.firstRun(first.printed(OWNER, START));
      capture = uploaded(visitor, recording);
      visitor.post("/api/v1/captures/" + capture + "/measure", "{}", 202);
      JsonNode job = job(visitor, capture, "running");
      assertThat(job.at("/over").asBoolean()).as("killed while it measures").isFalse();
      first.kill();
    }

    try (RunningService second = RunningService.start("serve", data, settings)) {
      second.printed(READY, START);
      visitor = visitor.at(second.address(""));
      JsonNode job = job(visitor, capture, "done");
      assertThat(job.at("/state").asString()).isEqualTo("measured");
      assertThat(job.at("/attempts").asInt()).as("begun again from the start").isEqualTo(2);
      JsonNode readings = visitor.get("/api/v1/captures/" + capture + "/readings");
      assertThat(readings.size()).as("one reading, not two").isEqualTo(1);
      // the tone is exact; what is left is the rounding of single-precision traces
      JsonNode reading = visitor.get("/api/v1/readings/" + readings.at("/0/readingId").asString());
      assertThat(reading.at("/speed/deviationPercent/value").asDouble()).isCloseTo(0, within(1e-5));
    }
  }

  /** None for the built-in database; for the server what README.md says. */
  private static Map<String, String> settings(Database database) {
    return switch (database) {
      case H2 -> Map.of();
      case POSTGRESQL ->
          Map.of(
              "SPRING_PROFILES_ACTIVE", "postgresql",
              "TURNSHEET_DATABASE_URL", database.newUrl(),
              "TURNSHEET_DATABASE_USER", database.user());
    };
  }

  private static String uploaded(RestVisitor visitor, Path recording) throws Exception {
    String customer = id(visitor.post("/api/v1/customers", "{\"name\":\"Somebody\"}", 201));
    JsonNode model =
        visitor.post(
            "/api/v1/models",
            """
            {"name": "Reel transport", "speedSettings": [
              {"label": "19 cm/s", "speedCmPerS": 19.05, "toneHz": 3150}]}
            """,
            201);
    String unit =
        id(
            visitor.post(
                "/api/v1/units",
                "{\"modelId\":\"%s\",\"customerId\":\"%s\",\"serialNumber\":\"1\"}"
                    .formatted(id(model), customer),
                201));
    String visit = id(visitor.post("/api/v1/visits", "{\"unitId\":\"" + unit + "\"}", 201));
    JsonNode received =
        visitor.upload(
            "/api/v1/visits/%s/captures?speedSettingId=%s&condition=as%%20received&fileName=hour.wav"
                .formatted(visit, model.at("/speedSettings/0/id").asString()),
            BodyPublishers.ofFile(recording));
    assertThat(received.at("/state").asString()).isEqualTo("recognised");
    return id(received);
  }

  /** Waits until the job is at least as far as asked for. */
  private static JsonNode job(RestVisitor visitor, String capture, String state) throws Exception {
    long deadline = System.nanoTime() + START.toNanos();
    while (System.nanoTime() < deadline) {
      JsonNode job = visitor.get("/api/v1/captures/" + capture + "/job");
      if (job.at("/jobState").asString().equals(state) || job.at("/over").asBoolean()) {
        return job;
      }
      Thread.sleep(20);
    }
    throw new AssertionError("the job never was " + state);
  }

  private static String id(JsonNode document) {
    return document.at("/id").asString();
  }
}
