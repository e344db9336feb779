package turnsheet.core.format.audio;

import java.io.IOException;
import java.util.Set;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.CaptureFormat;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/**
 * WAV in its RIFF, RIFX (big-endian), RF64 and BW64 (64-bit sizes) containers, with integer PCM of
 * 1 to 32 bits or floating point of 32 or 64 bits. Integers come out with full scale 1, floating
 * point as it is in the file.
 */
public final class WavFormat implements CaptureFormat {

  private static final Set<String> CONTAINERS = Set.of("RIFF", "RIFX", "RF64", "BW64");

  @Override
  public boolean claims(byte[] head) {
    return head.length >= 4 && CONTAINERS.contains(HeadReader.name(head, 0));
  }

  @Override
  public Recognised recognise(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    return WavHeader.parse(source).recognised(options);
  }

  @Override
  public SampleReader openSamples(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    return WavHeader.parse(source).open(source, options);
  }

  @Override
  public EdgeReader openEdges(ByteSource source, ReadOptions options) {
    throw new IllegalStateException("a WAV file holds a waveform");
  }
}
