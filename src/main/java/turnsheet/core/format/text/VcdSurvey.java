package turnsheet.core.format.text;

import java.io.IOException;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * How often each signal changes in the first {@link #SURVEY_BYTES} of the changes.
 *
 * @param edges edges per signal, in the order of the definitions
 * @param wholeFile whether that was everything
 */
record VcdSurvey(List<Integer> edges, boolean wholeFile, List<Warning> warnings) {

  static final long SURVEY_BYTES = 4L << 20;

  static VcdSurvey of(List<VcdDefinitions.Signal> signals, VcdChanges changes)
      throws IOException, RejectedException {
    Map<String, Integer> indexOfCode = new HashMap<>();
    for (int i = 0; i < signals.size(); i++) {
      indexOfCode.put(signals.get(i).code(), i);
    }
    Integer[] edges = new Integer[signals.size()];
    int[] levels = new int[signals.size()];
    Arrays.fill(edges, 0);
    Arrays.fill(levels, VcdChanges.UNKNOWN);
    changes.stopAfter(SURVEY_BYTES);
    while (changes.next()) {
      Integer index = indexOfCode.get(changes.code());
      if (index != null) {
        if (levels[index] + changes.level() == 1) {
          edges[index]++;
        }
        levels[index] = changes.level();
      }
    }
    return new VcdSurvey(List.of(edges), !changes.stopped(), changes.warnings());
  }

  /** Index of the signal with the most edges, the first of equals. */
  int busiest() {
    int best = 0;
    for (int i = 1; i < edges.size(); i++) {
      if (edges.get(i) > edges.get(best)) {
        best = i;
      }
    }
    return best;
  }

  long changing() {
    return edges.stream().filter(e -> e > 0).count();
  }
}
