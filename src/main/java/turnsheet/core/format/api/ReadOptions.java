package turnsheet.core.format.api;

import org.jspecify.annotations.Nullable;

/**
 * What the bench has decided about a file, in place of a guess; null leaves it to the recogniser.
 *
 * @param channel channel, value column or signal, counted from 1 in the order of {@link
 *     Recognised#channels()}
 * @param contents what the numbers of a text file stand for
 * @param timeUnitSeconds one unit of the file's times, in seconds
 * @param sampleStepSeconds time between rows of a waveform table without a time column, in seconds
 */
public record ReadOptions(
    @Nullable Integer channel,
    @Nullable Contents contents,
    @Nullable Double timeUnitSeconds,
    @Nullable Double sampleStepSeconds) {

  public ReadOptions {
    if (channel != null && channel < 1) {
      throw new IllegalArgumentException("channel " + channel);
    }
    requirePositive("time unit", timeUnitSeconds);
    requirePositive("sample step", sampleStepSeconds);
  }

  /** Leaves everything to the recogniser. */
  public static ReadOptions none() {
    return new ReadOptions(null, null, null, null);
  }

  public ReadOptions withChannel(int chosen) {
    return new ReadOptions(chosen, contents, timeUnitSeconds, sampleStepSeconds);
  }

  private static void requirePositive(String name, @Nullable Double value) {
    if (value != null && !(value > 0 && Double.isFinite(value))) {
      throw new IllegalArgumentException(name + " " + value + " s");
    }
  }
}
