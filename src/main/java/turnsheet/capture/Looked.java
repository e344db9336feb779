package turnsheet.capture;

import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.KindGuess;

/**
 * What a look at the first seconds of a capture has shown.
 *
 * @param options what the bench had decided before the look
 * @param recognised what the file holds
 * @param guess what it may be a recording of
 */
public record Looked(ReadOptions options, Recognised recognised, @Nullable KindGuess guess) {

  /** Whether it is, as far as the look tells, the recording of a played tone. */
  public boolean mayBeTone() {
    return recognised.contents() == Contents.WAVEFORM
        && (guess == null || guess.kind() == CaptureKind.TONE);
  }

  /** The same file read by another channel than the bench or the look had taken. */
  public Looked onChannel(int channel, String why) {
    return new Looked(options.withChannel(channel), recognised.onChannel(channel, why), guess);
  }
}
