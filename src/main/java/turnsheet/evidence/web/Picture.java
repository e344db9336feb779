package turnsheet.evidence.web;

import java.util.List;

/**
 * A chart drawn by the server with its numbers.
 *
 * @param svg finished element
 * @param columns heads of the table beside it
 * @param rows its cells
 */
public record Picture(String svg, List<String> columns, List<List<String>> rows) {

  public Picture {
    columns = List.copyOf(columns);
    rows = List.copyOf(rows);
  }
}
