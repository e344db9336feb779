package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.signal.Warning;

/**
 * Finds the start and the stop of the unit at the ends of a recording: a beginning or an end that
 * lies more than {@value #FAR_PERCENT} percentage points off the median speed, up to where the
 * speed keeps within {@value #NEAR_PERCENT} of it. Slow drift and wow stay below that and are
 * measured.
 */
final class RunUp {

  private static final double BLOCK_SECONDS = 0.1;
  private static final double FAR_PERCENT = 2;
  private static final double NEAR_PERCENT = 1;
  private static final int CALM_BLOCKS = 5;

  private RunUp() {}

  /**
   * The stretches at the ends to be left out: none, one or two, each with a quarter at most.
   *
   * @param lost stretches without signal, as before the tone came into its band
   */
  static List<Stretch> of(SpeedTrace trace, List<Stretch> lost) {
    int length = Math.max(1, (int) (BLOCK_SECONDS * trace.rateHertz()));
    double[] blocks = new double[trace.length() / length];
    if (blocks.length < 4 * CALM_BLOCKS) {
      return List.of();
    }
    for (int b = 0; b < blocks.length; b++) {
      for (int i = 0; i < length; i++) {
        blocks[b] += trace.percent(b * length + i) / length;
      }
    }
    double seconds = length / trace.rateHertz();
    double start = trace.startSeconds();
    for (Stretch s : lost) {
      int from = (int) Math.max(0, Math.floor((s.startSeconds() - start) / seconds));
      int to = (int) Math.min(blocks.length - 1, Math.floor((s.endSeconds() - start) / seconds));
      for (int b = from; b <= to; b++) {
        blocks[b] = Double.NaN;
      }
    }
    double[] known = Arrays.stream(blocks).filter(b -> !Double.isNaN(b)).sorted().toArray();
    if (known.length == 0) {
      return List.of();
    }
    double median = known[known.length / 2];
    List<Stretch> found = new ArrayList<>();
    int first = unsettled(blocks, median, 0, 1);
    if (first > 0) {
      found.add(new Stretch(start, start + first * seconds));
    }
    int last = unsettled(blocks, median, blocks.length - 1, -1);
    if (last > 0) {
      double end = start + trace.durationSeconds();
      found.add(new Stretch(start + (blocks.length - last) * seconds, end));
    }
    return found;
  }

  private static int unsettled(double[] blocks, double median, int from, int step) {
    int lost = 0;
    while (Double.isNaN(blocks[from + lost * step])) {
      lost++;
    }
    if (Math.abs(blocks[from + lost * step] - median) <= FAR_PERCENT) {
      return 0;
    }
    int calm = 0;
    for (int n = lost; n < Math.min(blocks.length, lost + blocks.length / 4); n++) {
      calm = Math.abs(blocks[from + n * step] - median) <= NEAR_PERCENT ? calm + 1 : 0;
      if (calm == CALM_BLOCKS) {
        return n + 1;
      }
    }
    return 0;
  }

  /** What to say about them. */
  static List<Warning> warnings(List<Stretch> found, double startSeconds) {
    List<Warning> warnings = new ArrayList<>();
    for (Stretch s : found) {
      boolean start = s.startSeconds() <= startSeconds;
      warnings.add(
          new Warning(
              start ? "runUp" : "runDown",
              String.format(
                  Locale.ROOT,
                  start
                      ? "The first %.1f s, in which the unit came up to speed, are left out."
                      : "The last %.1f s, in which the unit left its speed, are left out.",
                  s.durationSeconds())));
    }
    return List.copyOf(warnings);
  }
}
