package turnsheet.core.measure;

import java.util.Arrays;
import org.jspecify.annotations.Nullable;

/**
 * What a waveform may be a recording of, judged from its first seconds. A guess, to be shown as
 * one: a pickup that gives a sine cannot be told from a test tone by its shape.
 *
 * @param kind the likelier one
 * @param rateHertz how often the waveform rises through its middle per second; null where it hardly
 *     ever does
 * @param why for people
 */
public record KindGuess(CaptureKind kind, @Nullable Double rateHertz, String why) {

  /** A unit that runs further from nominal than this is rarer than one with another tone. */
  private static final double NEAR = 0.15;

  /**
   * Share of samples within 15 % of the span of one of the extreme levels: 0.51 for a sine (2/pi *
   * arccos 0.7), 0.3 for a triangle, close to 1 for pulses. Halfway between sine and pulses.
   */
  private static final double MOSTLY_AT_THE_LEVELS = 0.75;

  /**
   * Looks at a waveform: a rate that fits only one of the nominal ones decides, else the shape.
   *
   * @param samples the first seconds of one channel, any unit
   * @param toneHz tone at nominal speed; null where none is known
   * @param pulsesPerSecond tachometer rate at nominal speed; null where none is known
   */
  public static KindGuess of(
      double[] samples,
      double sampleRateHertz,
      @Nullable Double toneHz,
      @Nullable Double pulsesPerSecond) {
    if (samples.length == 0) {
      return new KindGuess(CaptureKind.TONE, null, "there are no samples to judge by");
    }
    double[] sorted = samples.clone();
    Arrays.sort(sorted);
    // one sample in a hundred may be a click
    double low = sorted[sorted.length / 100];
    double high = sorted[sorted.length - 1 - sorted.length / 100];
    Double rate = rate(samples, sampleRateHertz, low, high);
    boolean nearTone = near(rate, toneHz);
    boolean nearPulses = near(rate, pulsesPerSecond);
    if (nearTone != nearPulses) {
      return nearTone
          ? new KindGuess(
              CaptureKind.TONE, rate, "it swings about as often as the test tone of this setting")
          : new KindGuess(
              CaptureKind.TACHOMETER,
              rate,
              "it swings about as often as the tachometer of this setting");
    }
    return shareAtLevels(samples, low, high) > MOSTLY_AT_THE_LEVELS
        ? new KindGuess(
            CaptureKind.TACHOMETER, rate, "it rests at two levels most of the time, as pulses do")
        : new KindGuess(CaptureKind.TONE, rate, "it swings evenly, as a tone does");
  }

  private static boolean near(@Nullable Double rate, @Nullable Double nominal) {
    return rate != null && nominal != null && Math.abs(rate / nominal - 1) <= NEAR;
  }

  private static double shareAtLevels(double[] samples, double low, double high) {
    double reach = 0.15 * (high - low);
    long near = Arrays.stream(samples).filter(v -> v <= low + reach || v >= high - reach).count();
    return high > low ? (double) near / samples.length : 0;
  }

  /** Rises through the middle, counted only after a fall below the lower third. */
  private static @Nullable Double rate(
      double[] samples, double sampleRateHertz, double low, double high) {
    double arm = low + (high - low) / 3;
    double fire = low + 2 * (high - low) / 3;
    boolean armed = false;
    int rises = 0;
    int first = 0;
    int last = 0;
    for (int i = 0; i < samples.length; i++) {
      if (samples[i] < arm) {
        armed = true;
      } else if (armed && samples[i] > fire) {
        armed = false;
        last = i;
        if (rises++ == 0) {
          first = i;
        }
      }
    }
    return rises < 3 ? null : (rises - 1) * sampleRateHertz / (last - first);
  }
}
