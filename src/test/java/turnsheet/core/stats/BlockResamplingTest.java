package turnsheet.core.stats;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class BlockResamplingTest {

  private static int[] once(int blocks) {
    int[] times = new int[blocks];
    Arrays.fill(times, 1);
    return times;
  }

  private static MagnitudeBlocks gaussian(int blocks, int each, long seed) {
    Random random = new Random(seed);
    MagnitudeBlocks.Collector collector = new MagnitudeBlocks.Collector(each);
    for (int i = 0; i < blocks * each + each / 2; i++) {
      collector.add(random.nextGaussian());
    }
    return collector.blocks();
  }

  /** 1.959964 and 1 for a Gaussian; four standard errors of 100 000 draws (0.0067, 0.0022). */
  @Test
  void blocksTogetherReadLikeTheWholeStream() {
    MagnitudeBlocks blocks = gaussian(20, 5000, 1);
    assertThat(blocks.size()).isEqualTo(20);
    assertThat(blocks.quantile(0.95, once(20))).isCloseTo(1.959964, within(0.027));
    assertThat(blocks.rms(once(20))).isCloseTo(1, within(0.009));
  }

  @Test
  void aBlockDrawnTwiceCountsTwice() {
    MagnitudeBlocks.Collector collector = new MagnitudeBlocks.Collector(2);
    for (double x : new double[] {3, -3, 4, 4}) {
      collector.add(x);
    }
    MagnitudeBlocks blocks = collector.blocks();
    assertThat(blocks.rms(new int[] {2, 1})).isCloseTo(Math.sqrt(34 / 3.0), within(1e-12));
    assertThat(blocks.rms(new int[] {0, 3})).isEqualTo(4);
    // class width a sixteenth of a power of two
    assertThat(blocks.quantile(0.5, new int[] {2, 1})).isCloseTo(3, within(0.2));
    assertThat(blocks.quantile(0.95, new int[] {2, 1})).isCloseTo(4, within(0.25));
  }

  /**
   * Independent Gaussian values: the relative standard error of a root mean square of n values is 1
   * / sqrt(2 n). Mean over 40 streams; the error of one is known from 24 blocks to a seventh, so
   * the mean to 2.3 %, and four times that is allowed.
   */
  @Test
  void standardErrorOfAnRmsIsThatOfTheory() {
    double sum = 0;
    for (int seed = 0; seed < 40; seed++) {
      MagnitudeBlocks blocks = gaussian(24, 200, seed);
      sum += BlockResampling.relativeStandardError(24, blocks::rms) / 40;
    }
    double theory = 1 / Math.sqrt(2 * 24 * 200.0);
    assertThat(sum).isCloseTo(theory, within(0.093 * theory));
  }

  @Test
  void aSteadyFluctuationHasNone() {
    MagnitudeBlocks.Collector collector = new MagnitudeBlocks.Collector(100);
    for (int i = 0; i < 1000; i++) {
      collector.add(Math.sin(2 * Math.PI * i / 50));
    }
    MagnitudeBlocks blocks = collector.blocks();
    assertThat(BlockResampling.relativeStandardError(10, blocks::rms)).isLessThan(1e-9);
    assertThat(BlockResampling.relativeStandardError(10, d -> blocks.quantile(0.95, d)))
        .isLessThan(1e-9);
  }

  @Test
  void drawsAreTheSameEachTime() {
    MagnitudeBlocks blocks = gaussian(10, 50, 5);
    assertThat(BlockResampling.relativeStandardError(10, blocks::rms))
        .isEqualTo(BlockResampling.relativeStandardError(10, blocks::rms));
    assertThatThrownBy(() -> BlockResampling.relativeStandardError(5, blocks::rms))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
