package turnsheet.core.stats;

import java.util.HashMap;
import java.util.Map;

/**
 * Gaps of a pulse train that come at one and the same distance: the reference mark of a wheel that
 * lacks teeth there, which is no loss. Memory does not grow with the train.
 */
public final class RegularGaps {

  private static final int FEWEST = 4;
  private static final int MOST_SIZES = 64;
  private static final int MOST_DISTANCES = 256;

  /** The rest may be lost edges. */
  private static final double AGREED = 0.8;

  private final Map<Long, Gaps> bySize = new HashMap<>();

  private static final class Gaps {
    private long last;
    private long count;
    private final Map<Long, Long> distances = new HashMap<>();
  }

  /**
   * The mark.
   *
   * @param every places from one to the next
   * @param missing teeth that it lacks
   * @param count how many were seen
   */
  public record Mark(long every, long missing, long count) {}

  /**
   * Takes the next gap.
   *
   * @param from number of its first place within the train
   * @param missing places without an edge
   */
  public void gap(long from, long missing) {
    Gaps gaps = bySize.get(missing);
    if (gaps == null) {
      if (bySize.size() == MOST_SIZES) {
        return;
      }
      gaps = new Gaps();
      bySize.put(missing, gaps);
    } else {
      long distance = from - gaps.last;
      if (gaps.distances.containsKey(distance) || gaps.distances.size() < MOST_DISTANCES) {
        gaps.distances.merge(distance, 1L, Long::sum);
      }
    }
    gaps.last = from;
    gaps.count++;
  }

  /**
   * The largest gaps that are regular from beginning to end.
   *
   * @param places of the whole train
   * @return a mark of no gaps where there are none
   */
  public Mark mark(long places) {
    Mark best = new Mark(0, 0, 0);
    for (Map.Entry<Long, Gaps> entry : bySize.entrySet()) {
      Gaps gaps = entry.getValue();
      long every = 0;
      long most = 0;
      for (Map.Entry<Long, Long> distance : gaps.distances.entrySet()) {
        if (distance.getValue() > most) {
          most = distance.getValue();
          every = distance.getKey();
        }
      }
      boolean regular =
          gaps.count >= FEWEST
              && most >= AGREED * (gaps.count - 1)
              && gaps.count >= AGREED * ((double) places / every - 1)
              && every > entry.getKey() + 1;
      if (regular && entry.getKey() > best.missing()) {
        best = new Mark(every, entry.getKey(), gaps.count);
      }
    }
    return best;
  }
}
