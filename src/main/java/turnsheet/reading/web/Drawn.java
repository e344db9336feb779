package turnsheet.reading.web;

import java.util.List;

/**
 * A chart as a page needs it: drawn on the server, and what the script draws it from.
 *
 * @param svg finished element
 * @param source address of the series
 * @param xFrom, xTo the whole extent; as text for data attributes, with a point
 * @param marks what the script writes into the chart, as JSON
 * @param columns heads of the table beside it
 * @param rows its cells
 */
record Drawn(
    String svg,
    String source,
    String xTitle,
    String yTitle,
    double xFrom,
    double xTo,
    double yFrom,
    double yTo,
    String marks,
    List<String> columns,
    List<List<String>> rows) {}
