package turnsheet.evidence;

import java.io.IOException;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/**
 * One channel of a capture to look at: its bytes, what was confirmed for it, and what was measured.
 *
 * @param options for this channel
 * @param settings for this channel
 * @param reading the newest of this channel
 */
public record Material(
    ByteSource bytes,
    String sha256,
    Measurement measurement,
    ReadOptions options,
    MeasureSettings settings,
    Reading reading) {

  /** The waveform from its start; the caller closes it. */
  public SampleReader openSamples() throws IOException, RejectedException {
    return formats().openSamples(bytes, options);
  }

  /** The edges of a list from its start; the caller closes them. */
  public EdgeReader openEdges() throws IOException, RejectedException {
    return formats().openEdges(bytes, options);
  }

  private CaptureFormats formats() {
    return measurement.formats();
  }
}
