package turnsheet.core.format.audio;

import java.io.IOException;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.CaptureFormat;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/** AIFF, and AIFF-C with uncompressed samples: integers of 1 to 32 bits, floating point. */
public final class AiffFormat implements CaptureFormat {

  @Override
  public boolean claims(byte[] head) {
    return head.length >= 12
        && HeadReader.name(head, 0).equals("FORM")
        && HeadReader.name(head, 8).startsWith("AIF");
  }

  @Override
  public Recognised recognise(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    return AiffHeader.parse(source).recognised(options);
  }

  @Override
  public SampleReader openSamples(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    return AiffHeader.parse(source).open(source, options);
  }

  @Override
  public EdgeReader openEdges(ByteSource source, ReadOptions options) {
    throw new IllegalStateException("an AIFF file holds a waveform");
  }
}
