package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class LineFitTest {

  /** NIST StRD Norris, certified values in the file's header; ten significant digits. */
  @Test
  void givesTheCertifiedLine() {
    StrdSet set = StrdSet.resource("nist-norris.txt");
    LineFit fit = LineFit.of(set.column(0), set.column(1));
    assertThat(fit.points()).isEqualTo(36);
    close(fit.intercept(), set.certified("intercept"));
    close(fit.slope(), set.certified("slope"));
    close(fit.interceptStdError(), set.certified("interceptStdError"));
    close(fit.slopeStdError(), set.certified("slopeStdError"));
    close(fit.residualStdDev(), set.certified("residualStdDev"));
  }

  private static void close(double actual, double certified) {
    assertThat(actual).isCloseTo(certified, within(Math.abs(certified) * 1e-10));
  }
}
