package turnsheet.bench;

import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.ClockError;

/**
 * What the bench says about the recording of a known frequency.
 *
 * @param source what gave the frequency, for people
 * @param reference its value and how far it can be trusted
 * @param keepingPpm half width within which the clock stays until the next check; 0 where nothing
 *     is to be allowed for
 * @param kind how a waveform is read; null for a tone. A list of edges is always one
 * @param channel counted from 1; null for the one that the file offers
 */
public record ClockQuestion(
    String source,
    ClockError.Reference reference,
    double keepingPpm,
    @Nullable CaptureKind kind,
    @Nullable Integer channel) {

  public static final int SOURCE_LENGTH = 300;

  public ClockQuestion {
    if (source.isBlank() || source.length() > SOURCE_LENGTH) {
      throw new IllegalArgumentException("source of " + source.length() + " characters");
    }
    if (!(keepingPpm >= 0 && Double.isFinite(keepingPpm))) {
      throw new IllegalArgumentException("keeping " + keepingPpm + " ppm");
    }
    if (channel != null && channel < 1) {
      throw new IllegalArgumentException("channel " + channel);
    }
  }
}
