package turnsheet.core.diagnose.wheel;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * Gaps that come once every turn: a reference mark made of missing teeth, such as 60 places with 2
 * left out, tells where a turn begins.
 */
final class Marks {

  private static final int FEWEST = 4;

  /** Marks a turn at most that are looked for: one made on purpose, and lost teeth. */
  private static final int MOST_A_TURN = 4;

  /** A repetition is one where this share of the distances agrees; the rest are lost edges. */
  private static final double AGREED = 0.8;

  private Marks() {}

  /**
   * The mark.
   *
   * @param places of a turn, those without a tooth counted
   * @param missing teeth that it lacks
   * @param first number of the place, within the train, where the first full turn begins: the tooth
   *     after the mark
   */
  record Mark(int places, int missing, int first) {}

  /** The largest gap that repeats; empty where none does. */
  static Optional<Mark> find(EdgeTrain train) {
    Map<Integer, List<EdgeTrain.Gap>> bySize = new HashMap<>();
    for (EdgeTrain.Gap gap : train.gaps()) {
      bySize.computeIfAbsent(gap.count(), size -> new ArrayList<>()).add(gap);
    }
    return bySize.keySet().stream()
        .sorted((a, b) -> b - a)
        .map(size -> repeated(bySize.getOrDefault(size, List.of()), train.size()))
        .filter(mark -> mark != null)
        .findFirst();
  }

  private static @Nullable Mark repeated(List<EdgeTrain.Gap> gaps, int trainSize) {
    for (int lag = 1; lag <= MOST_A_TURN && gaps.size() >= FEWEST * lag; lag++) {
      Map<Integer, Integer> distances = new HashMap<>();
      for (int i = lag; i < gaps.size(); i++) {
        distances.merge(gaps.get(i).from() - gaps.get(i - lag).from(), 1, Integer::sum);
      }
      int places = 0;
      int most = 0;
      for (Map.Entry<Integer, Integer> entry : distances.entrySet()) {
        if (entry.getValue() > most) {
          most = entry.getValue();
          places = entry.getKey();
        }
      }
      boolean often = most >= AGREED * (gaps.size() - lag);
      // lost edges that happen to lie evenly must not pass: a mark is there in most turns
      boolean throughout = gaps.size() >= AGREED * lag * (trainSize / (double) places - 1);
      if (often && throughout && places > gaps.get(0).count() + 1) {
        return new Mark(places, gaps.get(0).count(), first(gaps, lag));
      }
    }
    return null;
  }

  /** Of several gaps of one size in a turn, the one that the longest row of teeth follows. */
  private static int first(List<EdgeTrain.Gap> gaps, int lag) {
    EdgeTrain.Gap best = gaps.get(0);
    int longest = -1;
    for (int i = 0; i < lag; i++) {
      int row = gaps.get(i + 1).from() - gaps.get(i).from();
      if (row > longest) {
        longest = row;
        best = gaps.get(i);
      }
    }
    return best.from() + best.count();
  }
}
