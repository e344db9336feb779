package turnsheet.core.format.text;

import java.util.List;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised.Guess;

/** What the numbers of a table stand for, by header and by what they look like. */
record ContentsGuess(Layout layout, List<Column> columns, ReadOptions options, boolean stepStated) {

  /** A table with one column to choose from. */
  Contents ofOne(int column, List<Guess> guesses) {
    Column numbers = columns.get(column);
    ColumnLabel label = label(column);
    if (label.isPeriod()) {
      return Contents.PERIODS;
    }
    boolean namedTime = label.isTime() && numbers.mostlyRises();
    if (!namedTime && (stepStated || options.sampleStepSeconds() != null)) {
      return Contents.WAVEFORM;
    }
    if (numbers.mostlyRises()) {
      if (!label.isTime()) {
        guess(guesses, "times of rising edges: the numbers grow from row to row");
      }
      return Contents.EDGE_TIMES;
    }
    if (numbers.isPositive() && !label.isOtherQuantity()) {
      guess(guesses, "periods: positive numbers that go up and down");
      return Contents.PERIODS;
    }
    return Contents.WAVEFORM;
  }

  /** A table without a column of times. */
  Contents withoutTimes(List<Integer> values) {
    return values.stream().anyMatch(c -> label(c).isPeriod())
        ? Contents.PERIODS
        : Contents.WAVEFORM;
  }

  /**
   * A table with a column of times and others.
   *
   * @param value the column that would be read
   */
  Contents withTimes(int time, List<Integer> values, int value, List<Guess> guesses) {
    boolean even =
        TableColumns.isEven(columns.get(time), Digits.of(layout.rows(), time, layout.mark()));
    if (columns.get(value).isLevel()) {
      boolean edges = !even || columns.get(value).alternates();
      if (edges && options.sampleStepSeconds() == null) {
        guess(guesses, levels(value, columns.get(time).value(0) == 0));
        return Contents.EDGE_TIMES;
      }
    } else if (!even && !label(time).isTime() && withoutTimes(values) == Contents.PERIODS) {
      return Contents.PERIODS;
    }
    if (!label(time).isTime()) {
      guess(guesses, "waveform: the first column rises evenly, so it is taken as time");
    }
    return Contents.WAVEFORM;
  }

  private static String levels(int column, boolean startsAtZero) {
    return "edge times with levels: column "
        + (column + 1)
        + " holds only 0 and 1"
        + (startsAtZero ? "; the first row, at time 0, is the level before the first edge" : "");
  }

  private ColumnLabel label(int column) {
    return layout.labels().get(column);
  }

  private static void guess(List<Guess> guesses, String taken) {
    guesses.add(new Guess("contents", taken));
  }
}
