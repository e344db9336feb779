package turnsheet.demo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import turnsheet.core.synth.SpeedFunction;

class SampleUploadsTest {

  private static final Path FOLDER = Path.of("sample-uploads");

  @Test
  void theFolderHoldsWhatTheGeneratorMakes() throws IOException {
    for (SampleUpload sample : SampleUploads.all()) {
      assertThat(
              Arrays.equals(Files.readAllBytes(FOLDER.resolve(sample.fileName())), sample.bytes()))
          .as(sample.fileName())
          .isTrue();
    }
    for (String name : RefusedUploads.ALL) {
      assertThat(Files.readAllBytes(FOLDER.resolve(name))).isEqualTo(RefusedUploads.bytes(name));
    }
    assertThat(Files.readString(FOLDER.resolve("README.md"))).isEqualTo(SampleFolder.readme());
  }

  @Test
  void theFolderStaysBelowTwentyMegabytes() throws IOException {
    try (var files = Files.list(FOLDER)) {
      assertThat(files.mapToLong(f -> f.toFile().length()).sum()).isLessThan(20_000_000);
    }
  }

  /**
   * AES6-2008 table 1: 0 dB at 4 Hz; a sine's two-sigma value is sin(0.95 pi/2) = 0.996917 of its
   * peak.
   */
  @Test
  void theTruthOfOneLineAtFourHertzIsItsTwoSigmaValue() {
    SpeedTruth truth = SpeedTruth.of(SpeedFunction.constant(0).plusLine(4, 0.1, 0), 100);
    // 1.5 million phases, evenly spread, place the quantile to a few parts in a million
    assertThat(truth.weightedTwoSigmaPercent()).isCloseTo(0.0996917, within(2e-6));
    assertThat(truth.unweightedRmsPercent()).isCloseTo(0.1 / Math.sqrt(2), within(1e-12));
    assertThat(truth.deviationPercent()).isCloseTo(0, within(1e-10));
  }
}
