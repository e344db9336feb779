package turnsheet.bench.web;

import java.time.YearMonth;
import java.util.List;
import java.util.TreeMap;
import java.util.stream.Collectors;
import turnsheet.core.stats.Quantiles;
import turnsheet.reading.Floors;
import turnsheet.web.Times;

/**
 * The floors of what was recorded with an instrument in one month.
 *
 * @param quantiles of them, in percent
 */
record FloorMonth(YearMonth month, int recordings, Quantiles quantiles) {

  /** With fewer recordings quartiles would be read off between two of them. */
  private static final int LEAST_FOR_QUARTILES = 4;

  /** The months that have any, in their order. */
  static List<FloorMonth> of(List<Floors.Floor> floors, Times times) {
    return floors.stream()
        .collect(
            Collectors.groupingBy(
                f -> YearMonth.from(times.date(f.receivedAt())), TreeMap::new, Collectors.toList()))
        .entrySet()
        .stream()
        .map(
            e ->
                new FloorMonth(
                    e.getKey(),
                    e.getValue().size(),
                    new Quantiles(
                        e.getValue().stream().mapToDouble(Floors.Floor::percent).toArray())))
        .toList();
  }

  boolean hasQuartiles() {
    return recordings >= LEAST_FOR_QUARTILES;
  }
}
