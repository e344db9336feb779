package turnsheet.core.format.text;

import java.util.Locale;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * What the header says about one column.
 *
 * @param name for people
 * @param unit as written; null where none is
 * @param stated whether the file has a header for the column
 */
record ColumnLabel(String name, @Nullable String unit, boolean stated) {

  private static final Pattern BRACKETS = Pattern.compile("(.*)[\\[(]([^\\[\\]()]*)[\\])]");
  private static final Pattern TAIL = Pattern.compile("(.*)[\\s_/](\\S+)");
  private static final Pattern CAMEL =
      Pattern.compile("([Tt]ime|[Pp]eriod|[Ii]nterval|t|dt)(S|Ms|Us|Ns|Micros|Millis|Nanos)");

  private static final Set<String> TIME_NAMES =
      Set.of(
          "t",
          "x",
          "x-axis",
          "x axis",
          "x_axis",
          "timestamp",
          "timestamps",
          "zeit",
          "temps",
          "tiempo",
          "tempo",
          "elapsed");
  private static final Set<String> INDEX_NAMES =
      Set.of(
          "sample", "samples", "index", "idx", "n", "no", "no.", "nr", "nr.", "#", "row", "point",
          "points", "i", "k", "number", "count");
  private static final Set<String> PERIOD_NAMES = Set.of("dt", "rr", "delta", "delta t", "delta_t");

  static ColumnLabel unnamed(int column) {
    return new ColumnLabel("column " + (column + 1), null, false);
  }

  static ColumnLabel of(String cell, String unitCell, int column) {
    String text = cell.strip();
    String unit = Units.bare(unitCell);
    if (text.isEmpty()) {
      return unit.isEmpty()
          ? unnamed(column)
          : new ColumnLabel("column " + (column + 1), unit, true);
    }
    if (!unit.isEmpty()) {
      return new ColumnLabel(text, unit, true);
    }
    if (Units.seconds(Units.bare(text)) != null) {
      return new ColumnLabel(text, Units.bare(text), true);
    }
    Matcher brackets = BRACKETS.matcher(text);
    if (brackets.matches() && !brackets.group(1).isBlank()) {
      return new ColumnLabel(trimmed(brackets.group(1)), brackets.group(2).strip(), true);
    }
    Matcher tail = TAIL.matcher(text);
    if (tail.matches() && Units.isUnit(tail.group(2)) && !tail.group(1).isBlank()) {
      return new ColumnLabel(trimmed(tail.group(1)), tail.group(2), true);
    }
    Matcher camel = CAMEL.matcher(text);
    return camel.matches()
        ? new ColumnLabel(camel.group(1), camel.group(2).toLowerCase(Locale.ROOT), true)
        : new ColumnLabel(text, null, true);
  }

  /** Seconds in one unit of the column; null where it states no unit of time. */
  @Nullable Double unitSeconds() {
    return unit == null ? null : Units.seconds(unit);
  }

  boolean isPeriod() {
    String word = word();
    return PERIOD_NAMES.contains(word) || word.contains("period") || word.contains("interval");
  }

  boolean isTime() {
    String word = word();
    return stated
        && !isPeriod()
        && (TIME_NAMES.contains(word)
            || word.startsWith("time")
            || word.endsWith(" time")
            || word.endsWith("_time")
            || word.contains("edge")
            || word.startsWith("rising")
            || word.startsWith("rise")
            || unitSeconds() != null);
  }

  boolean isIndex() {
    return stated && INDEX_NAMES.contains(word());
  }

  /** Whether a unit other than one of time is stated. */
  boolean isOtherQuantity() {
    return unit != null && unitSeconds() == null && Units.isUnit(unit);
  }

  private String word() {
    return name.toLowerCase(Locale.ROOT);
  }

  private static String trimmed(String name) {
    String text = name.strip();
    while (text.endsWith("_") || text.endsWith("/") || text.endsWith(" in")) {
      text = text.substring(0, text.length() - (text.endsWith(" in") ? 3 : 1)).strip();
    }
    return text;
  }
}
