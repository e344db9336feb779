package turnsheet.core.format.text;

import java.util.List;

/**
 * How a table is written and where its numbers start.
 *
 * @param separator between cells; {@link RowSplitter#BLANKS} for runs of blanks
 * @param mark decimal mark
 * @param firstLine line of the first row of numbers, from 1
 * @param columns cells per row
 * @param labels one per column
 * @param preamble records before header and numbers
 * @param rows rows of numbers of the head, up to the first that is none
 * @param broken whether a row that is none ended them
 */
record Layout(
    char separator,
    byte mark,
    long firstLine,
    int columns,
    List<ColumnLabel> labels,
    List<Row> preamble,
    List<Row> rows,
    boolean broken) {

  Layout {
    labels = List.copyOf(labels);
    preamble = List.copyOf(preamble);
    rows = List.copyOf(rows);
  }

  String separatorName() {
    return switch (separator) {
      case '\t' -> "tabs";
      case ';' -> "semicolons";
      case ',' -> "commas";
      default -> "blanks";
    };
  }
}
