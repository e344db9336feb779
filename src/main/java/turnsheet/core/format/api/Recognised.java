package turnsheet.core.format.api;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.Warning;

/**
 * What a file holds, as far as its head tells.
 *
 * @param format name for people, for example {@code WAV, 24-bit PCM}
 * @param contents what the numbers stand for
 * @param sampleRateHertz samples per second of a waveform; null for edges and periods
 * @param frames samples per channel as announced by the file; null where only reading to the end
 *     tells
 * @param channels channels, value columns or signals that can be measured, at least one
 * @param channel the one that will be read, counted from 1
 * @param guesses what was assumed without the file saying so, with the other possibilities
 * @param warnings what was noticed so far
 */
public record Recognised(
    String format,
    Contents contents,
    @Nullable Double sampleRateHertz,
    @Nullable Long frames,
    List<Channel> channels,
    int channel,
    List<Guess> guesses,
    List<Warning> warnings) {

  public Recognised {
    channels = List.copyOf(channels);
    guesses = List.copyOf(guesses);
    warnings = List.copyOf(warnings);
    if (channel < 1 || channel > channels.size()) {
      throw new IllegalArgumentException("channel " + channel + " of " + channels.size());
    }
    if ((contents == Contents.WAVEFORM) == (sampleRateHertz == null)) {
      throw new IllegalArgumentException(contents + " at " + sampleRateHertz + " Hz");
    }
  }

  /** The same file read by another channel, which is taken for a reason and shown as a guess. */
  public Recognised onChannel(int other, String why) {
    List<Guess> told =
        new ArrayList<>(guesses.stream().filter(g -> !g.subject().equals("channel")).toList());
    told.add(new Guess("channel", why));
    return new Recognised(
        format, contents, sampleRateHertz, frames, channels, other, told, warnings);
  }

  /**
   * One channel that can be chosen.
   *
   * @param name as the file calls it, or {@code channel 1}
   * @param unit as the file calls it; null where it does not
   */
  public record Channel(String name, @Nullable String unit) {}

  /**
   * Something assumed.
   *
   * @param subject which choice of {@link ReadOptions} replaces it: {@code channel}, {@code
   *     contents}, {@code timeUnitSeconds} or {@code sampleStepSeconds}
   * @param taken what was assumed and why, for people
   */
  public record Guess(String subject, String taken) {}
}
