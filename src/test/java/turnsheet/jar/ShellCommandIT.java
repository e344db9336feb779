package turnsheet.jar;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

class ShellCommandIT {

  /** The truth stands in sample-uploads/README.md, computed there from the speed function. */
  @Test
  void theSampleToneMeasuresAsDocumented() throws Exception {
    String file = "sample-uploads/reel-19-tone-as-received.wav";
    double[] truth = truthOf("reel-19-tone-as-received.wav");

    BuiltJar.Ended ended =
        BuiltJar.run(60, List.of(), "measure", file, "--tone-hz", "3150", "--json");

    assertThat(ended.err()).isEmpty();
    assertThat(ended.status()).isZero();
    JsonNode reading = JsonMapper.shared().readTree(ended.out());
    // closed-form bar for a clean capture: 0.001 percentage points
    assertThat(reading.at("/speed/deviationPercent/value").asDouble())
        .isCloseTo(truth[0], within(0.001));
    // closed-form bar for weighted figures: 2 %
    assertThat(reading.at("/flutter/weightedTwoSigmaPercent/value").asDouble())
        .isCloseTo(truth[1], within(0.02 * truth[1]));
  }

  @Test
  void aRefusedFileEndsWithThreeAndItsSentence() throws Exception {
    BuiltJar.Ended ended =
        BuiltJar.run(
            60, List.of(), "measure", "sample-uploads/renamed-zip.wav", "--tone-hz", "3150");
    assertThat(ended.status()).isEqualTo(3);
    assertThat(ended.out()).isEmpty();
    assertThat(ended.err()).contains("zip");
  }

  @Test
  void wrongUsageEndsWithTwo() throws Exception {
    assertThat(BuiltJar.run(60, List.of(), "measure").status()).isEqualTo(2);
  }

  private static double[] truthOf(String name) throws Exception {
    String row =
        Files.readAllLines(Path.of("sample-uploads/README.md")).stream()
            .filter(line -> line.startsWith("| " + name + " |"))
            .findFirst()
            .orElseThrow();
    var cells = Pattern.compile("([-+]?\\d+\\.\\d{4}) \\|").matcher(row);
    double[] truth = new double[2];
    for (int i = 0; i < 2; i++) {
      assertThat(cells.find()).isTrue();
      truth[i] = Double.parseDouble(cells.group(1));
    }
    return truth;
  }
}
