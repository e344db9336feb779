package turnsheet.core.stats;

import java.util.Random;
import java.util.function.ToDoubleFunction;

/**
 * How much a figure would scatter between recordings of the same machine, by drawing blocks of one
 * recording with replacement.
 *
 * <p>Source: block bootstrap after H. R. Künsch, Annals of Statistics 17 (1989), 1217-1241, with
 * blocks that do not overlap; of n blocks n - 1 are drawn, which makes the variance of a mean
 * unbiased (J. N. K. Rao and C. F. J. Wu, Journal of the American Statistical Association 83
 * (1988), 231-241). Both from memory. The draws are the same each time.
 */
public final class BlockResampling {

  /** Fewer blocks tell no scatter. */
  public static final int FEWEST_BLOCKS = 6;

  // the standard error itself is then known to 4 % beside what the blocks leave open
  private static final int DRAWS = 300;
  private static final long SEED = 20261201;

  private BlockResampling() {}

  /**
   * Standard error of a figure as a share of its value.
   *
   * @param blocks at least {@link #FEWEST_BLOCKS}
   * @param figure worked out from how often each block was drawn, not negative
   * @return 0 where the figure is 0 in every draw
   */
  public static double relativeStandardError(int blocks, ToDoubleFunction<int[]> figure) {
    if (blocks < FEWEST_BLOCKS) {
      throw new IllegalArgumentException(blocks + " blocks");
    }
    Random random = new Random(SEED);
    Moments drawn = new Moments();
    for (int draw = 0; draw < DRAWS; draw++) {
      int[] times = new int[blocks];
      for (int i = 0; i < blocks - 1; i++) {
        times[random.nextInt(blocks)]++;
      }
      drawn.add(figure.applyAsDouble(times));
    }
    return drawn.mean() > 0 ? drawn.sampleStdDev() / drawn.mean() : 0;
  }
}
