package turnsheet.core.format.audio;

import java.io.IOException;
import java.util.List;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.CaptureFormat;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/**
 * FLAC streams of one to eight channels and 4 to 32 bits, with or without an ID3 tag in front.
 *
 * <p>Source: RFC 9639, "Free Lossless Audio Codec (FLAC)".
 */
public final class FlacFormat implements CaptureFormat {

  /** Takes whatever begins with an ID3 tag as well: only what follows the tag tells. */
  @Override
  public boolean claims(byte[] head) {
    return FlacHeader.tagBytes(head) > 0
        || (head.length >= 4 && HeadReader.name(head, 0).equals(FlacHeader.MARKER));
  }

  /** Decodes the first frame as well, so that a stream that contradicts its header is told here. */
  @Override
  public Recognised recognise(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    FlacHeader header = FlacHeader.parse(source);
    int channel = Channels.chosen(header.channels(), options);
    try (FlacReader reader = new FlacReader(source, header, channel)) {
      reader.read(new double[1]);
    }
    return new Recognised(
        "FLAC, " + header.bits() + "-bit",
        Contents.WAVEFORM,
        (double) header.sampleRateHertz(),
        header.frames() == 0 ? null : header.frames(),
        Channels.named(header.channels()),
        channel,
        Channels.guesses(header.channels(), options),
        List.of());
  }

  @Override
  public SampleReader openSamples(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    FlacHeader header = FlacHeader.parse(source);
    return new FlacReader(source, header, Channels.chosen(header.channels(), options));
  }

  @Override
  public EdgeReader openEdges(ByteSource source, ReadOptions options) {
    throw new IllegalStateException("a FLAC file holds a waveform");
  }
}
