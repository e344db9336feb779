package turnsheet.core.format.text;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised.Channel;
import turnsheet.core.format.api.Recognised.Guess;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Decides what the columns of one table stand for: first what the bench has chosen, then what the
 * header says, then what the numbers look like. Whatever the numbers alone decided is a guess.
 */
final class TablePlanner {

  /** Printed times that leave the step this uncertain would show in a speed. */
  private static final double COARSE = 2e-5;

  /** Beyond these a unit is wrong: a row in thirty years, a row in a picosecond. */
  private static final double MIN_RATE_HERTZ = 1e-9;

  private static final double MAX_RATE_HERTZ = 1e12;

  private final Layout layout;
  private final ReadOptions options;
  private final List<Column> columns;
  private final List<Integer> numeric;
  private final @Nullable SamplingStep stated;
  private final List<Guess> guesses = new ArrayList<>();
  private final List<Warning> warnings = new ArrayList<>();
  private final int time;

  private TablePlanner(Layout layout, ReadOptions options) throws RejectedException {
    this.layout = layout;
    this.options = options;
    this.columns = TableColumns.of(layout);
    this.numeric = TableColumns.filled(columns);
    this.stated = SamplingStep.find(layout.preamble());
    if (numeric.isEmpty()) {
      throw new RejectedException(
          "noNumbers",
          "From line "
              + layout.firstLine()
              + " every column has empty cells: export the capture again without gaps.");
    }
    this.time = TimeColumn.find(layout, numeric, columns);
  }

  static TablePlan plan(Layout layout, ReadOptions options) throws RejectedException {
    return new TablePlanner(layout, options).plan();
  }

  private TablePlan plan() throws RejectedException {
    if (layout.columns() == 1 && layout.mark() == ',') {
      warnings.add(
          new Warning("decimalComma", "Commas are read as decimal marks: one number per line."));
    }
    Contents chosen = options.contents();
    return switch (chosen != null ? chosen : guessed()) {
      case WAVEFORM -> waveform();
      case EDGE_TIMES -> edges();
      case PERIODS -> periods();
    };
  }

  private Contents guessed() throws RejectedException {
    List<Integer> values = values();
    ContentsGuess contents = new ContentsGuess(layout, columns, options, stated != null);
    if (numeric.size() == 1 || (time >= 0 && values.isEmpty())) {
      return contents.ofOne(time >= 0 ? time : numeric.get(0), guesses);
    }
    return time < 0
        ? contents.withoutTimes(values)
        : contents.withTimes(time, values, channelColumn(values), guesses);
  }

  private TablePlan waveform() throws RejectedException {
    List<Integer> values = values();
    Double chosen = options.sampleStepSeconds();
    boolean timed = chosen == null && time >= 0 && !values.isEmpty();
    if (values.isEmpty()) {
      values = numeric;
    }
    int value = channelColumn(values);
    if (timed) {
      return timedWaveform(values, value);
    }
    double rate;
    if (chosen != null) {
      rate = StepFit.reciprocal(chosen);
    } else if (stated != null) {
      rate = stated.rateHertz();
      if (!stated.unitStated()) {
        guess(
            "sampleStepSeconds",
            (float) (1 / rate) + " s: line " + stated.line() + " states no unit");
      }
    } else {
      throw sampleStepNeeded(values);
    }
    return result(Contents.WAVEFORM, -1, value, new TickScale(1), 0, plausible(rate), values);
  }

  private TablePlan timedWaveform(List<Integer> values, int value) throws RejectedException {
    Column times = columns.get(time);
    StepFit fit = StepFit.of(times.values(), digits(time));
    // where rows are missing the mean says nothing, and reading finds the gap
    if (!TableColumns.isEven(times, digits(time)) || !(fit.step() > 0)) {
      fit = StepFit.ofStep(Math.max(times.medianStep(), Double.MIN_NORMAL), 0);
    }
    double step = fit.step();
    if (step == Double.MIN_NORMAL) {
      throw new RejectedException(
          "unevenSteps",
          "The times of column "
              + (time + 1)
              + " do not grow from line "
              + layout.firstLine()
              + " on: export more digits of the time, or state the sampling step.");
    }
    TickScale scale =
        scale(time, TimeUnitGuess.ofSamples(step, times.isWhole()), "a time step", step);
    if (fit.relativeUncertainty() > COARSE) {
      warnings.add(
          new Warning(
              "coarseTimes",
              "The printed times leave the sampling step uncertain by "
                  + Math.round(fit.relativeUncertainty() * 1e6)
                  + " ppm: export more digits or state the sampling step."));
    }
    return result(
        Contents.WAVEFORM, time, value, scale, step, plausible(scale.hertz(fit.rate())), values);
  }

