package turnsheet.core.diagnose.filter;

import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.stream.IntStream;
import org.jspecify.annotations.Nullable;

/**
 * Picks the sensible one of tried candidates: of those that keep every edge at all speeds and at
 * least half the signal, and whose edges move no more than a quarter above the least found or than
 * is good enough, the one with the fewest poles; among equals the quietest. Half the signal and a
 * quarter are common practice, no source.
 */
final class Chooser {

  private static final double NEARLY = 1.25;
  private static final double HALF_DB = -6.02;

  private Chooser() {}

  static TrialResult.@Nullable Choice choose(
      List<TrialResult.Row> rows, double goodEnoughMicroseconds) {
    List<Integer> kept =
        IntStream.range(0, rows.size())
            .filter(i -> rows.get(i).compared().allKept() && error(rows, i) != null)
            .boxed()
            .toList();
    if (kept.isEmpty()) {
      return null;
    }
    List<Integer> loud = kept.stream().filter(i -> isLoud(rows.get(i))).toList();
    List<Integer> asked = loud.isEmpty() ? kept : loud;
    double least = asked.stream().mapToDouble(i -> known(rows, i)).min().orElseThrow();
    double limit = Math.max(NEARLY * least, goodEnoughMicroseconds);
    int best =
        asked.stream()
            .filter(i -> known(rows, i) <= limit)
            .min(
                Comparator.comparingInt((Integer i) -> poles(rows.get(i).design()))
                    .thenComparingDouble(i -> known(rows, i)))
            .orElseThrow();
    TrialResult.Reason reason =
        rows.get(best).design() == null
            ? TrialResult.Reason.NO_FILTER
            : loud.isEmpty() ? TrialResult.Reason.SIGNAL_LOST : TrialResult.Reason.FEWEST_POLES;
    return new TrialResult.Choice(best, reason, known(rows, best), least, limit, kept.size());
  }

  private static boolean isLoud(TrialResult.Row row) {
    return row.compared().lowest().responseDb() >= HALF_DB
        && row.compared().highest().responseDb() >= HALF_DB;
  }

  private static @Nullable Double error(List<TrialResult.Row> rows, int i) {
    return rows.get(i).compared().errorMicroseconds();
  }

  private static double known(List<TrialResult.Row> rows, int i) {
    return Objects.requireNonNull(error(rows, i));
  }

  private static int poles(@Nullable FilterDesign design) {
    if (design == null) {
      return 0;
    }
    return design.kind() == FilterKind.BAND_PASS ? 2 * design.poles() : design.poles();
  }
}
