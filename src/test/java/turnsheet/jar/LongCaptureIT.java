package turnsheet.jar;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.List;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class LongCaptureIT {

  /** Two gibibytes less a page: six hours and twelve minutes. */
  private static final long SAMPLES = (1L << 30) - 2048;

  @Test
  void twoGibibytesAreMeasuredInAQuarterOfAGibibyteOfHeap(@TempDir Path folder) throws Exception {
    Path file = folder.resolve("six-hours.wav");
    SteadyTone.write(file, SAMPLES);

    BuiltJar.Ended ended =
        BuiltJar.run(
            200, List.of("-Xmx256m"), "measure", file.toString(), "--tone-hz", "3150", "--json");

    assertThat(ended.err()).isEmpty();
    assertThat(ended.status()).isZero();
    var deviation =
        Pattern.compile("\"deviationPercent\"\\s*:\\s*\\{\\s*\"value\"\\s*:\\s*([-0-9.eE]+)")
            .matcher(ended.out());
    assertThat(deviation.find()).isTrue();
    // the tone is exact; what is left is the rounding of single-precision traces
    assertThat(Double.parseDouble(deviation.group(1))).isCloseTo(0, within(1e-5));
  }
}
