package turnsheet.core.format.text;

import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * A sampling step that the lines before a table state as interval or rate.
 *
 * @param rateHertz rows per second
 * @param line where it stands, from 1
 * @param unitStated false where seconds or hertz had to be assumed
 */
record SamplingStep(double rateHertz, long line, boolean unitStated) {

  private static final String INTERVAL =
      "sampl\\w*[ _-]?(?:interval|period|step|time)|x[ _-]?incr\\w*|increment"
          + "|(?:horizontal|time)[ _-]?(?:increment|step)|delta[ _-]?t|dt";
  private static final String RATE = "sampl\\w*[ _-]?(?:rate|freq\\w*)|fs";
  private static final Pattern STATEMENT =
      Pattern.compile(
          "(?<![a-z])(?:(?<interval>"
              + INTERVAL
              + ")|(?<rate>"
              + RATE
              + "))(?![a-z])[ _]?(?:[\\[(](?<before>[^\\])]{1,12})[\\])])?[ \",;:=]{1,8}"
              + "(?<number>[-+]?[0-9]+(?:[.,][0-9]+)?(?:e[-+]?[0-9]{1,3})?)"
              + "[ \",;\\[(]{0,4}(?<after>[a-zµ\u03bc/]{1,12})?",
          Pattern.CASE_INSENSITIVE | Pattern.UNICODE_CASE);

  /** A statement is short; longer lines are something else. */
  private static final int MAX_LINE_CHARS = 400;

  static @Nullable SamplingStep find(List<Row> preamble) {
    for (Row row : preamble) {
      String text = String.join(" ", row.cells()).replaceAll("\\s+", " ");
      if (text.length() <= MAX_LINE_CHARS) {
        SamplingStep step = in(text, row.line());
        if (step != null) {
          return step;
        }
      }
    }
    return null;
  }

  private static @Nullable SamplingStep in(String text, long line) {
    Matcher m = STATEMENT.matcher(text);
    while (m.find()) {
      double number = Decimals.parse(m.group("number").replace(',', '.'), (byte) '.');
      String unit = m.group("after") != null ? m.group("after") : m.group("before");
      boolean isRate = m.group("rate") != null;
      Double factor = unit == null ? null : isRate ? Units.hertz(unit) : Units.seconds(unit);
      double value = number * (factor == null ? 1 : factor);
      if (!(value > 0 && Double.isFinite(1 / value) && Double.isFinite(value))) {
        continue;
      }
      double rate = isRate ? value : StepFit.reciprocal(value);
      if (Double.isFinite(rate)) {
        return new SamplingStep(rate, line, factor != null);
      }
    }
    return null;
  }
}
