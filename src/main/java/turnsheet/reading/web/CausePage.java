package turnsheet.reading.web;

import java.util.List;

/**
 * Who can stand behind the lines of a reading, as its page shows it.
 *
 * @param modelId of the model whose parts were asked
 * @param parts whether the model has any
 */
record CausePage(String modelId, boolean parts, List<Line> lines) {

  /**
   * One line.
   *
   * @param summary the answer
   * @param sentences what else can be said, in the order of weight
   * @param advice usual causes and the next check
   */
  record Line(String summary, List<Row> rows, List<String> sentences, String advice) {}

  /**
   * One suspect.
   *
   * @param what which of its rates
   * @param expected in Hz, a range where it has one
   * @param known half width of that in Hz, from what the parts are known to
   * @param mismatch line minus expected, Hz, with sign
   * @param allowed how large it may be, Hz
   * @param percent probability
   */
  record Row(
      String part,
      String what,
      String expected,
      String known,
      String mismatch,
      String allowed,
      String percent) {}
}