  private static double plausible(double rateHertz) throws RejectedException {
    if (!(rateHertz >= MIN_RATE_HERTZ && rateHertz <= MAX_RATE_HERTZ)) {
      throw new RejectedException(
          "noSampleRate",
          "The rows would be "
              + (float) rateHertz
              + " per second: state the unit of the times or the sampling step.");
    }
    return rateHertz;
  }

  private TablePlan edges() throws RejectedException {
    int column = time;
    if (column < 0) {
      column =
          numeric.stream()
              .filter(c -> numeric.size() == 1 || !TimeColumn.isIndex(layout, numeric, columns, c))
              .findFirst()
              .orElse(numeric.get(0));
    }
    int at = column;
    List<Integer> levels =
        numeric.stream().filter(c -> c != at && columns.get(c).isLevel()).toList();
    double step = columns.get(at).medianStep();
    TickScale scale = scale(at, TimeUnitGuess.ofPeriods(step), "a gap", step);
    int level = levels.isEmpty() ? -1 : channelColumn(levels);
    List<Integer> shown = levels.isEmpty() ? List.of(at) : levels;
    channelColumn(shown);
    return result(Contents.EDGE_TIMES, at, level, scale, 0, 0, shown);
  }

  private TablePlan periods() throws RejectedException {
    List<Integer> named = numeric.stream().filter(c -> label(c).isPeriod()).toList();
    List<Integer> values = named.isEmpty() ? values() : named;
    if (values.isEmpty()) {
      values = numeric;
    }
    int value = channelColumn(values);
    double typical = columns.get(value).median();
    TickScale scale = scale(value, TimeUnitGuess.ofPeriods(typical), "a period", typical);
    return result(Contents.PERIODS, -1, value, scale, 0, 0, values);
  }

  /** Columns that can be measured: neither times nor a count of rows. */
  private List<Integer> values() {
    return numeric.stream()
        .filter(c -> c != time)
        .filter(c -> numeric.size() == 1 || !TimeColumn.isIndex(layout, numeric, columns, c))
        .toList();
  }

  private int channelColumn(List<Integer> of) throws RejectedException {
    Integer chosen = options.channel();
    if (chosen != null && chosen > of.size()) {
      throw new RejectedException(
          "noSuchChannel",
          "Column "
              + chosen
              + " was chosen, the table has "
              + of.size()
              + " that can be measured: choose one of them.");
    }
    return of.get(chosen == null ? 0 : chosen - 1);
  }

  private TickScale scale(int column, double guessed, String what, double typical) {
    Double chosen = options.timeUnitSeconds();
    Double written = label(column).unitSeconds();
    if (chosen != null) {
      return new TickScale(chosen);
    }
    if (written != null) {
      return new TickScale(written);
    }
    guess("timeUnitSeconds", TimeUnitGuess.sentence(guessed, what, typical));
    return new TickScale(guessed);
  }

  private TablePlan result(
      Contents contents,
      int timeColumn,
      int valueColumn,
      TickScale scale,
      double step,
      double sampleRateHertz,
      List<Integer> choices) {
    Integer chosen = options.channel();
    if (choices.size() > 1 && chosen == null) {
      guess(
          "channel",
          label(choices.get(0)).name() + ": the first of " + choices.size() + " columns");
    }
    int printed = timeColumn >= 0 ? timeColumn : valueColumn;
    return new TablePlan(
        layout,
        contents,
        timeColumn,
        valueColumn,
        scale,
        digits(printed),
        step,
        sampleRateHertz,
        choices.stream().map(c -> new Channel(label(c).name(), label(c).unit())).toList(),
        chosen == null ? 1 : chosen,
        guesses,
        warnings);
  }

  private RejectedException sampleStepNeeded(List<Integer> values) {
    String names = String.join(", ", values.stream().limit(30).map(c -> label(c).name()).toList());
    return new RejectedException(
        "sampleStepNeeded",
        "From line "
            + layout.firstLine()
            + " the table holds values without times ("
            + names
            + "): state the sampling step and the column if this is a waveform, or choose what the"
            + " numbers stand for.");
  }

  private ColumnLabel label(int column) {
    return layout.labels().get(column);
  }

  private Digits digits(int column) {
    return Digits.of(layout.rows(), column, layout.mark());
  }

  private void guess(String subject, String taken) {
    guesses.add(new Guess(subject, taken));
  }
}
