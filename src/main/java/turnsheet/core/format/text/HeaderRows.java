package turnsheet.core.format.text;

import java.util.List;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * The rows above the numbers.
 *
 * @param names column names; null where there are none
 * @param units row of units; null where there is none
 * @param preamble what stands before, and comments
 */
record HeaderRows(@Nullable Row names, @Nullable Row units, List<Row> preamble) {

  private static final Pattern LETTER = Pattern.compile(".*\\p{L}.*");
  private static final int MAX_NAME_CHARS = 64;

  HeaderRows {
    preamble = List.copyOf(preamble);
  }

  static HeaderRows of(List<Row> before, int width, char separator) {
    int at = before.size() - 1;
    Row units = null;
    Row names = null;
    if (at >= 0 && isUnitsRow(before.get(at), width)) {
      units = before.get(at);
      at--;
    }
    if (at >= 0) {
      Row candidate = uncommented(before.get(at), separator);
      if (isNamesRow(candidate, width, units != null)) {
        names = candidate;
        at--;
      }
    }
    // a comment above the names may still state the sampling step
    return new HeaderRows(names, units, before.subList(0, at + 1));
  }

  ColumnLabel label(int column) {
    String name = names == null ? "" : names.cell(column);
    String unit = units == null ? "" : units.cell(column);
    return ColumnLabel.of(name, unit, column);
  }

  private static boolean isUnitsRow(Row row, int width) {
    boolean any = false;
    for (String cell : row.cells()) {
      if (!cell.isBlank() && !Units.isUnit(cell)) {
        return false;
      }
      any |= !cell.isBlank();
    }
    return any && sameWidth(row, width);
  }

  private static boolean isNamesRow(Row row, int width, boolean unitsFollow) {
    boolean statement = SamplingStep.find(List.of(row)) != null;
    if (!sameWidth(row, width) || Row.isNumber(row.cell(0)) || statement) {
      return false;
    }
    if (row.cells().stream().noneMatch(c -> LETTER.matcher(c).matches())) {
      return false;
    }
    if (row.cells().stream().anyMatch(c -> c.length() > MAX_NAME_CHARS)) {
      return false;
    }
    // a key with its value looks like a header of two columns, one of them named by a number
    return unitsFollow || !row.holdsNumber() || ColumnLabel.of(row.cell(0), "", 0).isTime();
  }

  private static boolean sameWidth(Row row, int width) {
    int filled = row.width();
    while (filled > 1 && row.cell(filled - 1).isBlank()) {
      filled--;
    }
    return filled <= width && (filled == width || (row.width() >= width - 1 && width > 2));
  }

  private static Row uncommented(Row row, char separator) {
    if (!row.isComment()) {
      return row;
    }
    String text = String.join(String.valueOf(separator), row.cells()).strip();
    List<Row> rows = RowSplitter.split(text.replaceFirst("^(#|%|//)+\\s*", ""), separator);
    return rows.isEmpty() ? row : new Row(row.line(), rows.get(0).cells());
  }
}
