package turnsheet.core.stats;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** A reference file: certified values in its header, numbers below. */
final class StrdSet {

  private static final String NUMBER = "[-+]?[0-9.]+([eE][-+]?[0-9]+)?";

  private final Map<String, Double> certified = new HashMap<>();
  private final List<double[]> rows = new ArrayList<>();

  private StrdSet(Iterable<String> lines) {
    for (String line : lines) {
      String text = line.strip();
      String[] halves = text.replaceFirst("^#", "").split("=", -1);
      if (halves.length == 2 && halves[1].strip().matches(NUMBER)) {
        certified.put(halves[0].strip(), Double.valueOf(halves[1].strip()));
      } else if (text.matches(NUMBER + "( +" + NUMBER + ")*")) {
        String[] cells = text.split("\\s+", -1);
        double[] row = new double[cells.length];
        for (int i = 0; i < row.length; i++) {
          row[i] = Double.parseDouble(cells[i]);
        }
        rows.add(row);
      }
    }
  }

  /** Reads a file that lies beside the tests. */
  static StrdSet resource(String name) {
    try (var in = Objects.requireNonNull(StrdSet.class.getResourceAsStream(name), name);
        var reader = new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8))) {
      return new StrdSet(reader.lines().toList());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static StrdSet of(Iterable<String> lines) {
    return new StrdSet(lines);
  }

  double certified(String name) {
    return Objects.requireNonNull(certified.get(name), name);
  }

  double[] column(int index) {
    return rows.stream().mapToDouble(r -> r[index]).toArray();
  }
}
