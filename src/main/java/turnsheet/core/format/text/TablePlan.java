package turnsheet.core.format.text;

import java.util.List;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.Recognised.Channel;
import turnsheet.core.format.api.Recognised.Guess;
import turnsheet.core.signal.Warning;

/**
 * How a table is to be read.
 *
 * @param timeColumn index of the column with times; -1 where none is used
 * @param valueColumn index of the column with samples, levels or periods; -1 where none is used
 * @param scale unit of times or periods
 * @param digits how finely times or periods are printed
 * @param step of a waveform's times, in their unit; 0 without times
 * @param sampleRateHertz of a waveform; 0 for edges and periods
 */
record TablePlan(
    Layout layout,
    Contents contents,
    int timeColumn,
    int valueColumn,
    TickScale scale,
    Digits digits,
    double step,
    double sampleRateHertz,
    List<Channel> channels,
    int channel,
    List<Guess> guesses,
    List<Warning> warnings) {

  TablePlan {
    channels = List.copyOf(channels);
    guesses = List.copyOf(guesses);
    warnings = List.copyOf(warnings);
  }
}
