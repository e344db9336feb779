package turnsheet.core.format.audio;

import java.io.IOException;
import java.util.List;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Where the samples of an uncompressed file lie and what they mean.
 *
 * @param format name for people
 * @param frameBytes bytes from one sample of a channel to its next
 * @param dataOffset byte of the file at which the first frame begins
 * @param frames whole frames that are really in the file
 */
record PcmLayout(
    String format,
    double sampleRateHertz,
    int channels,
    SampleCode code,
    int frameBytes,
    long dataOffset,
    long frames,
    List<Warning> warnings) {

  PcmLayout {
    warnings = List.copyOf(warnings);
    if (channels < 1 || frameBytes < channels * code.bytes() || dataOffset < 0 || frames < 0) {
      throw new IllegalArgumentException(
          channels + " channels in " + frameBytes + " bytes, " + frames + " frames");
    }
  }

  Recognised recognised(ReadOptions options) throws RejectedException {
    return new Recognised(
        format,
        Contents.WAVEFORM,
        sampleRateHertz,
        frames,
        Channels.named(channels),
        Channels.chosen(channels, options),
        Channels.guesses(channels, options),
        warnings);
  }

  PcmReader open(ByteSource source, ReadOptions options) throws IOException, RejectedException {
    return new PcmReader(source, this, Channels.chosen(channels, options));
  }
}
