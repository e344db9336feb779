package turnsheet.core.format.audio;

import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Reads one channel of an uncompressed file in big blocks through one buffer of fixed size. */
final class PcmReader implements SampleReader {

  private static final int BUFFER_BYTES = 256 * 1024;

  private final InputStream in;
  private final PcmLayout layout;
  private final int channel;
  private final List<Warning> warnings;
  private final byte[] buffer;
  private int bufferedFrames;
  private int usedFrames;
  private long framesRead;
  private long framesLeft;

  PcmReader(ByteSource source, PcmLayout layout, int channel) throws IOException {
    this.layout = layout;
    this.channel = channel;
    this.warnings = new ArrayList<>(layout.warnings());
    this.framesLeft = layout.frames();
    this.buffer = new byte[Math.max(1, BUFFER_BYTES / layout.frameBytes()) * layout.frameBytes()];
    this.in = source.open();
    try {
      in.skipNBytes(layout.dataOffset());
    } catch (IOException | RuntimeException e) {
      in.close();
      throw e;
    }
  }

  @Override
  public double sampleRateHertz() {
    return layout.sampleRateHertz();
  }

  @Override
  public int read(double[] into) throws IOException, RejectedException {
    int written = 0;
    while (written < into.length) {
      if (usedFrames == bufferedFrames && !fill()) {
        break;
      }
      int count = Math.min(bufferedFrames - usedFrames, into.length - written);
      int at = usedFrames * layout.frameBytes() + (channel - 1) * layout.code().bytes();
      layout.code().decode(buffer, at, layout.frameBytes(), into, written, written + count);
      if (layout.code().floating()) {
        requireFinite(into, written, written + count);
      }
      usedFrames += count;
      framesRead += count;
      written += count;
    }
    return written;
  }

  private boolean fill() throws IOException {
    int frameBytes = layout.frameBytes();
    int wanted = (int) Math.min(buffer.length / frameBytes, framesLeft);
    int bytes = wanted == 0 ? 0 : in.readNBytes(buffer, 0, wanted * frameBytes);
    bufferedFrames = bytes / frameBytes;
    usedFrames = 0;
    framesLeft -= bufferedFrames;
    if (bufferedFrames < wanted) {
      warnings.add(
          new Warning(
              "truncated",
              "The file became shorter while it was read: "
                  + framesLeft
                  + " frames at its end are missing."));
      framesLeft = 0;
    }
    return bufferedFrames > 0;
  }

  private void requireFinite(double[] samples, int from, int to) throws RejectedException {
    for (int i = from; i < to; i++) {
      if (!(Math.abs(samples[i]) <= Double.MAX_VALUE)) {
        double seconds = (framesRead + i - from) / layout.sampleRateHertz();
        throw new RejectedException(
            "notANumber",
            String.format(
                Locale.ROOT,
                "The sample at %.6f s of channel %d is %s: export the recording again, as"
                    + " integer samples where the program offers them.",
                seconds,
                channel,
                Double.isNaN(samples[i]) ? "not a number" : "infinite"));
      }
    }
  }

  @Override
  public List<Warning> warnings() {
    return List.copyOf(warnings);
  }

  @Override
  public void close() throws IOException {
    in.close();
  }
}
